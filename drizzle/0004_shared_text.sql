CREATE TABLE `shared_edits` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`page_id` text NOT NULL,
	`edit` blob NOT NULL,
	`user_id` text NOT NULL,
	FOREIGN KEY (`page_id`) REFERENCES `pages`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `shared_edits_of_a_page` ON `shared_edits` (`page_id`,`id`);--> statement-breakpoint
CREATE TABLE `shared_texts` (
	`page_id` text PRIMARY KEY NOT NULL,
	`version` integer NOT NULL,
	`state` blob NOT NULL,
	FOREIGN KEY (`page_id`) REFERENCES `pages`(`id`) ON UPDATE no action ON DELETE no action
);
