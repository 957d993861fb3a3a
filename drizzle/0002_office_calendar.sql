CREATE TABLE `day_log_delays` (
	`id` text PRIMARY KEY NOT NULL,
	`day_log_id` text NOT NULL,
	`reason` text NOT NULL,
	`note` text DEFAULT '' NOT NULL,
	`lost_minutes` integer NOT NULL,
	FOREIGN KEY (`day_log_id`) REFERENCES `day_logs`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `day_log_delays_log` ON `day_log_delays` (`day_log_id`);--> statement-breakpoint
CREATE TABLE `day_log_people` (
	`id` text PRIMARY KEY NOT NULL,
	`day_log_id` text NOT NULL,
	`person_id` text NOT NULL,
	`turned_up` integer NOT NULL,
	`minutes` integer NOT NULL,
	FOREIGN KEY (`day_log_id`) REFERENCES `day_logs`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `day_log_people_log` ON `day_log_people` (`day_log_id`,`person_id`);--> statement-breakpoint
CREATE INDEX `day_log_people_person` ON `day_log_people` (`person_id`);--> statement-breakpoint
CREATE TABLE `day_logs` (
	`id` text PRIMARY KEY NOT NULL,
	`booking_day_id` text NOT NULL,
	`done` text DEFAULT '' NOT NULL,
	`remarks` text DEFAULT '' NOT NULL,
	`logged_by_id` text NOT NULL,
	`logged_at` integer NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`booking_day_id`) REFERENCES `booking_days`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`logged_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `day_logs_day` ON `day_logs` (`booking_day_id`);--> statement-breakpoint
CREATE TABLE `milestones` (
	`id` text PRIMARY KEY NOT NULL,
	`job_id` text NOT NULL,
	`kind` text NOT NULL,
	`day` text,
	`state` text NOT NULL,
	`brought_by` text DEFAULT '' NOT NULL,
	`note` text DEFAULT '' NOT NULL,
	`updated_at` integer NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`job_id`) REFERENCES `jobs`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE UNIQUE INDEX `milestones_job` ON `milestones` (`job_id`,`kind`);--> statement-breakpoint
CREATE INDEX `milestones_day` ON `milestones` (`day`);--> statement-breakpoint
CREATE TABLE `crew_loans` (
	`id` text PRIMARY KEY NOT NULL,
	`person_id` text NOT NULL,
	`crew_id` text NOT NULL,
	`day` text NOT NULL,
	`note` text DEFAULT '' NOT NULL,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`crew_id`) REFERENCES `crews`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `crew_loans_person` ON `crew_loans` (`person_id`,`day`);--> statement-breakpoint
CREATE INDEX `crew_loans_crew` ON `crew_loans` (`crew_id`,`day`);--> statement-breakpoint
CREATE TABLE `ticket_photos` (
	`ticket_id` text PRIMARY KEY NOT NULL,
	`content_type` text NOT NULL,
	`bytes` blob NOT NULL,
	`added_at` integer NOT NULL,
	FOREIGN KEY (`ticket_id`) REFERENCES `tickets`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE TABLE `tickets` (
	`id` text PRIMARY KEY NOT NULL,
	`person_id` text NOT NULL,
	`kind` text NOT NULL,
	`name` text DEFAULT '' NOT NULL,
	`number` text DEFAULT '' NOT NULL,
	`expires_on` text,
	`version` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `tickets_person` ON `tickets` (`person_id`);--> statement-breakpoint
CREATE INDEX `tickets_expires` ON `tickets` (`expires_on`);--> statement-breakpoint
CREATE TABLE `rain_offs` (
	`id` text PRIMARY KEY NOT NULL,
	`crew_id` text NOT NULL,
	`from_day` text NOT NULL,
	`working_days` integer NOT NULL,
	`reason` text DEFAULT '' NOT NULL,
	`state` text NOT NULL,
	`asked_by_id` text,
	`asked_at` integer,
	`settled_by_id` text,
	`settled_at` integer,
	`moved` text DEFAULT '[]' NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`crew_id`) REFERENCES `crews`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`asked_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`settled_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `rain_offs_state` ON `rain_offs` (`state`,`from_day`);--> statement-breakpoint
CREATE INDEX `rain_offs_crew` ON `rain_offs` (`crew_id`);--> statement-breakpoint
CREATE TABLE `variations` (
	`id` text PRIMARY KEY NOT NULL,
	`job_id` text NOT NULL,
	`sequence` integer NOT NULL,
	`reason` text NOT NULL,
	`price_cents` integer,
	`asked_on` text,
	`agreed_on` text,
	`agreed_by` text DEFAULT '' NOT NULL,
	`withdrawn_on` text,
	`created_by_id` text NOT NULL,
	`created_at` integer NOT NULL,
	`version` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`job_id`) REFERENCES `jobs`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`created_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `variations_job` ON `variations` (`job_id`,`sequence`);--> statement-breakpoint
ALTER TABLE `firm` ADD `week_hours` text;--> statement-breakpoint
ALTER TABLE `firm` ADD `holiday_country` text;--> statement-breakpoint
ALTER TABLE `firm` ADD `holiday_state` text;--> statement-breakpoint
ALTER TABLE `firm` ADD `holidays_worked` text DEFAULT '[]' NOT NULL;--> statement-breakpoint
ALTER TABLE `leave` ADD `kind` text DEFAULT 'leave' NOT NULL;--> statement-breakpoint
ALTER TABLE `leave` ADD `weekdays` text;--> statement-breakpoint
CREATE INDEX `leave_ends` ON `leave` (`ends_on`);--> statement-breakpoint
ALTER TABLE `people` ADD `week_hours` text;