ALTER TABLE `roof_drafts` ADD `sizes_typed` text DEFAULT '{}' NOT NULL;--> statement-breakpoint
ALTER TABLE `roof_revisions` ADD `sizes_typed` text DEFAULT '{}' NOT NULL;