CREATE TABLE `audit_events` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`at` datetime(3) NOT NULL,
	`actor_id` uuid,
	`action` varchar(60) NOT NULL,
	`subject_kind` varchar(30) NOT NULL,
	`subject_id` uuid NOT NULL,
	`patient_id` uuid,
	`site_id` uuid,
	`request_id` varchar(40) NOT NULL,
	`detail` json NOT NULL,
	CONSTRAINT `audit_events_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `invoice_counters` (
	`practice_id` uuid NOT NULL,
	`series` varchar(12) NOT NULL,
	`next_number` int NOT NULL,
	CONSTRAINT `invoice_counters_practice_id_series_pk` PRIMARY KEY(`practice_id`,`series`)
);
--> statement-breakpoint
CREATE TABLE `invoice_lines` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`invoice_id` uuid NOT NULL,
	`position` int NOT NULL,
	`kind` varchar(10) NOT NULL,
	`appointment_id` uuid,
	`product_id` uuid,
	`description` varchar(200) NOT NULL,
	`quantity` int NOT NULL DEFAULT 1,
	`unit_pence` bigint NOT NULL,
	`discount_basis_points` int NOT NULL DEFAULT 0,
	`vat_treatment` varchar(15) NOT NULL,
	`vat_basis_points` int NOT NULL,
	`net_pence` bigint NOT NULL,
	`vat_pence` bigint NOT NULL,
	`total_pence` bigint NOT NULL,
	CONSTRAINT `invoice_lines_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`),
	CONSTRAINT `invoice_lines_visit_once` UNIQUE(`practice_id`,`appointment_id`),
	CONSTRAINT `invoice_lines_order` UNIQUE(`practice_id`,`invoice_id`,`position`)
);
--> statement-breakpoint
CREATE TABLE `invoices` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`number` int,
	`reference` varchar(20),
	`state` varchar(10) NOT NULL DEFAULT 'draft',
	`patient_id` uuid NOT NULL,
	`payer_id` uuid,
	`site_id` uuid NOT NULL,
	`bill_to` json NOT NULL,
	`issued_on` date,
	`due_on` date,
	`net_pence` bigint NOT NULL DEFAULT 0,
	`vat_pence` bigint NOT NULL DEFAULT 0,
	`total_pence` bigint NOT NULL DEFAULT 0,
	`paid_pence` bigint NOT NULL DEFAULT 0,
	`vat_rounding` varchar(20) NOT NULL,
	`vat_number` varchar(20),
	`void_reason` varchar(200),
	`version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	`created_by` uuid NOT NULL,
	`issued_at` datetime(3),
	`issued_by` uuid,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `invoices_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`),
	CONSTRAINT `invoices_number` UNIQUE(`practice_id`,`number`),
	CONSTRAINT `invoices_reference` UNIQUE(`practice_id`,`reference`)
);
--> statement-breakpoint
CREATE TABLE `card_attempts` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`invoice_id` uuid NOT NULL,
	`amount_pence` bigint NOT NULL,
	`state` varchar(10) NOT NULL,
	`session_reference` varchar(120),
	`payment_reference` varchar(120),
	`started_by` uuid NOT NULL,
	`started_at` datetime(3) NOT NULL,
	`settled_at` datetime(3),
	CONSTRAINT `card_attempts_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`),
	CONSTRAINT `card_attempts_session` UNIQUE(`session_reference`)
);
--> statement-breakpoint
CREATE TABLE `card_events` (
	`id` varchar(120) NOT NULL,
	`kind` varchar(60) NOT NULL,
	`received_at` datetime(3) NOT NULL,
	`detail` json NOT NULL,
	CONSTRAINT `card_events_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `payments` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`invoice_id` uuid NOT NULL,
	`site_id` uuid NOT NULL,
	`method` varchar(10) NOT NULL,
	`amount_pence` bigint NOT NULL,
	`refunded_pence` bigint NOT NULL DEFAULT 0,
	`reference` varchar(80),
	`card_attempt_id` uuid,
	`received_at` datetime(3) NOT NULL,
	`taken_by` uuid,
	CONSTRAINT `payments_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`),
	CONSTRAINT `payments_card_once` UNIQUE(`practice_id`,`card_attempt_id`)
);
--> statement-breakpoint
CREATE TABLE `refunds` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`payment_id` uuid NOT NULL,
	`invoice_id` uuid NOT NULL,
	`amount_pence` bigint NOT NULL,
	`reason` varchar(200) NOT NULL,
	`state` varchar(8) NOT NULL,
	`card_reference` varchar(80),
	`refunded_at` datetime(3) NOT NULL,
	`refunded_by` uuid NOT NULL,
	CONSTRAINT `refunds_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `prices` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`service_id` uuid,
	`product_id` uuid,
	`site_id` uuid,
	`payer_id` uuid,
	`amount_pence` bigint NOT NULL,
	`vat_treatment` varchar(15) NOT NULL,
	`valid_from` date NOT NULL,
	`valid_until` date,
	CONSTRAINT `prices_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `products` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`name` varchar(80) NOT NULL,
	`vat_treatment` varchar(15) NOT NULL DEFAULT 'standard',
	`is_active` boolean NOT NULL DEFAULT true,
	CONSTRAINT `products_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `episodes` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`patient_id` uuid NOT NULL,
	`therapist_id` uuid NOT NULL,
	`site_id` uuid NOT NULL,
	`problem` varchar(160) NOT NULL,
	`region` varchar(20) NOT NULL,
	`side` varchar(8) NOT NULL,
	`referral_source` varchar(20) NOT NULL DEFAULT 'self',
	`referred_by` varchar(160),
	`referred_on` date,
	`reason` text,
	`goals` json NOT NULL,
	`planned_visits` int,
	`state` varchar(12) NOT NULL DEFAULT 'open',
	`opened_on` date NOT NULL,
	`discharged_at` datetime(3),
	`discharged_by` uuid,
	`outcome` varchar(30),
	`red_flags` json NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `episodes_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `measure_records` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`episode_id` uuid NOT NULL,
	`patient_id` uuid NOT NULL,
	`note_id` uuid,
	`measure_key` varchar(40) NOT NULL,
	`rule_version` varchar(20) NOT NULL,
	`answers` json NOT NULL,
	`scores` json NOT NULL,
	`taken_on` date NOT NULL,
	`entered_by` uuid NOT NULL,
	`entered_at` datetime(3) NOT NULL,
	`replaced_by` uuid,
	CONSTRAINT `measure_records_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `note_addenda` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`note_id` uuid NOT NULL,
	`text` text NOT NULL,
	`reason` varchar(200) NOT NULL,
	`author_id` uuid NOT NULL,
	`author_name` varchar(130) NOT NULL,
	`registration_number` varchar(10),
	`written_at` datetime(3) NOT NULL,
	CONSTRAINT `note_addenda_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `note_versions` (
	`practice_id` uuid NOT NULL,
	`note_id` uuid NOT NULL,
	`version` int NOT NULL,
	`body` json NOT NULL,
	`saved_at` datetime(3) NOT NULL,
	`saved_by` uuid NOT NULL,
	CONSTRAINT `note_versions_practice_id_note_id_version_pk` PRIMARY KEY(`practice_id`,`note_id`,`version`)
);
--> statement-breakpoint
CREATE TABLE `notes` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`episode_id` uuid NOT NULL,
	`patient_id` uuid NOT NULL,
	`appointment_id` uuid,
	`author_id` uuid NOT NULL,
	`kind` varchar(10) NOT NULL,
	`state` varchar(8) NOT NULL DEFAULT 'draft',
	`body` json NOT NULL,
	`visit_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	`signed_at` datetime(3),
	`signed_by` uuid,
	`signed_name` varchar(130),
	`registration_number` varchar(10),
	`body_hash` varchar(64),
	CONSTRAINT `notes_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`),
	CONSTRAINT `notes_one_per_visit` UNIQUE(`practice_id`,`appointment_id`)
);
--> statement-breakpoint
CREATE TABLE `programme_versions` (
	`practice_id` uuid NOT NULL,
	`programme_id` uuid NOT NULL,
	`version_number` int NOT NULL,
	`content` json NOT NULL,
	`saved_at` datetime(3) NOT NULL,
	`saved_by` uuid NOT NULL,
	`issued_at` datetime(3),
	`issued_by` uuid,
	CONSTRAINT `programme_versions_practice_id_programme_id_version_number_pk` PRIMARY KEY(`practice_id`,`programme_id`,`version_number`)
);
--> statement-breakpoint
CREATE TABLE `programmes` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`episode_id` uuid NOT NULL,
	`patient_id` uuid NOT NULL,
	`title` varchar(120) NOT NULL,
	`current_version` int NOT NULL DEFAULT 1,
	`version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	`created_by` uuid NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `programmes_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `absences` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`staff_member_id` uuid,
	`room_id` uuid,
	`kind` varchar(10) NOT NULL,
	`reason` varchar(120) NOT NULL,
	`starts_at` datetime(3) NOT NULL,
	`ends_at` datetime(3) NOT NULL,
	`created_by` uuid NOT NULL,
	CONSTRAINT `absences_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `appointment_changes` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`appointment_id` uuid NOT NULL,
	`site_id` uuid NOT NULL,
	`kind` varchar(12) NOT NULL,
	`before` json,
	`after` json NOT NULL,
	`changed_by` uuid NOT NULL,
	`changed_at` datetime(3) NOT NULL,
	`undone_at` datetime(3),
	CONSTRAINT `appointment_changes_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `appointments` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`site_id` uuid NOT NULL,
	`therapist_id` uuid NOT NULL,
	`room_id` uuid NOT NULL,
	`patient_id` uuid NOT NULL,
	`service_id` uuid NOT NULL,
	`episode_id` uuid,
	`starts_at` datetime(3) NOT NULL,
	`ends_at` datetime(3) NOT NULL,
	`clean_down_minutes` int NOT NULL DEFAULT 0,
	`state` varchar(12) NOT NULL DEFAULT 'booked',
	`desk_note` varchar(300),
	`override_reason` varchar(200),
	`arrived_at` datetime(3),
	`session_started_at` datetime(3),
	`session_ended_at` datetime(3),
	`cancelled_at` datetime(3),
	`cancelled_by` varchar(10),
	`cancel_reason` varchar(200),
	`is_late_cancellation` boolean NOT NULL DEFAULT false,
	`version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	`created_by` uuid NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `appointments_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `diary_claims` (
	`practice_id` uuid NOT NULL,
	`resource_id` uuid NOT NULL,
	`slot_at` datetime(3) NOT NULL,
	`appointment_id` uuid NOT NULL,
	CONSTRAINT `diary_claims_practice_id_resource_id_slot_at_pk` PRIMARY KEY(`practice_id`,`resource_id`,`slot_at`)
);
--> statement-breakpoint
CREATE TABLE `service_therapists` (
	`practice_id` uuid NOT NULL,
	`service_id` uuid NOT NULL,
	`staff_member_id` uuid NOT NULL,
	CONSTRAINT `service_therapists_practice_id_service_id_staff_member_id_pk` PRIMARY KEY(`practice_id`,`service_id`,`staff_member_id`)
);
--> statement-breakpoint
CREATE TABLE `services` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`name` varchar(80) NOT NULL,
	`kind` varchar(12) NOT NULL,
	`duration_minutes` int NOT NULL,
	`clean_down_minutes` int NOT NULL DEFAULT 0,
	`room_kind` varchar(20) NOT NULL DEFAULT 'treatment',
	`is_active` boolean NOT NULL DEFAULT true,
	`position` int NOT NULL DEFAULT 0,
	CONSTRAINT `services_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `working_patterns` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`staff_member_id` uuid NOT NULL,
	`site_id` uuid NOT NULL,
	`weekday` int NOT NULL,
	`starts_at` varchar(5) NOT NULL,
	`ends_at` varchar(5) NOT NULL,
	`breaks` json NOT NULL,
	`valid_from` date NOT NULL,
	`valid_until` date,
	`every_weeks` int NOT NULL DEFAULT 1,
	CONSTRAINT `working_patterns_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `letter_deliveries` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`letter_id` uuid NOT NULL,
	`channel` varchar(8) NOT NULL,
	`to_name` varchar(160) NOT NULL,
	`to_address` varchar(254) NOT NULL,
	`outbox_message_id` uuid,
	`requested_by` uuid NOT NULL,
	`requested_at` datetime(3) NOT NULL,
	`posted_on` date,
	CONSTRAINT `letter_deliveries_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `letters` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`episode_id` uuid NOT NULL,
	`patient_id` uuid NOT NULL,
	`author_id` uuid NOT NULL,
	`kind` varchar(20) NOT NULL,
	`reference` varchar(20) NOT NULL,
	`state` varchar(8) NOT NULL DEFAULT 'draft',
	`recipient` json NOT NULL,
	`sections` json NOT NULL,
	`dated_on` date NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	`signed_at` datetime(3),
	`signed_by` uuid,
	`signed_name` varchar(130),
	`registration_number` varchar(10),
	`body_hash` varchar(64),
	CONSTRAINT `letters_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`),
	CONSTRAINT `letters_reference` UNIQUE(`practice_id`,`reference`)
);
--> statement-breakpoint
CREATE TABLE `jobs` (
	`id` uuid NOT NULL,
	`practice_id` uuid NOT NULL,
	`kind` varchar(40) NOT NULL,
	`input` json NOT NULL,
	`state` varchar(8) NOT NULL DEFAULT 'waiting',
	`progress_done` int NOT NULL DEFAULT 0,
	`progress_total` int NOT NULL DEFAULT 0,
	`due_at` datetime(3) NOT NULL,
	`attempts` int NOT NULL DEFAULT 0,
	`claimed_at` datetime(3),
	`claimed_by` varchar(40),
	`finished_at` datetime(3),
	`last_error` varchar(200),
	`requested_by` uuid,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `jobs_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `worker_heartbeats` (
	`worker_id` varchar(40) NOT NULL,
	`started_at` datetime(3) NOT NULL,
	`beat_at` datetime(3) NOT NULL,
	CONSTRAINT `worker_heartbeats_worker_id` PRIMARY KEY(`worker_id`)
);
--> statement-breakpoint
CREATE TABLE `outbox_messages` (
	`id` uuid NOT NULL,
	`practice_id` uuid NOT NULL,
	`channel` varchar(6) NOT NULL,
	`template` varchar(40) NOT NULL,
	`to_address` varchar(254) NOT NULL,
	`payload` json NOT NULL,
	`about_kind` varchar(20) NOT NULL,
	`about_id` uuid NOT NULL,
	`patient_id` uuid,
	`dedupe_key` varchar(120) NOT NULL,
	`state` varchar(8) NOT NULL DEFAULT 'waiting',
	`due_at` datetime(3) NOT NULL,
	`attempts` int NOT NULL DEFAULT 0,
	`claimed_at` datetime(3),
	`claimed_by` varchar(40),
	`sent_at` datetime(3),
	`last_error` varchar(200),
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `outbox_messages_id` PRIMARY KEY(`id`),
	CONSTRAINT `outbox_messages_once` UNIQUE(`practice_id`,`dedupe_key`)
);
--> statement-breakpoint
CREATE TABLE `consents` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`patient_id` uuid NOT NULL,
	`kind` varchar(20) NOT NULL,
	`wording_version` varchar(10) NOT NULL,
	`given_at` datetime(3) NOT NULL,
	`recorded_by` uuid NOT NULL,
	`withdrawn_at` datetime(3),
	CONSTRAINT `consents_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `gp_practices` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`name` varchar(120) NOT NULL,
	`address_lines` json NOT NULL,
	`postcode` varchar(10) NOT NULL,
	`phone` varchar(20),
	`email` varchar(254),
	`ods_code` varchar(9),
	CONSTRAINT `gp_practices_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `patient_alerts` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`patient_id` uuid NOT NULL,
	`text` varchar(200) NOT NULL,
	`is_clinical` boolean NOT NULL DEFAULT false,
	`created_at` datetime(3) NOT NULL,
	`created_by` uuid NOT NULL,
	`resolved_at` datetime(3),
	CONSTRAINT `patient_alerts_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `patients` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`given_name` varchar(80) NOT NULL,
	`family_name` varchar(80) NOT NULL,
	`preferred_name` varchar(80),
	`born_on` date NOT NULL,
	`sex` varchar(10),
	`phone` varchar(20),
	`email` varchar(254),
	`address_lines` json NOT NULL,
	`postcode` varchar(10),
	`nhs_number` varchar(10),
	`gp_practice_id` uuid,
	`gp_name` varchar(120),
	`communication_needs` varchar(300),
	`preferred_channel` varchar(10) NOT NULL DEFAULT 'email',
	`next_of_kin` varchar(160),
	`home_site_id` uuid NOT NULL,
	`usual_therapist_id` uuid,
	`name_last_first` varchar(170) NOT NULL,
	`name_first_last` varchar(170) NOT NULL,
	`phone_reversed` varchar(20),
	`version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `patients_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `patient_payers` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`patient_id` uuid NOT NULL,
	`payer_id` uuid NOT NULL,
	`policy_number` varchar(40),
	`authorisation_code` varchar(40),
	`sessions_authorised` int,
	`excess_pence` bigint NOT NULL DEFAULT 0,
	`is_current` boolean NOT NULL DEFAULT true,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `patient_payers_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `payers` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`name` varchar(120) NOT NULL,
	`kind` varchar(12) NOT NULL,
	`address_lines` json NOT NULL,
	`postcode` varchar(10) NOT NULL,
	`email` varchar(254),
	`payment_days` int NOT NULL DEFAULT 30,
	CONSTRAINT `payers_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `account_tokens` (
	`id` uuid NOT NULL,
	`practice_id` uuid NOT NULL,
	`staff_member_id` uuid NOT NULL,
	`purpose` varchar(12) NOT NULL,
	`token_hash` varchar(64) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`used_at` datetime(3),
	CONSTRAINT `account_tokens_id` PRIMARY KEY(`id`),
	CONSTRAINT `account_tokens_hash` UNIQUE(`token_hash`)
);
--> statement-breakpoint
CREATE TABLE `idempotency_keys` (
	`practice_id` uuid NOT NULL,
	`key` varchar(64) NOT NULL,
	`verb` varchar(60) NOT NULL,
	`staff_member_id` uuid NOT NULL,
	`answer` json NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `idempotency_keys_practice_id_key_pk` PRIMARY KEY(`practice_id`,`key`)
);
--> statement-breakpoint
CREATE TABLE `practices` (
	`id` uuid NOT NULL,
	`name` varchar(120) NOT NULL,
	`legal_name` varchar(160) NOT NULL,
	`address_lines` json NOT NULL,
	`postcode` varchar(10) NOT NULL,
	`phone` varchar(20) NOT NULL,
	`email` varchar(254) NOT NULL,
	`currency` varchar(3) NOT NULL DEFAULT 'GBP',
	`zone` varchar(40) NOT NULL DEFAULT 'Europe/London',
	`vat_number` varchar(20),
	`invoice_prefix` varchar(6) NOT NULL,
	`vat_rounding` varchar(20) NOT NULL DEFAULT 'line-nearest',
	`payment_days` int NOT NULL DEFAULT 14,
	`notice_hours` int NOT NULL DEFAULT 24,
	`utilisation_target` int NOT NULL DEFAULT 85,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `practices_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `request_limits` (
	`key` varchar(255) NOT NULL,
	`points` int NOT NULL DEFAULT 0,
	`expire` bigint,
	CONSTRAINT `request_limits_key` PRIMARY KEY(`key`)
);
--> statement-breakpoint
CREATE TABLE `rooms` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`site_id` uuid NOT NULL,
	`name` varchar(40) NOT NULL,
	`kind` varchar(20) NOT NULL DEFAULT 'treatment',
	`position` int NOT NULL DEFAULT 0,
	CONSTRAINT `rooms_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `sessions` (
	`id` uuid NOT NULL,
	`practice_id` uuid NOT NULL,
	`staff_member_id` uuid NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`last_seen_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`revoked_at` datetime(3),
	`user_agent` varchar(200) NOT NULL DEFAULT '',
	`desk_site_id` uuid NOT NULL,
	CONSTRAINT `sessions_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `site_closures` (
	`practice_id` uuid NOT NULL,
	`site_id` uuid NOT NULL,
	`closed_on` date NOT NULL,
	`reason` varchar(120) NOT NULL,
	CONSTRAINT `site_closures_practice_id_site_id_closed_on_pk` PRIMARY KEY(`practice_id`,`site_id`,`closed_on`)
);
--> statement-breakpoint
CREATE TABLE `site_hours` (
	`practice_id` uuid NOT NULL,
	`site_id` uuid NOT NULL,
	`weekday` int NOT NULL,
	`opens_at` varchar(5) NOT NULL,
	`closes_at` varchar(5) NOT NULL,
	CONSTRAINT `site_hours_practice_id_site_id_weekday_pk` PRIMARY KEY(`practice_id`,`site_id`,`weekday`)
);
--> statement-breakpoint
CREATE TABLE `sites` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`name` varchar(80) NOT NULL,
	`address_lines` json NOT NULL,
	`postcode` varchar(10) NOT NULL,
	`phone` varchar(20) NOT NULL,
	`zone` varchar(40) NOT NULL DEFAULT 'Europe/London',
	`nation` varchar(20) NOT NULL DEFAULT 'england',
	`is_step_free` boolean NOT NULL DEFAULT false,
	`position` int NOT NULL DEFAULT 0,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `sites_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `staff_accounts` (
	`id` uuid NOT NULL,
	`practice_id` uuid NOT NULL,
	`staff_member_id` uuid NOT NULL,
	`email` varchar(254) NOT NULL,
	`password_hash` varchar(200),
	`password_changed_at` datetime(3),
	CONSTRAINT `staff_accounts_id` PRIMARY KEY(`id`),
	CONSTRAINT `staff_accounts_email` UNIQUE(`email`),
	CONSTRAINT `staff_accounts_member` UNIQUE(`practice_id`,`staff_member_id`)
);
--> statement-breakpoint
CREATE TABLE `staff_members` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`given_name` varchar(60) NOT NULL,
	`family_name` varchar(60) NOT NULL,
	`job_title` varchar(60) NOT NULL,
	`registration_number` varchar(10),
	`is_therapist` boolean NOT NULL DEFAULT false,
	`is_active` boolean NOT NULL DEFAULT true,
	`home_site_id` uuid NOT NULL,
	`position` int NOT NULL DEFAULT 0,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `staff_members_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `staff_roles` (
	`practice_id` uuid NOT NULL,
	`id` uuid NOT NULL,
	`staff_member_id` uuid NOT NULL,
	`site_id` uuid,
	`role` varchar(20) NOT NULL,
	CONSTRAINT `staff_roles_practice_id_id_pk` PRIMARY KEY(`practice_id`,`id`)
);
--> statement-breakpoint
ALTER TABLE `invoice_lines` ADD CONSTRAINT `invoice_lines_invoice` FOREIGN KEY (`practice_id`,`invoice_id`) REFERENCES `invoices`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invoice_lines` ADD CONSTRAINT `invoice_lines_visit` FOREIGN KEY (`practice_id`,`appointment_id`) REFERENCES `appointments`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invoice_lines` ADD CONSTRAINT `invoice_lines_product` FOREIGN KEY (`practice_id`,`product_id`) REFERENCES `products`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invoices` ADD CONSTRAINT `invoices_patient` FOREIGN KEY (`practice_id`,`patient_id`) REFERENCES `patients`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invoices` ADD CONSTRAINT `invoices_payer` FOREIGN KEY (`practice_id`,`payer_id`) REFERENCES `payers`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invoices` ADD CONSTRAINT `invoices_site` FOREIGN KEY (`practice_id`,`site_id`) REFERENCES `sites`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `card_attempts` ADD CONSTRAINT `card_attempts_invoice` FOREIGN KEY (`practice_id`,`invoice_id`) REFERENCES `invoices`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `payments` ADD CONSTRAINT `payments_invoice` FOREIGN KEY (`practice_id`,`invoice_id`) REFERENCES `invoices`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `payments` ADD CONSTRAINT `payments_site` FOREIGN KEY (`practice_id`,`site_id`) REFERENCES `sites`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `refunds` ADD CONSTRAINT `refunds_payment` FOREIGN KEY (`practice_id`,`payment_id`) REFERENCES `payments`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `refunds` ADD CONSTRAINT `refunds_invoice` FOREIGN KEY (`practice_id`,`invoice_id`) REFERENCES `invoices`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `prices` ADD CONSTRAINT `prices_service` FOREIGN KEY (`practice_id`,`service_id`) REFERENCES `services`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `prices` ADD CONSTRAINT `prices_product` FOREIGN KEY (`practice_id`,`product_id`) REFERENCES `products`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `prices` ADD CONSTRAINT `prices_site` FOREIGN KEY (`practice_id`,`site_id`) REFERENCES `sites`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `prices` ADD CONSTRAINT `prices_payer` FOREIGN KEY (`practice_id`,`payer_id`) REFERENCES `payers`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `products` ADD CONSTRAINT `products_practice` FOREIGN KEY (`practice_id`) REFERENCES `practices`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `episodes` ADD CONSTRAINT `episodes_patient` FOREIGN KEY (`practice_id`,`patient_id`) REFERENCES `patients`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `episodes` ADD CONSTRAINT `episodes_therapist` FOREIGN KEY (`practice_id`,`therapist_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `episodes` ADD CONSTRAINT `episodes_site` FOREIGN KEY (`practice_id`,`site_id`) REFERENCES `sites`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `measure_records` ADD CONSTRAINT `measure_records_episode` FOREIGN KEY (`practice_id`,`episode_id`) REFERENCES `episodes`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `measure_records` ADD CONSTRAINT `measure_records_patient` FOREIGN KEY (`practice_id`,`patient_id`) REFERENCES `patients`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `measure_records` ADD CONSTRAINT `measure_records_note` FOREIGN KEY (`practice_id`,`note_id`) REFERENCES `notes`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `note_addenda` ADD CONSTRAINT `note_addenda_note` FOREIGN KEY (`practice_id`,`note_id`) REFERENCES `notes`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `note_versions` ADD CONSTRAINT `note_versions_note` FOREIGN KEY (`practice_id`,`note_id`) REFERENCES `notes`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notes` ADD CONSTRAINT `notes_episode` FOREIGN KEY (`practice_id`,`episode_id`) REFERENCES `episodes`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notes` ADD CONSTRAINT `notes_patient` FOREIGN KEY (`practice_id`,`patient_id`) REFERENCES `patients`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notes` ADD CONSTRAINT `notes_appointment` FOREIGN KEY (`practice_id`,`appointment_id`) REFERENCES `appointments`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `notes` ADD CONSTRAINT `notes_author` FOREIGN KEY (`practice_id`,`author_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `programme_versions` ADD CONSTRAINT `programme_versions_programme` FOREIGN KEY (`practice_id`,`programme_id`) REFERENCES `programmes`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `programmes` ADD CONSTRAINT `programmes_episode` FOREIGN KEY (`practice_id`,`episode_id`) REFERENCES `episodes`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `programmes` ADD CONSTRAINT `programmes_patient` FOREIGN KEY (`practice_id`,`patient_id`) REFERENCES `patients`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `absences` ADD CONSTRAINT `absences_member` FOREIGN KEY (`practice_id`,`staff_member_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `absences` ADD CONSTRAINT `absences_room` FOREIGN KEY (`practice_id`,`room_id`) REFERENCES `rooms`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `appointment_changes` ADD CONSTRAINT `appointment_changes_appointment` FOREIGN KEY (`practice_id`,`appointment_id`) REFERENCES `appointments`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `appointments` ADD CONSTRAINT `appointments_site` FOREIGN KEY (`practice_id`,`site_id`) REFERENCES `sites`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `appointments` ADD CONSTRAINT `appointments_therapist` FOREIGN KEY (`practice_id`,`therapist_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `appointments` ADD CONSTRAINT `appointments_room` FOREIGN KEY (`practice_id`,`room_id`) REFERENCES `rooms`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `appointments` ADD CONSTRAINT `appointments_patient` FOREIGN KEY (`practice_id`,`patient_id`) REFERENCES `patients`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `appointments` ADD CONSTRAINT `appointments_service` FOREIGN KEY (`practice_id`,`service_id`) REFERENCES `services`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `appointments` ADD CONSTRAINT `appointments_episode` FOREIGN KEY (`practice_id`,`episode_id`) REFERENCES `episodes`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `diary_claims` ADD CONSTRAINT `diary_claims_appointment` FOREIGN KEY (`practice_id`,`appointment_id`) REFERENCES `appointments`(`practice_id`,`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `service_therapists` ADD CONSTRAINT `service_therapists_service` FOREIGN KEY (`practice_id`,`service_id`) REFERENCES `services`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `service_therapists` ADD CONSTRAINT `service_therapists_member` FOREIGN KEY (`practice_id`,`staff_member_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `services` ADD CONSTRAINT `services_practice` FOREIGN KEY (`practice_id`) REFERENCES `practices`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `working_patterns` ADD CONSTRAINT `working_patterns_member` FOREIGN KEY (`practice_id`,`staff_member_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `working_patterns` ADD CONSTRAINT `working_patterns_site` FOREIGN KEY (`practice_id`,`site_id`) REFERENCES `sites`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `letter_deliveries` ADD CONSTRAINT `letter_deliveries_letter` FOREIGN KEY (`practice_id`,`letter_id`) REFERENCES `letters`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `letters` ADD CONSTRAINT `letters_episode` FOREIGN KEY (`practice_id`,`episode_id`) REFERENCES `episodes`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `letters` ADD CONSTRAINT `letters_patient` FOREIGN KEY (`practice_id`,`patient_id`) REFERENCES `patients`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `letters` ADD CONSTRAINT `letters_author` FOREIGN KEY (`practice_id`,`author_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `consents` ADD CONSTRAINT `consents_patient` FOREIGN KEY (`practice_id`,`patient_id`) REFERENCES `patients`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `gp_practices` ADD CONSTRAINT `gp_practices_practice` FOREIGN KEY (`practice_id`) REFERENCES `practices`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `patient_alerts` ADD CONSTRAINT `patient_alerts_patient` FOREIGN KEY (`practice_id`,`patient_id`) REFERENCES `patients`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `patients` ADD CONSTRAINT `patients_practice` FOREIGN KEY (`practice_id`) REFERENCES `practices`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `patients` ADD CONSTRAINT `patients_site` FOREIGN KEY (`practice_id`,`home_site_id`) REFERENCES `sites`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `patients` ADD CONSTRAINT `patients_gp` FOREIGN KEY (`practice_id`,`gp_practice_id`) REFERENCES `gp_practices`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `patients` ADD CONSTRAINT `patients_therapist` FOREIGN KEY (`practice_id`,`usual_therapist_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `patient_payers` ADD CONSTRAINT `patient_payers_patient` FOREIGN KEY (`practice_id`,`patient_id`) REFERENCES `patients`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `patient_payers` ADD CONSTRAINT `patient_payers_payer` FOREIGN KEY (`practice_id`,`payer_id`) REFERENCES `payers`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `payers` ADD CONSTRAINT `payers_practice` FOREIGN KEY (`practice_id`) REFERENCES `practices`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `account_tokens` ADD CONSTRAINT `account_tokens_member` FOREIGN KEY (`practice_id`,`staff_member_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `rooms` ADD CONSTRAINT `rooms_site` FOREIGN KEY (`practice_id`,`site_id`) REFERENCES `sites`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sessions` ADD CONSTRAINT `sessions_member` FOREIGN KEY (`practice_id`,`staff_member_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `site_closures` ADD CONSTRAINT `site_closures_site` FOREIGN KEY (`practice_id`,`site_id`) REFERENCES `sites`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `site_hours` ADD CONSTRAINT `site_hours_site` FOREIGN KEY (`practice_id`,`site_id`) REFERENCES `sites`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sites` ADD CONSTRAINT `sites_practice` FOREIGN KEY (`practice_id`) REFERENCES `practices`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `staff_accounts` ADD CONSTRAINT `staff_accounts_member_fk` FOREIGN KEY (`practice_id`,`staff_member_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `staff_members` ADD CONSTRAINT `staff_members_practice` FOREIGN KEY (`practice_id`) REFERENCES `practices`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `staff_members` ADD CONSTRAINT `staff_members_site` FOREIGN KEY (`practice_id`,`home_site_id`) REFERENCES `sites`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `staff_roles` ADD CONSTRAINT `staff_roles_member` FOREIGN KEY (`practice_id`,`staff_member_id`) REFERENCES `staff_members`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `staff_roles` ADD CONSTRAINT `staff_roles_site` FOREIGN KEY (`practice_id`,`site_id`) REFERENCES `sites`(`practice_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `audit_events_by_patient` ON `audit_events` (`practice_id`,`patient_id`,`at`);--> statement-breakpoint
CREATE INDEX `audit_events_by_time` ON `audit_events` (`practice_id`,`at`);--> statement-breakpoint
CREATE INDEX `audit_events_by_subject` ON `audit_events` (`practice_id`,`subject_kind`,`subject_id`,`at`);--> statement-breakpoint
CREATE INDEX `audit_events_by_actor` ON `audit_events` (`practice_id`,`actor_id`,`at`);--> statement-breakpoint
CREATE INDEX `invoices_by_patient` ON `invoices` (`practice_id`,`patient_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `invoices_by_state` ON `invoices` (`practice_id`,`state`,`due_on`);--> statement-breakpoint
CREATE INDEX `invoices_by_issue` ON `invoices` (`practice_id`,`issued_on`);--> statement-breakpoint
CREATE INDEX `card_attempts_by_invoice` ON `card_attempts` (`practice_id`,`invoice_id`,`started_at`);--> statement-breakpoint
CREATE INDEX `card_attempts_open` ON `card_attempts` (`state`,`started_at`);--> statement-breakpoint
CREATE INDEX `payments_by_invoice` ON `payments` (`practice_id`,`invoice_id`,`received_at`);--> statement-breakpoint
CREATE INDEX `payments_by_day` ON `payments` (`practice_id`,`received_at`);--> statement-breakpoint
CREATE INDEX `refunds_by_invoice` ON `refunds` (`practice_id`,`invoice_id`);--> statement-breakpoint
CREATE INDEX `refunds_by_day` ON `refunds` (`practice_id`,`refunded_at`);--> statement-breakpoint
CREATE INDEX `prices_by_service` ON `prices` (`practice_id`,`service_id`,`valid_from`);--> statement-breakpoint
CREATE INDEX `prices_by_product` ON `prices` (`practice_id`,`product_id`,`valid_from`);--> statement-breakpoint
CREATE INDEX `episodes_by_patient` ON `episodes` (`practice_id`,`patient_id`,`opened_on`);--> statement-breakpoint
CREATE INDEX `episodes_by_therapist` ON `episodes` (`practice_id`,`therapist_id`,`state`,`opened_on`);--> statement-breakpoint
CREATE INDEX `measure_records_by_episode` ON `measure_records` (`practice_id`,`episode_id`,`measure_key`,`taken_on`);--> statement-breakpoint
CREATE INDEX `measure_records_by_patient` ON `measure_records` (`practice_id`,`patient_id`,`taken_on`);--> statement-breakpoint
CREATE INDEX `note_addenda_by_note` ON `note_addenda` (`practice_id`,`note_id`,`written_at`);--> statement-breakpoint
CREATE INDEX `notes_by_episode` ON `notes` (`practice_id`,`episode_id`,`visit_at`);--> statement-breakpoint
CREATE INDEX `notes_by_author` ON `notes` (`practice_id`,`author_id`,`state`,`visit_at`);--> statement-breakpoint
CREATE INDEX `notes_by_patient` ON `notes` (`practice_id`,`patient_id`,`visit_at`);--> statement-breakpoint
CREATE INDEX `programmes_by_patient` ON `programmes` (`practice_id`,`patient_id`,`updated_at`);--> statement-breakpoint
CREATE INDEX `programmes_by_episode` ON `programmes` (`practice_id`,`episode_id`);--> statement-breakpoint
CREATE INDEX `absences_by_member` ON `absences` (`practice_id`,`staff_member_id`,`ends_at`,`starts_at`);--> statement-breakpoint
CREATE INDEX `absences_by_room` ON `absences` (`practice_id`,`room_id`,`ends_at`,`starts_at`);--> statement-breakpoint
CREATE INDEX `appointment_changes_by_site` ON `appointment_changes` (`practice_id`,`site_id`,`changed_at`);--> statement-breakpoint
CREATE INDEX `appointment_changes_by_appointment` ON `appointment_changes` (`practice_id`,`appointment_id`,`changed_at`);--> statement-breakpoint
CREATE INDEX `appointments_by_therapist` ON `appointments` (`practice_id`,`therapist_id`,`starts_at`,`ends_at`);--> statement-breakpoint
CREATE INDEX `appointments_by_site` ON `appointments` (`practice_id`,`site_id`,`starts_at`,`ends_at`);--> statement-breakpoint
CREATE INDEX `appointments_by_patient` ON `appointments` (`practice_id`,`patient_id`,`starts_at`);--> statement-breakpoint
CREATE INDEX `appointments_by_state` ON `appointments` (`practice_id`,`state`,`starts_at`);--> statement-breakpoint
CREATE INDEX `diary_claims_by_appointment` ON `diary_claims` (`practice_id`,`appointment_id`);--> statement-breakpoint
CREATE INDEX `working_patterns_by_member` ON `working_patterns` (`practice_id`,`staff_member_id`,`weekday`);--> statement-breakpoint
CREATE INDEX `working_patterns_by_site` ON `working_patterns` (`practice_id`,`site_id`,`weekday`);--> statement-breakpoint
CREATE INDEX `letter_deliveries_by_letter` ON `letter_deliveries` (`practice_id`,`letter_id`,`requested_at`);--> statement-breakpoint
CREATE INDEX `letters_by_patient` ON `letters` (`practice_id`,`patient_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `letters_by_author` ON `letters` (`practice_id`,`author_id`,`state`,`created_at`);--> statement-breakpoint
CREATE INDEX `letters_by_age` ON `letters` (`practice_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `jobs_due` ON `jobs` (`state`,`due_at`);--> statement-breakpoint
CREATE INDEX `jobs_by_practice` ON `jobs` (`practice_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `outbox_messages_due` ON `outbox_messages` (`state`,`due_at`);--> statement-breakpoint
CREATE INDEX `outbox_messages_by_practice` ON `outbox_messages` (`practice_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `outbox_messages_by_subject` ON `outbox_messages` (`practice_id`,`about_kind`,`about_id`);--> statement-breakpoint
CREATE INDEX `consents_by_patient` ON `consents` (`practice_id`,`patient_id`,`kind`);--> statement-breakpoint
CREATE INDEX `gp_practices_by_name` ON `gp_practices` (`practice_id`,`name`);--> statement-breakpoint
CREATE INDEX `patient_alerts_by_patient` ON `patient_alerts` (`practice_id`,`patient_id`,`resolved_at`);--> statement-breakpoint
CREATE INDEX `patients_last_first` ON `patients` (`practice_id`,`name_last_first`);--> statement-breakpoint
CREATE INDEX `patients_first_last` ON `patients` (`practice_id`,`name_first_last`);--> statement-breakpoint
CREATE INDEX `patients_phone` ON `patients` (`practice_id`,`phone_reversed`);--> statement-breakpoint
CREATE INDEX `patients_born` ON `patients` (`practice_id`,`born_on`,`name_last_first`);--> statement-breakpoint
CREATE INDEX `patients_nhs` ON `patients` (`practice_id`,`nhs_number`);--> statement-breakpoint
CREATE INDEX `patient_payers_by_patient` ON `patient_payers` (`practice_id`,`patient_id`,`is_current`);--> statement-breakpoint
CREATE INDEX `payers_by_name` ON `payers` (`practice_id`,`name`);--> statement-breakpoint
CREATE INDEX `idempotency_keys_age` ON `idempotency_keys` (`created_at`);--> statement-breakpoint
CREATE INDEX `rooms_by_site` ON `rooms` (`practice_id`,`site_id`,`position`);--> statement-breakpoint
CREATE INDEX `sessions_by_member` ON `sessions` (`practice_id`,`staff_member_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `staff_members_therapists` ON `staff_members` (`practice_id`,`is_therapist`,`position`);--> statement-breakpoint
CREATE INDEX `staff_roles_by_member` ON `staff_roles` (`practice_id`,`staff_member_id`);