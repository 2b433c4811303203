ALTER TABLE `answer` ADD `waits_for` text;--> statement-breakpoint
ALTER TABLE `reading` ADD `method` text DEFAULT '' NOT NULL;--> statement-breakpoint
ALTER TABLE `ruling` ADD `method` text DEFAULT '' NOT NULL;