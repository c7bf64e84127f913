CREATE TABLE `edition_pages` (
	`edition_id` text NOT NULL,
	`page_id` text NOT NULL,
	`position` integer NOT NULL,
	`label` text NOT NULL,
	`state` text NOT NULL,
	`revision` integer NOT NULL,
	`doubt_count` integer NOT NULL,
	`signed_by` text,
	`signed_at` integer,
	PRIMARY KEY(`edition_id`, `page_id`),
	FOREIGN KEY (`edition_id`) REFERENCES `editions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`page_id`) REFERENCES `pages`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `editions_of_a_page` ON `edition_pages` (`page_id`,`revision`);--> statement-breakpoint
CREATE TABLE `editions` (
	`id` text PRIMARY KEY NOT NULL,
	`manual_id` text NOT NULL,
	`number` integer NOT NULL,
	`name` text NOT NULL,
	`note` text NOT NULL,
	`published_by` text NOT NULL,
	`published_by_id` text NOT NULL,
	`published_at` integer NOT NULL,
	`standing` text NOT NULL,
	`quantities` text NOT NULL,
	`plan` text NOT NULL,
	`withdrawn_by` text,
	`withdrawn_at` integer,
	`withdrawn_reason` text,
	FOREIGN KEY (`manual_id`) REFERENCES `manuals`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `one_edition_of_a_number` ON `editions` (`manual_id`,`number`);--> statement-breakpoint
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
