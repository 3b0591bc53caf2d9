ALTER TABLE `invoices` ADD `credited_pence` bigint DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE `invoices` ADD `pending_pence` bigint DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE `refunds` ADD `method` varchar(10) NOT NULL;--> statement-breakpoint
ALTER TABLE `refunds` ADD `is_owed_again` boolean DEFAULT false NOT NULL;