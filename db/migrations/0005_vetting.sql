CREATE TABLE `vetting` (
	`id` text PRIMARY KEY NOT NULL,
	`item` text NOT NULL,
	`item_scheme` text NOT NULL,
	`person` text NOT NULL,
	`outcome` text NOT NULL,
	`comment` text,
	`at` integer NOT NULL,
	FOREIGN KEY (`item`) REFERENCES `item`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`item_scheme`) REFERENCES `item_scheme`(`hash`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `vetting_by_item` ON `vetting` (`item`,`item_scheme`);--> statement-breakpoint
CREATE TABLE `vetting_check` (
	`id` text PRIMARY KEY NOT NULL,
	`item` text NOT NULL,
	`item_scheme` text NOT NULL,
	`person` text NOT NULL,
	`text` text NOT NULL,
	`agrees` integer NOT NULL,
	`at` integer NOT NULL,
	FOREIGN KEY (`item`) REFERENCES `item`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`item_scheme`) REFERENCES `item_scheme`(`hash`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `vetting_check_by_item` ON `vetting_check` (`item`,`item_scheme`);--> statement-breakpoint
create trigger `vetting_check_refuses_update` before update on `vetting_check` begin select raise(abort, 'vetting_check is append-only'); end;
--> statement-breakpoint
create trigger `vetting_check_refuses_delete` before delete on `vetting_check` begin select raise(abort, 'vetting_check is append-only'); end;
--> statement-breakpoint
create trigger `vetting_refuses_update` before update on `vetting` begin select raise(abort, 'vetting is append-only'); end;
--> statement-breakpoint
create trigger `vetting_refuses_delete` before delete on `vetting` begin select raise(abort, 'vetting is append-only'); end;
