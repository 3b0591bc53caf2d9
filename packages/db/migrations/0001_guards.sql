ALTER TABLE `appointments` ADD CONSTRAINT `appointments_on_grid` CHECK (MINUTE(`starts_at`) MOD 5 = 0 AND SECOND(`starts_at`) = 0 AND MICROSECOND(`starts_at`) = 0 AND MINUTE(`ends_at`) MOD 5 = 0 AND SECOND(`ends_at`) = 0 AND MICROSECOND(`ends_at`) = 0 AND `clean_down_minutes` MOD 5 = 0);
--> statement-breakpoint
ALTER TABLE `appointments` ADD CONSTRAINT `appointments_forward` CHECK (`ends_at` > `starts_at` AND `clean_down_minutes` BETWEEN 0 AND 60);
--> statement-breakpoint
ALTER TABLE `appointments` ADD CONSTRAINT `appointments_state` CHECK (`state` IN ('booked','confirmed','arrived','in-session','fulfilled','cancelled','noshow'));
--> statement-breakpoint
ALTER TABLE `absences` ADD CONSTRAINT `absences_one_resource` CHECK ((`staff_member_id` IS NULL) <> (`room_id` IS NULL) AND `ends_at` > `starts_at`);
--> statement-breakpoint
ALTER TABLE `services` ADD CONSTRAINT `services_on_grid` CHECK (`duration_minutes` > 0 AND `duration_minutes` MOD 5 = 0 AND `clean_down_minutes` >= 0 AND `clean_down_minutes` MOD 5 = 0);
--> statement-breakpoint
ALTER TABLE `working_patterns` ADD CONSTRAINT `working_patterns_forward` CHECK (`weekday` BETWEEN 1 AND 7 AND `ends_at` > `starts_at` AND `every_weeks` BETWEEN 1 AND 8);
--> statement-breakpoint
ALTER TABLE `prices` ADD CONSTRAINT `prices_one_thing` CHECK ((`service_id` IS NULL) <> (`product_id` IS NULL) AND `amount_pence` >= 0);
--> statement-breakpoint
ALTER TABLE `invoices` ADD CONSTRAINT `invoices_sums` CHECK (`total_pence` = `net_pence` + `vat_pence` AND `paid_pence` BETWEEN 0 AND `total_pence`);
--> statement-breakpoint
ALTER TABLE `invoices` ADD CONSTRAINT `invoices_numbered` CHECK ((`state` = 'draft') = (`number` IS NULL) AND (`number` IS NULL) = (`reference` IS NULL) AND (`number` IS NULL) = (`issued_on` IS NULL));
--> statement-breakpoint
ALTER TABLE `invoice_lines` ADD CONSTRAINT `invoice_lines_sums` CHECK (`quantity` > 0 AND `unit_pence` >= 0 AND `discount_basis_points` BETWEEN 0 AND 10000 AND `net_pence` >= 0 AND `vat_pence` >= 0 AND `total_pence` = `net_pence` + `vat_pence`);
--> statement-breakpoint
ALTER TABLE `payments` ADD CONSTRAINT `payments_sums` CHECK (`amount_pence` > 0 AND `refunded_pence` BETWEEN 0 AND `amount_pence`);
--> statement-breakpoint
ALTER TABLE `refunds` ADD CONSTRAINT `refunds_positive` CHECK (`amount_pence` > 0);
--> statement-breakpoint
CREATE TRIGGER `invoices_issued_stay` BEFORE UPDATE ON `invoices` FOR EACH ROW
BEGIN
  IF OLD.`state` <> 'draft' AND (NEW.`number` <=> OLD.`number` AND NEW.`reference` <=> OLD.`reference` AND NEW.`patient_id` <=> OLD.`patient_id` AND NEW.`payer_id` <=> OLD.`payer_id` AND NEW.`site_id` <=> OLD.`site_id` AND NEW.`bill_to` <=> OLD.`bill_to` AND NEW.`issued_on` <=> OLD.`issued_on` AND NEW.`due_on` <=> OLD.`due_on` AND NEW.`net_pence` <=> OLD.`net_pence` AND NEW.`vat_pence` <=> OLD.`vat_pence` AND NEW.`total_pence` <=> OLD.`total_pence` AND NEW.`vat_rounding` <=> OLD.`vat_rounding` AND NEW.`vat_number` <=> OLD.`vat_number` AND NEW.`issued_at` <=> OLD.`issued_at` AND NEW.`issued_by` <=> OLD.`issued_by`) = 0 THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'An issued invoice cannot be changed.';
  END IF;
  IF OLD.`state` <> 'draft' AND NEW.`state` = 'draft' THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'An issued invoice cannot become a draft.';
  END IF;
END;
--> statement-breakpoint
CREATE TRIGGER `invoices_issued_last` BEFORE DELETE ON `invoices` FOR EACH ROW
BEGIN
  IF OLD.`state` <> 'draft' THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'An issued invoice cannot be deleted.';
  END IF;
END;
--> statement-breakpoint
CREATE TRIGGER `invoice_lines_insert` BEFORE INSERT ON `invoice_lines` FOR EACH ROW
BEGIN
  IF (SELECT `state` FROM `invoices` WHERE `practice_id` = NEW.`practice_id` AND `id` = NEW.`invoice_id`) <> 'draft' THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'An issued invoice takes no more lines.';
  END IF;
END;
--> statement-breakpoint
CREATE TRIGGER `invoice_lines_update` BEFORE UPDATE ON `invoice_lines` FOR EACH ROW
BEGIN
  IF (SELECT `state` FROM `invoices` WHERE `practice_id` = OLD.`practice_id` AND `id` = OLD.`invoice_id`) NOT IN ('draft', 'void') OR (NEW.`invoice_id` <=> OLD.`invoice_id`) = 0 THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A line of an issued invoice cannot be changed.';
  END IF;
END;
--> statement-breakpoint
CREATE TRIGGER `invoice_lines_delete` BEFORE DELETE ON `invoice_lines` FOR EACH ROW
BEGIN
  IF (SELECT `state` FROM `invoices` WHERE `practice_id` = OLD.`practice_id` AND `id` = OLD.`invoice_id`) <> 'draft' THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A line of an issued invoice cannot be deleted.';
  END IF;
END;
--> statement-breakpoint
CREATE TRIGGER `notes_signed_stay` BEFORE UPDATE ON `notes` FOR EACH ROW
BEGIN
  IF OLD.`state` = 'signed' THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A signed note cannot be changed.';
  END IF;
END;
--> statement-breakpoint
CREATE TRIGGER `notes_signed_last` BEFORE DELETE ON `notes` FOR EACH ROW
BEGIN
  IF OLD.`state` = 'signed' THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A signed note cannot be deleted.';
  END IF;
END;
--> statement-breakpoint
CREATE TRIGGER `letters_signed_stay` BEFORE UPDATE ON `letters` FOR EACH ROW
BEGIN
  IF OLD.`state` = 'signed' THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A signed letter cannot be changed.';
  END IF;
END;
--> statement-breakpoint
CREATE TRIGGER `letters_signed_last` BEFORE DELETE ON `letters` FOR EACH ROW
BEGIN
  IF OLD.`state` = 'signed' THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'A signed letter cannot be deleted.';
  END IF;
END;
--> statement-breakpoint
CREATE TRIGGER `programme_versions_issued_stay` BEFORE UPDATE ON `programme_versions` FOR EACH ROW
BEGIN
  IF OLD.`issued_at` IS NOT NULL THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'An issued programme version cannot be changed.';
  END IF;
END;
