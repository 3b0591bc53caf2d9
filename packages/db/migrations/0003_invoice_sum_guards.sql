ALTER TABLE `invoices` DROP CONSTRAINT `invoices_sums`;
--> statement-breakpoint
ALTER TABLE `invoices` ADD CONSTRAINT `invoices_sums` CHECK (`total_pence` = `net_pence` + `vat_pence` AND `net_pence` >= 0 AND `vat_pence` >= 0 AND `paid_pence` >= 0 AND `credited_pence` >= 0 AND `pending_pence` >= 0 AND `paid_pence` + `credited_pence` + `pending_pence` <= `total_pence`);
--> statement-breakpoint
ALTER TABLE `invoices` ADD CONSTRAINT `invoices_state` CHECK (`state` IN ('draft','issued','part-paid','paid','void','refunded') AND (`state` NOT IN ('draft','void') OR `paid_pence` + `credited_pence` + `pending_pence` = 0));
--> statement-breakpoint
CREATE TRIGGER `payments_stay` BEFORE UPDATE ON `payments` FOR EACH ROW
BEGIN
  IF (NEW.`invoice_id` <=> OLD.`invoice_id` AND NEW.`site_id` <=> OLD.`site_id` AND NEW.`method` <=> OLD.`method` AND NEW.`amount_pence` <=> OLD.`amount_pence` AND NEW.`reference` <=> OLD.`reference` AND NEW.`card_attempt_id` <=> OLD.`card_attempt_id` AND NEW.`received_at` <=> OLD.`received_at` AND NEW.`taken_by` <=> OLD.`taken_by`) = 0 THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A payment cannot be changed. Give the money back instead.';
  END IF;
END;
--> statement-breakpoint
DROP TRIGGER `invoice_lines_update`;
--> statement-breakpoint
CREATE TRIGGER `invoice_lines_update` BEFORE UPDATE ON `invoice_lines` FOR EACH ROW
BEGIN
  DECLARE invoice_state VARCHAR(10);
  SELECT `state` INTO invoice_state FROM `invoices` WHERE `practice_id` = OLD.`practice_id` AND `id` = OLD.`invoice_id`;
  IF (NEW.`practice_id` <=> OLD.`practice_id` AND NEW.`invoice_id` <=> OLD.`invoice_id`) = 0 THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A line stays on its invoice.';
  END IF;
  IF invoice_state NOT IN ('draft', 'void') THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A line of an issued invoice cannot be changed.';
  END IF;
  IF invoice_state = 'void' AND (NEW.`appointment_id` IS NULL AND NEW.`position` <=> OLD.`position` AND NEW.`kind` <=> OLD.`kind` AND NEW.`product_id` <=> OLD.`product_id` AND NEW.`description` <=> OLD.`description` AND NEW.`quantity` <=> OLD.`quantity` AND NEW.`unit_pence` <=> OLD.`unit_pence` AND NEW.`discount_basis_points` <=> OLD.`discount_basis_points` AND NEW.`vat_treatment` <=> OLD.`vat_treatment` AND NEW.`vat_basis_points` <=> OLD.`vat_basis_points` AND NEW.`net_pence` <=> OLD.`net_pence` AND NEW.`vat_pence` <=> OLD.`vat_pence` AND NEW.`total_pence` <=> OLD.`total_pence`) = 0 THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A void invoice only lets go of its visits.';
  END IF;
END;
