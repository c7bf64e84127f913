CREATE TABLE `lessons` (
	`page_id` text PRIMARY KEY NOT NULL,
	`manual_id` text NOT NULL,
	`content` text NOT NULL,
	FOREIGN KEY (`page_id`) REFERENCES `pages`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `lessons_of_a_manual` ON `lessons` (`manual_id`);--> statement-breakpoint
DROP INDEX `one_page_of_a_source_page`;--> statement-breakpoint
ALTER TABLE `pages` ADD `half` text DEFAULT 'whole' NOT NULL;--> statement-breakpoint
ALTER TABLE `pages` ADD `cut_share` real;--> statement-breakpoint
ALTER TABLE `pages` ADD `layer_key` text;--> statement-breakpoint
ALTER TABLE `pages` ADD `warnings` text DEFAULT '[]' NOT NULL;--> statement-breakpoint
CREATE UNIQUE INDEX `one_page_of_a_source_page` ON `pages` (`source_id`,`source_page`,`half`);--> statement-breakpoint
ALTER TABLE `manuals` ADD `learns` integer DEFAULT true NOT NULL;--> statement-breakpoint
ALTER TABLE `manuals` ADD `own_units` text DEFAULT '[]' NOT NULL;