CREATE TABLE `audit` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`at` integer NOT NULL,
	`person_id` text,
	`action` text NOT NULL,
	`entity` text NOT NULL,
	`entity_id` text NOT NULL,
	`detail` text NOT NULL
);
--> statement-breakpoint
CREATE INDEX `audit_entity` ON `audit` (`entity`,`entity_id`);--> statement-breakpoint
CREATE INDEX `audit_at` ON `audit` (`at`);--> statement-breakpoint
CREATE TABLE `booking_days` (
	`id` text PRIMARY KEY NOT NULL,
	`booking_id` text NOT NULL,
	`day` text NOT NULL,
	`revision_id` text,
	FOREIGN KEY (`booking_id`) REFERENCES `bookings`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`revision_id`) REFERENCES `roof_revisions`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `booking_days_day` ON `booking_days` (`booking_id`,`day`);--> statement-breakpoint
CREATE INDEX `booking_days_by_day` ON `booking_days` (`day`);--> statement-breakpoint
CREATE TABLE `bookings` (
	`id` text PRIMARY KEY NOT NULL,
	`job_id` text NOT NULL,
	`crew_id` text NOT NULL,
	`state` text NOT NULL,
	`start_at` text,
	`gear` text DEFAULT '' NOT NULL,
	`clash_reason` text,
	`uid` text NOT NULL,
	`sequence` integer DEFAULT 0 NOT NULL,
	`short_minutes` integer DEFAULT 0 NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	`cancelled_at` integer,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`job_id`) REFERENCES `jobs`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`crew_id`) REFERENCES `crews`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `bookings_job` ON `bookings` (`job_id`);--> statement-breakpoint
CREATE INDEX `bookings_crew` ON `bookings` (`crew_id`);--> statement-breakpoint
CREATE UNIQUE INDEX `bookings_uid` ON `bookings` (`uid`);--> statement-breakpoint
CREATE TABLE `tasks` (
	`id` text PRIMARY KEY NOT NULL,
	`booking_day_id` text NOT NULL,
	`position` integer NOT NULL,
	`package_key` text NOT NULL,
	`work` text NOT NULL,
	`cut_line_mark` text,
	`member_marks` text NOT NULL,
	`title` text NOT NULL,
	`quantity` integer NOT NULL,
	`planned_minutes` integer NOT NULL,
	`assigned_to_id` text,
	`first_piece_at` integer,
	`first_piece_by_id` text,
	`hand_raised_at` integer,
	`version` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`booking_day_id`) REFERENCES `booking_days`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`assigned_to_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`first_piece_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `tasks_day` ON `tasks` (`booking_day_id`,`position`);--> statement-breakpoint
