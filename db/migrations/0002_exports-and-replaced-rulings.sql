CREATE TABLE `export_file` (
	`id` text PRIMARY KEY NOT NULL,
	`sitting` text NOT NULL,
	`kind` text NOT NULL,
	`file_name` text NOT NULL,
	`blob` text NOT NULL,
	`as_of` integer NOT NULL,
	`by` text NOT NULL,
	`at` integer NOT NULL,
	FOREIGN KEY (`sitting`) REFERENCES `sitting`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`blob`) REFERENCES `blob`(`sha256`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`by`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `export_by_sitting` ON `export_file` (`sitting`);--> statement-breakpoint
ALTER TABLE `ruling` ADD `replaces` text;