CREATE TABLE `number_reading` (
	`id` text PRIMARY KEY NOT NULL,
	`script` text NOT NULL,
	`page_image` text NOT NULL,
	`reader` text NOT NULL,
	`text` text,
	`at` integer NOT NULL,
	FOREIGN KEY (`script`) REFERENCES `script`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`reader`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `number_reading_by_script` ON `number_reading` (`script`);--> statement-breakpoint
CREATE TABLE `number_settled` (
	`id` text PRIMARY KEY NOT NULL,
	`script` text NOT NULL,
	`page_image` text NOT NULL,
	`candidate` text,
	`reason` text NOT NULL,
	`by` text NOT NULL,
	`at` integer NOT NULL,
	FOREIGN KEY (`script`) REFERENCES `script`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`candidate`) REFERENCES `candidate`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`by`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `number_settled_by_script` ON `number_settled` (`script`);--> statement-breakpoint
CREATE TABLE `number_strip` (
	`script` text PRIMARY KEY NOT NULL,
	`page_image` text NOT NULL,
	`blob` text NOT NULL,
	`width_px` integer NOT NULL,
	`height_px` integer NOT NULL,
	FOREIGN KEY (`script`) REFERENCES `script`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `script_binding` (
	`id` text PRIMARY KEY NOT NULL,
	`script` text NOT NULL,
	`was` text,
	`candidate` text,
	`act` text NOT NULL,
	`reason` text NOT NULL,
	`by` text NOT NULL,
	`at` integer NOT NULL,
	FOREIGN KEY (`script`) REFERENCES `script`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`was`) REFERENCES `candidate`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`candidate`) REFERENCES `candidate`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`by`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `script_binding_by_script` ON `script_binding` (`script`);
--> statement-breakpoint
create trigger `script_binding_refuses_update` before update on `script_binding` begin select raise(abort, 'script_binding is append-only'); end;
--> statement-breakpoint
create trigger `script_binding_refuses_delete` before delete on `script_binding` begin select raise(abort, 'script_binding is append-only'); end;
--> statement-breakpoint
create trigger `number_reading_refuses_update` before update on `number_reading` begin select raise(abort, 'number_reading is append-only'); end;
--> statement-breakpoint
create trigger `number_reading_refuses_delete` before delete on `number_reading` begin select raise(abort, 'number_reading is append-only'); end;
--> statement-breakpoint
create trigger `number_settled_refuses_update` before update on `number_settled` begin select raise(abort, 'number_settled is append-only'); end;
--> statement-breakpoint
create trigger `number_settled_refuses_delete` before delete on `number_settled` begin select raise(abort, 'number_settled is append-only'); end;
