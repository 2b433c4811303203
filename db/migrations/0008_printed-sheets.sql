CREATE TABLE `printed_script` (
	`printing` text NOT NULL,
	`script` text NOT NULL,
	`candidate` text,
	PRIMARY KEY(`printing`, `script`),
	FOREIGN KEY (`printing`) REFERENCES `printing`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`script`) REFERENCES `script`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`candidate`) REFERENCES `candidate`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `printing` (
	`id` text PRIMARY KEY NOT NULL,
	`sitting` text NOT NULL,
	`layout` text NOT NULL,
	`paper_size` text NOT NULL,
	`spares` integer NOT NULL,
	`state` text DEFAULT 'making' NOT NULL,
	`made_by` text NOT NULL,
	`made_at` integer NOT NULL,
	`done` integer DEFAULT 0 NOT NULL,
	`of` integer NOT NULL,
	`blob` text,
	FOREIGN KEY (`sitting`) REFERENCES `sitting`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`layout`) REFERENCES `layout`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`made_by`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `printing_by_sitting` ON `printing` (`sitting`);--> statement-breakpoint
CREATE UNIQUE INDEX `printing_of_layout` ON `printing` (`layout`);--> statement-breakpoint
create trigger `printed_script_refuses_update` before update on `printed_script` begin select raise(abort, 'printed_script is append-only'); end;
--> statement-breakpoint
create trigger `printed_script_refuses_delete` before delete on `printed_script` begin select raise(abort, 'printed_script is append-only'); end;
