ALTER TABLE `jobs` ADD `result` json;--> statement-breakpoint
ALTER TABLE `jobs` ADD `problem` varchar(300);--> statement-breakpoint
ALTER TABLE `jobs` ADD `live_key` varchar(160);--> statement-breakpoint
ALTER TABLE `jobs` ADD CONSTRAINT `jobs_live_once` UNIQUE(`practice_id`,`live_key`);