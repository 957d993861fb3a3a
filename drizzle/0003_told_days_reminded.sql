ALTER TABLE `told_days` ADD `reminded` integer DEFAULT true NOT NULL;--> statement-breakpoint
CREATE INDEX `told_days_day` ON `told_days` (`day`);