CREATE TABLE `comments` (
	`id` text PRIMARY KEY NOT NULL,
	`page_id` text NOT NULL,
	`thread_id` text,
	`kind` text NOT NULL,
	`anchor` text,
	`words` text NOT NULL,
	`mentions` text DEFAULT '[]' NOT NULL,
	`author_id` text NOT NULL,
	`author` text NOT NULL,
	`created_at` integer NOT NULL,
	`edited_at` integer,
	`deleted_at` integer,
	`resolved_at` integer,
	`resolved_by` text,
	FOREIGN KEY (`page_id`) REFERENCES `pages`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`thread_id`) REFERENCES `comments`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `comments_of_a_page` ON `comments` (`page_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `replies_of_a_comment` ON `comments` (`thread_id`);