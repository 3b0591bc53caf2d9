ALTER TABLE `diary_claims` ADD CONSTRAINT `diary_claims_one_owner` CHECK ((`appointment_id` IS NULL) <> (`class_session_id` IS NULL));
--> statement-breakpoint
ALTER TABLE `class_sessions` ADD CONSTRAINT `class_sessions_on_grid` CHECK (MINUTE(`starts_at`) MOD 5 = 0 AND SECOND(`starts_at`) = 0 AND MICROSECOND(`starts_at`) = 0 AND MINUTE(`ends_at`) MOD 5 = 0 AND SECOND(`ends_at`) = 0 AND MICROSECOND(`ends_at`) = 0 AND `clean_down_minutes` MOD 5 = 0);
--> statement-breakpoint
ALTER TABLE `class_sessions` ADD CONSTRAINT `class_sessions_forward` CHECK (`ends_at` > `starts_at` AND `clean_down_minutes` BETWEEN 0 AND 60 AND `capacity` BETWEEN 1 AND 200);
--> statement-breakpoint
ALTER TABLE `offer_rounds` ADD CONSTRAINT `offer_rounds_forward` CHECK (`ends_at` > `starts_at` AND MINUTE(`starts_at`) MOD 5 = 0 AND SECOND(`starts_at`) = 0 AND MICROSECOND(`starts_at`) = 0 AND MINUTE(`ends_at`) MOD 5 = 0 AND SECOND(`ends_at`) = 0 AND MICROSECOND(`ends_at`) = 0);
--> statement-breakpoint
ALTER TABLE `offer_rounds` ADD CONSTRAINT `offer_rounds_taken` CHECK ((`state` = 'taken') = (`appointment_id` IS NOT NULL));
--> statement-breakpoint
ALTER TABLE `leave_requests` ADD CONSTRAINT `leave_requests_forward` CHECK (`ends_at` > `starts_at`);
--> statement-breakpoint
ALTER TABLE `cover_plans` ADD CONSTRAINT `cover_plans_one_cause` CHECK ((`therapist_id` IS NULL) <> (`room_id` IS NULL) AND `ends_at` > `starts_at`);
--> statement-breakpoint
ALTER TABLE `courses` ADD CONSTRAINT `courses_length` CHECK (`planned_visits` BETWEEN 1 AND 60);
--> statement-breakpoint
ALTER TABLE `diary_holds` ADD CONSTRAINT `diary_holds_forward` CHECK (`ends_at` > `starts_at`);
--> statement-breakpoint
ALTER TABLE `site_travel` ADD CONSTRAINT `site_travel_minutes` CHECK (`minutes` BETWEEN 0 AND 600 AND `from_site_id` <> `to_site_id`);
--> statement-breakpoint
ALTER TABLE `diary_settings` ADD CONSTRAINT `diary_settings_bounds` CHECK (`offer_count` BETWEEN 1 AND 20 AND `offer_minutes` BETWEEN 5 AND 2880 AND `late_cancellation_fee_pence` >= 0 AND `no_show_fee_pence` >= 0);
