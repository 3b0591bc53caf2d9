ALTER TABLE `letter_deliveries` ADD `token_hash` varchar(64);--> statement-breakpoint
ALTER TABLE `letter_deliveries` ADD `expires_at` datetime(3);--> statement-breakpoint
ALTER TABLE `letter_deliveries` ADD `first_opened_at` datetime(3);--> statement-breakpoint
ALTER TABLE `letter_deliveries` ADD `opened_count` int DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE `letter_deliveries` ADD CONSTRAINT `letter_deliveries_token` UNIQUE(`token_hash`);