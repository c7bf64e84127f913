CREATE TABLE `account` (
	`id` text PRIMARY KEY NOT NULL,
	`account_id` text NOT NULL,
	`provider_id` text NOT NULL,
	`user_id` text NOT NULL,
	`access_token` text,
	`refresh_token` text,
	`id_token` text,
	`access_token_expires_at` integer,
	`refresh_token_expires_at` integer,
	`scope` text,
	`password` text,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE TABLE `audit` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`at` integer NOT NULL,
	`user_id` text,
	`who` text NOT NULL,
	`did` text NOT NULL,
	`subject` text NOT NULL,
	`subject_id` text,
	`details` text NOT NULL
);
--> statement-breakpoint
CREATE TABLE `outbox` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`at` integer NOT NULL,
	`recipient` text NOT NULL,
	`subject` text NOT NULL,
	`body` text NOT NULL
);
--> statement-breakpoint
CREATE TABLE `session` (
	`id` text PRIMARY KEY NOT NULL,
	`expires_at` integer NOT NULL,
	`token` text NOT NULL,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	`ip_address` text,
	`user_agent` text,
	`user_id` text NOT NULL,
	`impersonated_by` text,
	FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE UNIQUE INDEX `session_token_unique` ON `session` (`token`);--> statement-breakpoint
CREATE TABLE `user` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`email` text NOT NULL,
	`email_verified` integer DEFAULT false NOT NULL,
	`image` text,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	`role` text,
	`banned` integer DEFAULT false,
	`ban_reason` text,
	`ban_expires` integer
);
--> statement-breakpoint
CREATE UNIQUE INDEX `user_email_unique` ON `user` (`email`);--> statement-breakpoint
CREATE TABLE `verification` (
	`id` text PRIMARY KEY NOT NULL,
	`identifier` text NOT NULL,
	`value` text NOT NULL,
	`expires_at` integer NOT NULL,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE `jobs` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`step` text NOT NULL,
	`subject_id` text NOT NULL,
	`manual_id` text NOT NULL,
	`state` text DEFAULT 'waiting' NOT NULL,
	`priority` integer DEFAULT 0 NOT NULL,
	`place` integer DEFAULT 0 NOT NULL,
	`attempts` integer DEFAULT 0 NOT NULL,
	`not_before` integer DEFAULT 0 NOT NULL,
	`wish` text,
	`problem` text
);
--> statement-breakpoint
CREATE UNIQUE INDEX `one_job_of_a_step_and_subject` ON `jobs` (`step`,`subject_id`);--> statement-breakpoint
CREATE INDEX `jobs_in_order` ON `jobs` (`state`,`priority`,`place`);--> statement-breakpoint
CREATE TABLE `manuals` (
	`id` text PRIMARY KEY NOT NULL,
	`title` text NOT NULL,
	`equipment` text,
	`maker` text,
	`document_number` text,
	`edition_date` text,
	`created_at` integer NOT NULL,
	`created_by` text NOT NULL,
	`deleted_at` integer,
	`reading_paused` integer DEFAULT false NOT NULL
);
--> statement-breakpoint
CREATE TABLE `sources` (
	`id` text PRIMARY KEY NOT NULL,
	`manual_id` text NOT NULL,
	`file_name` text NOT NULL,
	`sha256` text NOT NULL,
	`bytes` integer NOT NULL,
	`media_type` text NOT NULL,
	`page_count` integer,
	`state` text NOT NULL,
	`problem` text,
	`created_at` integer NOT NULL,
	`created_by` text NOT NULL,
	FOREIGN KEY (`manual_id`) REFERENCES `manuals`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `one_source_of_the_same_bytes` ON `sources` (`manual_id`,`sha256`);--> statement-breakpoint
CREATE TABLE `pages` (
	`id` text PRIMARY KEY NOT NULL,
	`manual_id` text NOT NULL,
	`source_id` text NOT NULL,
	`source_page` integer NOT NULL,
	`position` integer NOT NULL,
	`label` text NOT NULL,
	`state` text NOT NULL,
	`problem` text,
	`drawn_key` text,
	`drawn_dpi` real,
	`image_key` text,
	`width` integer,
	`height` integer,
	`reading_id` integer,
	`confidence` real,
	`revision` integer DEFAULT 0 NOT NULL,
	`doubt_count` integer DEFAULT 0 NOT NULL,
	FOREIGN KEY (`manual_id`) REFERENCES `manuals`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`source_id`) REFERENCES `sources`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `one_page_of_a_source_page` ON `pages` (`source_id`,`source_page`);--> statement-breakpoint
CREATE INDEX `pages_of_a_manual` ON `pages` (`manual_id`,`position`);--> statement-breakpoint
CREATE TABLE `readings` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`page_id` text NOT NULL,
	`image_key` text NOT NULL,
	`content` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`page_id`) REFERENCES `pages`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `readings_of_a_page` ON `readings` (`page_id`);--> statement-breakpoint
CREATE TABLE `revisions` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`page_id` text NOT NULL,
	`number` integer NOT NULL,
	`origin` text NOT NULL,
	`author` text NOT NULL,
	`author_id` text,
	`reading_id` integer,
	`note` text NOT NULL,
	`doubt_count` integer NOT NULL,
	`document` text NOT NULL,
	`saved_at` integer NOT NULL,
	FOREIGN KEY (`page_id`) REFERENCES `pages`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `one_revision_of_a_number` ON `revisions` (`page_id`,`number`);--> statement-breakpoint
CREATE TABLE `search_entries` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`kind` text NOT NULL,
	`page_id` text NOT NULL,
	`manual_id` text NOT NULL,
	`body` text NOT NULL,
	`placed` text NOT NULL
);
--> statement-breakpoint
CREATE INDEX `search_entries_of_a_page` ON `search_entries` (`page_id`);--> statement-breakpoint
CREATE TABLE `search_quantities` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`key` text NOT NULL,
	`page_id` text NOT NULL,
	`manual_id` text NOT NULL,
	`start` integer NOT NULL,
	`end` integer NOT NULL
);
--> statement-breakpoint
CREATE INDEX `search_quantities_by_key` ON `search_quantities` (`key`);--> statement-breakpoint
CREATE INDEX `search_quantities_of_a_page` ON `search_quantities` (`page_id`);--> statement-breakpoint
CREATE TABLE `quantities` (
	`id` text PRIMARY KEY NOT NULL,
	`manual_id` text NOT NULL,
	`symbol` text NOT NULL,
	`definition` text NOT NULL,
	`page_id` text,
	`zone` text,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`manual_id`) REFERENCES `manuals`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `one_quantity_of_a_symbol` ON `quantities` (`manual_id`,`symbol`);--> statement-breakpoint
CREATE TABLE `settings` (
	`id` text PRIMARY KEY NOT NULL,
	`manual_id` text NOT NULL,
	`name` text NOT NULL,
	`inputs` text NOT NULL,
	`created_at` integer NOT NULL,
	`created_by` text NOT NULL,
	FOREIGN KEY (`manual_id`) REFERENCES `manuals`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `settings_of_a_manual` ON `settings` (`manual_id`);