CREATE INDEX `tasks_assigned` ON `tasks` (`assigned_to_id`);--> statement-breakpoint
CREATE TABLE `ticks` (
	`id` text PRIMARY KEY NOT NULL,
	`task_id` text NOT NULL,
	`person_id` text NOT NULL,
	`delta` integer NOT NULL,
	`at` integer NOT NULL,
	FOREIGN KEY (`task_id`) REFERENCES `tasks`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `ticks_task` ON `ticks` (`task_id`);--> statement-breakpoint
CREATE TABLE `firm` (
	`id` integer PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`phone` text NOT NULL,
	`time_zone` text NOT NULL,
	`reminder_at` text NOT NULL,
	`change_hold_minutes` integer NOT NULL,
	`start_at` text NOT NULL,
	`hours_per_day` real NOT NULL,
	`working_weekdays` text NOT NULL,
	`closed_days` text NOT NULL,
	`brick_offset_mm` real NOT NULL,
	`length_units` text NOT NULL,
	`roof_settings` text NOT NULL,
	`labour_rates` text NOT NULL,
	`version` integer DEFAULT 1 NOT NULL
);
--> statement-breakpoint
CREATE TABLE `jobs` (
	`id` text PRIMARY KEY NOT NULL,
	`number` text NOT NULL,
	`title` text NOT NULL,
	`site_address` text DEFAULT '' NOT NULL,
	`access_notes` text DEFAULT '' NOT NULL,
	`site_contact_name` text DEFAULT '' NOT NULL,
	`site_contact_phone` text DEFAULT '' NOT NULL,
	`customer_name` text DEFAULT '' NOT NULL,
	`customer_phone` text DEFAULT '' NOT NULL,
	`customer_email` text DEFAULT '' NOT NULL,
	`covering` text NOT NULL,
	`wanted_by` text,
	`price_cents` integer,
	`price_sent_on` text,
	`accepted_on` text,
	`completed_on` text,
	`notes` text DEFAULT '' NOT NULL,
	`crew_notes` text DEFAULT '' NOT NULL,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	`version` integer DEFAULT 1 NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `jobs_number` ON `jobs` (`number`);--> statement-breakpoint
CREATE INDEX `jobs_updated` ON `jobs` (`updated_at`);--> statement-breakpoint
CREATE INDEX `jobs_wanted` ON `jobs` (`wanted_by`);--> statement-breakpoint
CREATE TABLE `plate_checks` (
	`id` text PRIMARY KEY NOT NULL,
	`job_id` text NOT NULL,
	`revision_id` text NOT NULL,
	`sides_mm` text NOT NULL,
	`diagonals` text NOT NULL,
	`note` text DEFAULT '' NOT NULL,
	`taken_by_id` text NOT NULL,
	`taken_at` integer NOT NULL,
	FOREIGN KEY (`job_id`) REFERENCES `jobs`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`revision_id`) REFERENCES `roof_revisions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`taken_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `plate_checks_job` ON `plate_checks` (`job_id`,`taken_at`);--> statement-breakpoint
CREATE INDEX `plate_checks_revision` ON `plate_checks` (`revision_id`);--> statement-breakpoint
CREATE TABLE `roof_drafts` (
	`job_id` text PRIMARY KEY NOT NULL,
	`form` text NOT NULL,
	`updated_at` integer NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`job_id`) REFERENCES `jobs`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE TABLE `roof_revisions` (
	`id` text PRIMARY KEY NOT NULL,
	`job_id` text NOT NULL,
	`sequence` integer NOT NULL,
	`letter` text NOT NULL,
	`roof` text NOT NULL,
	`settings` text NOT NULL,
	`spec` text NOT NULL,
	`glyph` text NOT NULL,
	`engine_version` text NOT NULL,
	`input_hash` text NOT NULL,
	`issued_at` integer NOT NULL,
	`issued_by_id` text NOT NULL,
	FOREIGN KEY (`job_id`) REFERENCES `jobs`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`issued_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `roof_revisions_job` ON `roof_revisions` (`job_id`,`sequence`);--> statement-breakpoint
CREATE TABLE `outbox` (
	`id` text PRIMARY KEY NOT NULL,
	`key` text NOT NULL,
	`kind` text NOT NULL,
	`person_id` text,
	`to_name` text NOT NULL,
	`to_email` text NOT NULL,
	`payload` text NOT NULL,
	`state` text NOT NULL,
	`attempts` integer DEFAULT 0 NOT NULL,
	`in_flight_before` integer DEFAULT false NOT NULL,
	`not_before` integer NOT NULL,
	`not_after` integer,
	`last_error` text,
	`subject` text,
	`text` text,
	`html` text,
	`created_at` integer NOT NULL,
	`sent_at` integer,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `outbox_key` ON `outbox` (`key`);--> statement-breakpoint
CREATE INDEX `outbox_due` ON `outbox` (`state`,`not_before`);--> statement-breakpoint
CREATE INDEX `outbox_created` ON `outbox` (`created_at`);--> statement-breakpoint
CREATE TABLE `told_days` (
	`id` text PRIMARY KEY NOT NULL,
	`person_id` text NOT NULL,
	`day` text NOT NULL,
	`content_hash` text NOT NULL,
	`content` text NOT NULL,
	`told_at` integer NOT NULL,
	`pending_hash` text,
	`pending_since` integer,
	`notices` integer DEFAULT 0 NOT NULL,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `told_days_person` ON `told_days` (`person_id`,`day`);--> statement-breakpoint
CREATE TABLE `crew_members` (
	`id` text PRIMARY KEY NOT NULL,
	`crew_id` text NOT NULL,
	`person_id` text NOT NULL,
	`starts_on` text NOT NULL,
	`ends_on` text,
	FOREIGN KEY (`crew_id`) REFERENCES `crews`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `crew_members_crew` ON `crew_members` (`crew_id`,`starts_on`);--> statement-breakpoint
CREATE INDEX `crew_members_person` ON `crew_members` (`person_id`,`starts_on`);--> statement-breakpoint
CREATE TABLE `crews` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`letter` text NOT NULL,
	`colour` integer NOT NULL,
	`active` integer DEFAULT true NOT NULL
);
--> statement-breakpoint
CREATE TABLE `leave` (
	`id` text PRIMARY KEY NOT NULL,
	`person_id` text NOT NULL,
	`starts_on` text NOT NULL,
	`ends_on` text NOT NULL,
	`reason` text DEFAULT '' NOT NULL,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `leave_person` ON `leave` (`person_id`,`starts_on`);--> statement-breakpoint
CREATE TABLE `password_resets` (
	`id` text PRIMARY KEY NOT NULL,
	`person_id` text NOT NULL,
	`token_hash` text NOT NULL,
	`expires_at` integer NOT NULL,
	`used_at` integer,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE UNIQUE INDEX `password_resets_token` ON `password_resets` (`token_hash`);--> statement-breakpoint
CREATE INDEX `password_resets_person` ON `password_resets` (`person_id`);--> statement-breakpoint
CREATE TABLE `people` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`email` text NOT NULL,
	`phone` text DEFAULT '' NOT NULL,
	`role` text NOT NULL,
	`password_hash` text,
	`session_epoch` integer DEFAULT 1 NOT NULL,
	`active` integer DEFAULT true NOT NULL,
	`created_at` integer NOT NULL,
	`version` integer DEFAULT 1 NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `people_email` ON `people` (`email`);--> statement-breakpoint
CREATE INDEX `people_name` ON `people` (`name`);