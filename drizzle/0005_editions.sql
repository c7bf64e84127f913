CREATE TABLE `sign_offs` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`page_id` text NOT NULL,
	`revision` integer NOT NULL,
	`signed_by` text NOT NULL,
	`signed_by_id` text NOT NULL,
	`signed_at` integer NOT NULL,
	`doubt_count` integer NOT NULL,
	`taken_back_by` text,
	`taken_back_at` integer,
	FOREIGN KEY (`page_id`) REFERENCES `pages`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `sign_offs_of_a_page` ON `sign_offs` (`page_id`,`revision`);--> statement-breakpoint
ALTER TABLE `revisions` ADD `author_ids` text DEFAULT '[]' NOT NULL;--> statement-breakpoint
UPDATE `revisions` SET `author_ids` = json_array(`author_id`) WHERE `author_id` IS NOT NULL;
