CREATE TABLE `frequency_plans` (
	`manual_id` text PRIMARY KEY NOT NULL,
	`number` integer NOT NULL,
	`content` text NOT NULL,
	`saved_at` integer NOT NULL,
	`saved_by` text NOT NULL,
	FOREIGN KEY (`manual_id`) REFERENCES `manuals`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `relation_verdicts` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`manual_id` text NOT NULL,
	`relation` text NOT NULL,
	`verdict` text NOT NULL,
	`said_by` text NOT NULL,
	`said_at` integer NOT NULL,
	FOREIGN KEY (`manual_id`) REFERENCES `manuals`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `one_verdict_of_a_relation` ON `relation_verdicts` (`manual_id`,`relation`);