CREATE TABLE `leave_requests` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`staff_member_id` uuid NOT NULL,
	`starts_at` datetime(3) NOT NULL,
	`ends_at` datetime(3) NOT NULL,
	`reason` varchar(120) NOT NULL,
	`state` varchar(10) NOT NULL DEFAULT 'requested',
	`requested_at` datetime(3) NOT NULL,
	`requested_by` uuid NOT NULL,
	`decided_at` datetime(3),
	`decided_by` uuid,
	`decision_note` varchar(200),
	`absence_id` uuid,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `leave_requests_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `class_attendees` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`class_session_id` uuid NOT NULL,
	`patient_id` uuid NOT NULL,
	`state` varchar(12) NOT NULL,
	`joined_at` datetime(3) NOT NULL,
	`cancel_reason` varchar(200),
	`version` int NOT NULL DEFAULT 1,
	`created_by` uuid NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `class_attendees_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`),
	CONSTRAINT `class_attendees_once` UNIQUE(`practice_id`,`class_session_id`,`patient_id`)
);
--> statement-breakpoint
CREATE TABLE `class_sessions` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`site_id` uuid NOT NULL,
	`therapist_id` uuid NOT NULL,
	`room_id` uuid NOT NULL,
	`service_id` uuid NOT NULL,
	`title` varchar(80) NOT NULL,
	`starts_at` datetime(3) NOT NULL,
	`ends_at` datetime(3) NOT NULL,
	`clean_down_minutes` int NOT NULL DEFAULT 0,
	`capacity` int NOT NULL,
	`state` varchar(12) NOT NULL DEFAULT 'booked',
	`cancel_reason` varchar(200),
	`version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	`created_by` uuid NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `class_sessions_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `courses` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`patient_id` uuid NOT NULL,
	`service_id` uuid NOT NULL,
	`site_id` uuid NOT NULL,
	`therapist_id` uuid NOT NULL,
	`rhythm` json NOT NULL,
	`start_time` varchar(5) NOT NULL,
	`planned_visits` int NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	`created_by` uuid NOT NULL,
	CONSTRAINT `courses_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `cover_moves` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`plan_id` uuid NOT NULL,
	`appointment_id` uuid NOT NULL,
	`appointment_version` int NOT NULL,
	`before` json NOT NULL,
	`place` json,
	`problem` varchar(300),
	`decision` varchar(10) NOT NULL DEFAULT 'keep',
	`is_applied` int NOT NULL DEFAULT 0,
	CONSTRAINT `cover_moves_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `cover_plans` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`therapist_id` uuid,
	`room_id` uuid,
	`starts_at` datetime(3) NOT NULL,
	`ends_at` datetime(3) NOT NULL,
	`reason` varchar(120) NOT NULL,
	`state` varchar(10) NOT NULL DEFAULT 'solving',
	`job_id` uuid,
	`outcome` json,
	`applied_at` datetime(3),
	`version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	`created_by` uuid NOT NULL,
	CONSTRAINT `cover_plans_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `diary_holds` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`held_by` uuid NOT NULL,
	`site_id` uuid NOT NULL,
	`therapist_id` uuid NOT NULL,
	`starts_at` datetime(3) NOT NULL,
	`ends_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	CONSTRAINT `diary_holds_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`),
	CONSTRAINT `diary_holds_one_each` UNIQUE(`practice_id`,`held_by`)
);
--> statement-breakpoint
CREATE TABLE `diary_presence` (
	`practice_id` uuid NOT NULL,
	`appointment_id` uuid NOT NULL,
	`staff_member_id` uuid NOT NULL,
	`is_editing` boolean NOT NULL DEFAULT false,
	`seen_at` datetime(3) NOT NULL,
	CONSTRAINT `diary_presence_practice_id_appointment_id_staff_member_id_pk` PRIMARY KEY(`practice_id`,`appointment_id`,`staff_member_id`)
);
--> statement-breakpoint
CREATE TABLE `put_aside_items` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`staff_member_id` uuid NOT NULL,
	`kind` varchar(20) NOT NULL,
	`title` varchar(120) NOT NULL,
	`typed` json NOT NULL,
	`put_aside_at` datetime(3) NOT NULL,
	CONSTRAINT `put_aside_items_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `saved_views` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`staff_member_id` uuid NOT NULL,
	`name` varchar(60) NOT NULL,
	`address` varchar(500) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `saved_views_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`),
	CONSTRAINT `saved_views_name` UNIQUE(`practice_id`,`staff_member_id`,`name`)
);
--> statement-breakpoint
CREATE TABLE `api_keys` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`name` varchar(80) NOT NULL,
	`key_hash` binary(32) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`created_by` uuid NOT NULL,
	`last_used_at` datetime(3),
	`revoked_at` datetime(3),
	CONSTRAINT `api_keys_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`),
	CONSTRAINT `api_keys_hash` UNIQUE(`key_hash`)
);
--> statement-breakpoint
CREATE TABLE `calendar_feeds` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`staff_member_id` uuid NOT NULL,
	`token_hash` binary(32) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`last_read_at` datetime(3),
	`revoked_at` datetime(3),
	CONSTRAINT `calendar_feeds_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`),
	CONSTRAINT `calendar_feeds_token` UNIQUE(`token_hash`)
);
--> statement-breakpoint
CREATE TABLE `offer_rounds` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`site_id` uuid NOT NULL,
	`therapist_id` uuid NOT NULL,
	`room_id` uuid,
	`starts_at` datetime(3) NOT NULL,
	`ends_at` datetime(3) NOT NULL,
	`state` varchar(10) NOT NULL DEFAULT 'open',
	`expires_at` datetime(3) NOT NULL,
	`freed_by_id` uuid,
	`appointment_id` uuid,
	`version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	`created_by` uuid NOT NULL,
	CONSTRAINT `offer_rounds_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `waiting_entries` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`patient_id` uuid NOT NULL,
	`service_id` uuid NOT NULL,
	`wishes` json NOT NULL,
	`urgency` varchar(10) NOT NULL,
	`instead_of_id` uuid,
	`desk_note` varchar(300),
	`state` varchar(10) NOT NULL DEFAULT 'waiting',
	`waiting_since` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	`created_by` uuid NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `waiting_entries_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `waiting_offers` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`round_id` uuid NOT NULL,
	`entry_id` uuid NOT NULL,
	`rank` int NOT NULL,
	`token_hash` binary(32) NOT NULL,
	`state` varchar(10) NOT NULL DEFAULT 'open',
	`decided_at` datetime(3),
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `waiting_offers_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`),
	CONSTRAINT `waiting_offers_token` UNIQUE(`token_hash`),
	CONSTRAINT `waiting_offers_once` UNIQUE(`practice_id`,`round_id`,`entry_id`)
);
--> statement-breakpoint
CREATE TABLE `diary_settings` (
	`practice_id` uuid NOT NULL,
	`finding_weights` json,
	`reminder_hours` json,
	`has_names_in_feed` boolean NOT NULL DEFAULT false,
	`late_cancellation_fee_pence` bigint NOT NULL DEFAULT 0,
	`no_show_fee_pence` bigint NOT NULL DEFAULT 0,
	`offer_count` int NOT NULL DEFAULT 3,
	`offer_minutes` int NOT NULL DEFAULT 120,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `diary_settings_practice_id` PRIMARY KEY(`practice_id`)
);
--> statement-breakpoint
CREATE TABLE `site_travel` (
	`practice_id` uuid NOT NULL,
	`from_site_id` uuid NOT NULL,
	`to_site_id` uuid NOT NULL,
	`minutes` int NOT NULL,
	CONSTRAINT `site_travel_practice_id_from_site_id_to_site_id_pk` PRIMARY KEY(`practice_id`,`from_site_id`,`to_site_id`)
);
--> statement-breakpoint
ALTER TABLE `diary_claims` MODIFY COLUMN `appointment_id` uuid;--> statement-breakpoint
ALTER TABLE `appointments` ADD `course_id` uuid;--> statement-breakpoint
ALTER TABLE `diary_claims` ADD `class_session_id` uuid;--> statement-breakpoint
ALTER TABLE `services` ADD `needs_equipment` json DEFAULT ('[]') NOT NULL;--> statement-breakpoint
ALTER TABLE `rooms` ADD `equipment` json DEFAULT ('[]') NOT NULL;--> statement-breakpoint
ALTER TABLE `rooms` ADD `is_step_free` boolean DEFAULT false NOT NULL;--> statement-breakpoint
ALTER TABLE `leave_requests` ADD CONSTRAINT `leave_requests_member` FOREIGN KEY (`practice_id`,`staff_member_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `class_attendees` ADD CONSTRAINT `class_attendees_session` FOREIGN KEY (`practice_id`,`class_session_id`) REFERENCES `class_sessions`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `class_attendees` ADD CONSTRAINT `class_attendees_patient` FOREIGN KEY (`practice_id`,`patient_id`) REFERENCES `patients`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `class_sessions` ADD CONSTRAINT `class_sessions_site` FOREIGN KEY (`practice_id`,`site_id`) REFERENCES `sites`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `class_sessions` ADD CONSTRAINT `class_sessions_therapist` FOREIGN KEY (`practice_id`,`therapist_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `class_sessions` ADD CONSTRAINT `class_sessions_room` FOREIGN KEY (`practice_id`,`room_id`) REFERENCES `rooms`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `class_sessions` ADD CONSTRAINT `class_sessions_service` FOREIGN KEY (`practice_id`,`service_id`) REFERENCES `services`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `courses` ADD CONSTRAINT `courses_patient` FOREIGN KEY (`practice_id`,`patient_id`) REFERENCES `patients`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `courses` ADD CONSTRAINT `courses_service` FOREIGN KEY (`practice_id`,`service_id`) REFERENCES `services`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `courses` ADD CONSTRAINT `courses_site` FOREIGN KEY (`practice_id`,`site_id`) REFERENCES `sites`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `courses` ADD CONSTRAINT `courses_therapist` FOREIGN KEY (`practice_id`,`therapist_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cover_moves` ADD CONSTRAINT `cover_moves_plan` FOREIGN KEY (`practice_id`,`plan_id`) REFERENCES `cover_plans`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cover_moves` ADD CONSTRAINT `cover_moves_appointment` FOREIGN KEY (`practice_id`,`appointment_id`) REFERENCES `appointments`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cover_plans` ADD CONSTRAINT `cover_plans_therapist` FOREIGN KEY (`practice_id`,`therapist_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cover_plans` ADD CONSTRAINT `cover_plans_room` FOREIGN KEY (`practice_id`,`room_id`) REFERENCES `rooms`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `diary_holds` ADD CONSTRAINT `diary_holds_member` FOREIGN KEY (`practice_id`,`held_by`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `diary_holds` ADD CONSTRAINT `diary_holds_site` FOREIGN KEY (`practice_id`,`site_id`) REFERENCES `sites`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `diary_presence` ADD CONSTRAINT `diary_presence_appointment` FOREIGN KEY (`practice_id`,`appointment_id`) REFERENCES `appointments`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `diary_presence` ADD CONSTRAINT `diary_presence_member` FOREIGN KEY (`practice_id`,`staff_member_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `put_aside_items` ADD CONSTRAINT `put_aside_items_member` FOREIGN KEY (`practice_id`,`staff_member_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `saved_views` ADD CONSTRAINT `saved_views_member` FOREIGN KEY (`practice_id`,`staff_member_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `api_keys` ADD CONSTRAINT `api_keys_practice` FOREIGN KEY (`practice_id`) REFERENCES `practices`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `calendar_feeds` ADD CONSTRAINT `calendar_feeds_member` FOREIGN KEY (`practice_id`,`staff_member_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `offer_rounds` ADD CONSTRAINT `offer_rounds_site` FOREIGN KEY (`practice_id`,`site_id`) REFERENCES `sites`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `offer_rounds` ADD CONSTRAINT `offer_rounds_therapist` FOREIGN KEY (`practice_id`,`therapist_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `offer_rounds` ADD CONSTRAINT `offer_rounds_room` FOREIGN KEY (`practice_id`,`room_id`) REFERENCES `rooms`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `offer_rounds` ADD CONSTRAINT `offer_rounds_freed_by` FOREIGN KEY (`practice_id`,`freed_by_id`) REFERENCES `appointments`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `offer_rounds` ADD CONSTRAINT `offer_rounds_appointment` FOREIGN KEY (`practice_id`,`appointment_id`) REFERENCES `appointments`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `waiting_entries` ADD CONSTRAINT `waiting_entries_patient` FOREIGN KEY (`practice_id`,`patient_id`) REFERENCES `patients`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `waiting_entries` ADD CONSTRAINT `waiting_entries_service` FOREIGN KEY (`practice_id`,`service_id`) REFERENCES `services`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `waiting_entries` ADD CONSTRAINT `waiting_entries_instead_of` FOREIGN KEY (`practice_id`,`instead_of_id`) REFERENCES `appointments`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `waiting_offers` ADD CONSTRAINT `waiting_offers_round` FOREIGN KEY (`practice_id`,`round_id`) REFERENCES `offer_rounds`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `waiting_offers` ADD CONSTRAINT `waiting_offers_entry` FOREIGN KEY (`practice_id`,`entry_id`) REFERENCES `waiting_entries`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `diary_settings` ADD CONSTRAINT `diary_settings_practice` FOREIGN KEY (`practice_id`) REFERENCES `practices`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `site_travel` ADD CONSTRAINT `site_travel_from` FOREIGN KEY (`practice_id`,`from_site_id`) REFERENCES `sites`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `site_travel` ADD CONSTRAINT `site_travel_to` FOREIGN KEY (`practice_id`,`to_site_id`) REFERENCES `sites`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `leave_requests_by_state` ON `leave_requests` (`practice_id`,`state`,`starts_at`);--> statement-breakpoint
CREATE INDEX `leave_requests_by_member` ON `leave_requests` (`practice_id`,`staff_member_id`,`starts_at`);--> statement-breakpoint
CREATE INDEX `class_attendees_by_patient` ON `class_attendees` (`practice_id`,`patient_id`);--> statement-breakpoint
CREATE INDEX `class_sessions_by_site` ON `class_sessions` (`practice_id`,`site_id`,`starts_at`,`ends_at`);--> statement-breakpoint
CREATE INDEX `class_sessions_by_therapist` ON `class_sessions` (`practice_id`,`therapist_id`,`starts_at`,`ends_at`);--> statement-breakpoint
CREATE INDEX `courses_by_patient` ON `courses` (`practice_id`,`patient_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `cover_moves_by_plan` ON `cover_moves` (`practice_id`,`plan_id`);--> statement-breakpoint
CREATE INDEX `cover_plans_by_time` ON `cover_plans` (`practice_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `diary_holds_by_site` ON `diary_holds` (`practice_id`,`site_id`,`expires_at`);--> statement-breakpoint
CREATE INDEX `diary_presence_by_time` ON `diary_presence` (`practice_id`,`seen_at`);--> statement-breakpoint
CREATE INDEX `put_aside_items_by_member` ON `put_aside_items` (`practice_id`,`staff_member_id`,`put_aside_at`);--> statement-breakpoint
CREATE INDEX `calendar_feeds_by_member` ON `calendar_feeds` (`practice_id`,`staff_member_id`);--> statement-breakpoint
CREATE INDEX `offer_rounds_by_state` ON `offer_rounds` (`practice_id`,`state`,`expires_at`);--> statement-breakpoint
CREATE INDEX `waiting_entries_by_state` ON `waiting_entries` (`practice_id`,`state`,`waiting_since`);--> statement-breakpoint
CREATE INDEX `waiting_entries_by_patient` ON `waiting_entries` (`practice_id`,`patient_id`);--> statement-breakpoint
CREATE INDEX `waiting_offers_by_entry` ON `waiting_offers` (`practice_id`,`entry_id`,`created_at`);--> statement-breakpoint
ALTER TABLE `appointments` ADD CONSTRAINT `appointments_course` FOREIGN KEY (`practice_id`,`course_id`) REFERENCES `courses`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `diary_claims` ADD CONSTRAINT `diary_claims_class` FOREIGN KEY (`practice_id`,`class_session_id`) REFERENCES `class_sessions`(`practice_id`,`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `appointments_by_course` ON `appointments` (`practice_id`,`course_id`,`starts_at`);--> statement-breakpoint
CREATE INDEX `diary_claims_by_class` ON `diary_claims` (`practice_id`,`class_session_id`);