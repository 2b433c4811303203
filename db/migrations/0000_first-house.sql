CREATE TABLE `course` (
	`id` text PRIMARY KEY NOT NULL,
	`code` text NOT NULL,
	`title` text NOT NULL,
	`time_zone` text NOT NULL,
	`archived_at` integer
);
--> statement-breakpoint
CREATE TABLE `membership` (
	`id` text PRIMARY KEY NOT NULL,
	`person` text NOT NULL,
	`course` text NOT NULL,
	`role` text NOT NULL,
	`settles_readings` integer DEFAULT false NOT NULL,
	`from` integer NOT NULL,
	`until` integer,
	FOREIGN KEY (`person`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`course`) REFERENCES `course`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `membership_one_open_role` ON `membership` (`person`,`course`,`role`) WHERE "until" is null;--> statement-breakpoint
CREATE INDEX `membership_by_course` ON `membership` (`course`);--> statement-breakpoint
CREATE TABLE `person` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text,
	`email` text,
	`password_hash` text,
	`is_officer` integer DEFAULT false NOT NULL,
	`erased_at` integer
);
--> statement-breakpoint
CREATE UNIQUE INDEX `person_email_unique` ON `person` (`email`);--> statement-breakpoint
CREATE TABLE `session` (
	`id_hash` text PRIMARY KEY NOT NULL,
	`person` text,
	`data` text NOT NULL,
	`created_at` integer NOT NULL,
	`seen_at` integer NOT NULL,
	`ends_at` integer NOT NULL,
	FOREIGN KEY (`person`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `session_by_person` ON `session` (`person`);--> statement-breakpoint
CREATE INDEX `session_by_end` ON `session` (`ends_at`);--> statement-breakpoint
CREATE TABLE `candidate` (
	`id` text PRIMARY KEY NOT NULL,
	`sitting` text NOT NULL,
	`number` text NOT NULL,
	`attendance` text DEFAULT 'expected' NOT NULL,
	`person` text,
	`rev` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`sitting`) REFERENCES `sitting`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `candidate_number` ON `candidate` (`sitting`,`number`);--> statement-breakpoint
CREATE TABLE `candidate_name` (
	`candidate` text PRIMARY KEY NOT NULL,
	`name` text,
	`email` text,
	`erased_at` integer,
	FOREIGN KEY (`candidate`) REFERENCES `candidate`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `paper_lock` (
	`sitting` text PRIMARY KEY NOT NULL,
	`locked_at` integer NOT NULL,
	`locked_by` text NOT NULL,
	FOREIGN KEY (`sitting`) REFERENCES `sitting`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`locked_by`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `sitting` (
	`id` text PRIMARY KEY NOT NULL,
	`course` text NOT NULL,
	`print_number` integer NOT NULL,
	`title` text NOT NULL,
	`held_on` text NOT NULL,
	`status` text DEFAULT 'draft' NOT NULL,
	`scheme_version` text,
	`desk` text DEFAULT 'covered' NOT NULL,
	`second_policy` text DEFAULT 'none' NOT NULL,
	`total_rounding` text DEFAULT 'none' NOT NULL,
	`board_date` text,
	`seq` integer DEFAULT 0 NOT NULL,
	`rev` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`course`) REFERENCES `course`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `sitting_printNumber_unique` ON `sitting` (`print_number`);--> statement-breakpoint
CREATE TABLE `item` (
	`id` text PRIMARY KEY NOT NULL,
	`sitting` text NOT NULL,
	`number` integer NOT NULL,
	`prompt` text NOT NULL,
	`kind` text DEFAULT 'numeric' NOT NULL,
	`max_grains` integer NOT NULL,
	`rev` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`sitting`) REFERENCES `sitting`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `item_by_sitting` ON `item` (`sitting`,`number`);--> statement-breakpoint
CREATE TABLE `item_draft` (
	`item` text PRIMARY KEY NOT NULL,
	`body` text NOT NULL,
	`rev` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`item`) REFERENCES `item`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `item_scheme` (
	`hash` text PRIMARY KEY NOT NULL,
	`body` text NOT NULL
);
--> statement-breakpoint
CREATE TABLE `scheme_version` (
	`id` text PRIMARY KEY NOT NULL,
	`sitting` text NOT NULL,
	`ordinal` integer NOT NULL,
	`made_by` text NOT NULL,
	`made_at` integer NOT NULL,
	`reason` text,
	FOREIGN KEY (`sitting`) REFERENCES `sitting`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`made_by`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `scheme_version_ordinal` ON `scheme_version` (`sitting`,`ordinal`);--> statement-breakpoint
CREATE TABLE `scheme_version_item` (
	`version` text NOT NULL,
	`item` text NOT NULL,
	`item_scheme` text NOT NULL,
	PRIMARY KEY(`version`, `item`),
	FOREIGN KEY (`version`) REFERENCES `scheme_version`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`item`) REFERENCES `item`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`item_scheme`) REFERENCES `item_scheme`(`hash`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `box` (
	`id` text PRIMARY KEY NOT NULL,
	`layout` text NOT NULL,
	`page_no` integer NOT NULL,
	`item` text,
	`use` text NOT NULL,
	`x` real NOT NULL,
	`y` real NOT NULL,
	`w` real NOT NULL,
	`h` real NOT NULL,
	FOREIGN KEY (`layout`) REFERENCES `layout`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`item`) REFERENCES `item`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `box_by_layout` ON `box` (`layout`,`page_no`);--> statement-breakpoint
CREATE TABLE `layout` (
	`id` text PRIMARY KEY NOT NULL,
	`sitting` text NOT NULL,
	`ordinal` integer NOT NULL,
	`origin` text NOT NULL,
	FOREIGN KEY (`sitting`) REFERENCES `sitting`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `layout_ordinal` ON `layout` (`sitting`,`ordinal`);--> statement-breakpoint
CREATE TABLE `layout_page` (
	`layout` text NOT NULL,
	`page_no` integer NOT NULL,
	`width_mm` real NOT NULL,
	`height_mm` real NOT NULL,
	`sample` text,
	PRIMARY KEY(`layout`, `page_no`),
	FOREIGN KEY (`layout`) REFERENCES `layout`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `page` (
	`id` text PRIMARY KEY NOT NULL,
	`script` text NOT NULL,
	`page_no` integer NOT NULL,
	`image` text,
	`excused_reason` text,
	`excused_at` integer,
	FOREIGN KEY (`script`) REFERENCES `script`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `page_place` ON `page` (`script`,`page_no`);--> statement-breakpoint
CREATE TABLE `script` (
	`id` text PRIMARY KEY NOT NULL,
	`sitting` text NOT NULL,
	`number` integer NOT NULL,
	`layout` text,
	`candidate` text,
	`origin` text NOT NULL,
	`void_reason` text,
	`merged_into` text,
	FOREIGN KEY (`sitting`) REFERENCES `sitting`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`layout`) REFERENCES `layout`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`candidate`) REFERENCES `candidate`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `script_number` ON `script` (`sitting`,`number`);--> statement-breakpoint
CREATE UNIQUE INDEX `script_one_live_per_candidate` ON `script` (`candidate`) WHERE "void_reason" is null and "merged_into" is null;--> statement-breakpoint
CREATE TABLE `answer` (
	`id` text PRIMARY KEY NOT NULL,
	`script` text NOT NULL,
	`item` text NOT NULL,
	`sitting` text NOT NULL,
	`evidence` text DEFAULT 'none' NOT NULL,
	`state` text DEFAULT 'not-read' NOT NULL,
	`readings_due` integer DEFAULT 0 NOT NULL,
	`settled_canonical` text,
	`settled_from` text,
	`score` text,
	`sort_value` real,
	`shuffle` integer NOT NULL,
	`seq` integer DEFAULT 0 NOT NULL,
	`rev` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`script`) REFERENCES `script`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`item`) REFERENCES `item`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`sitting`) REFERENCES `sitting`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `answer_of_script` ON `answer` (`script`,`item`);--> statement-breakpoint
CREATE INDEX `answer_by_sitting` ON `answer` (`sitting`,`state`);--> statement-breakpoint
CREATE INDEX `answer_for_desk` ON `answer` (`item`,`readings_due`,`shuffle`);--> statement-breakpoint
CREATE INDEX `answer_by_seq` ON `answer` (`sitting`,`seq`);--> statement-breakpoint
CREATE TABLE `lease` (
	`id` text PRIMARY KEY NOT NULL,
	`answer` text NOT NULL,
	`reader` text NOT NULL,
	`purpose` text NOT NULL,
	`taken_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	`ended_at` integer,
	FOREIGN KEY (`answer`) REFERENCES `answer`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`reader`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `lease_one_open` ON `lease` (`answer`,`purpose`) WHERE "ended_at" is null;--> statement-breakpoint
CREATE INDEX `lease_open_by_reader` ON `lease` (`reader`) WHERE "ended_at" is null;--> statement-breakpoint
CREATE INDEX `lease_open_by_expiry` ON `lease` (`expires_at`) WHERE "ended_at" is null;--> statement-breakpoint
CREATE TABLE `reading` (
	`id` text PRIMARY KEY NOT NULL,
	`answer` text NOT NULL,
	`reader` text NOT NULL,
	`purpose` text NOT NULL,
	`text` text,
	`code` text,
	`canonical` text NOT NULL,
	`value` text,
	`note` text,
	`knew_key` integer NOT NULL,
	`lease` text,
	`opened_at` integer NOT NULL,
	`recorded_at` integer NOT NULL,
	`grammar` integer NOT NULL,
	FOREIGN KEY (`answer`) REFERENCES `answer`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`reader`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `reading_by_answer` ON `reading` (`answer`);--> statement-breakpoint
CREATE INDEX `reading_by_reader` ON `reading` (`reader`,`recorded_at`);--> statement-breakpoint
CREATE TABLE `reading_end` (
	`reading` text PRIMARY KEY NOT NULL,
	`why` text NOT NULL,
	`by` text NOT NULL,
	`at` integer NOT NULL,
	FOREIGN KEY (`reading`) REFERENCES `reading`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`by`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `uncovered` (
	`answer` text NOT NULL,
	`person` text NOT NULL,
	`third_reading` text NOT NULL,
	`at` integer NOT NULL,
	FOREIGN KEY (`answer`) REFERENCES `answer`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`third_reading`) REFERENCES `reading`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `uncovered_once` ON `uncovered` (`answer`,`person`);--> statement-breakpoint
CREATE TABLE `batch` (
	`id` text PRIMARY KEY NOT NULL,
	`sitting` text NOT NULL,
	`bundle` text NOT NULL,
	`made_by` text NOT NULL,
	`made_at` integer NOT NULL,
	`state` text DEFAULT 'open' NOT NULL,
	FOREIGN KEY (`sitting`) REFERENCES `sitting`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`made_by`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `batch_by_sitting` ON `batch` (`sitting`);--> statement-breakpoint
CREATE TABLE `blob` (
	`sha256` text PRIMARY KEY NOT NULL,
	`size` integer NOT NULL,
	`media_type` text NOT NULL
);
--> statement-breakpoint
CREATE TABLE `crop` (
	`id` text PRIMARY KEY NOT NULL,
	`answer` text NOT NULL,
	`box` text NOT NULL,
	`page_image` text NOT NULL,
	`blob` text NOT NULL,
	`width_px` integer NOT NULL,
	`height_px` integer NOT NULL,
	`evidence` text DEFAULT 'in' NOT NULL,
	`rev` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`answer`) REFERENCES `answer`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`box`) REFERENCES `box`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`page_image`) REFERENCES `page_image`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`blob`) REFERENCES `blob`(`sha256`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `crop_of_box` ON `crop` (`answer`,`box`);--> statement-breakpoint
CREATE INDEX `crop_by_image` ON `crop` (`page_image`);--> statement-breakpoint
CREATE TABLE `job` (
	`id` text PRIMARY KEY NOT NULL,
	`kind` text NOT NULL,
	`dedupe_key` text NOT NULL,
	`payload` text NOT NULL,
	`state` text DEFAULT 'waiting' NOT NULL,
	`tries` integer DEFAULT 0 NOT NULL,
	`run_at` integer NOT NULL,
	`leased_until` integer,
	`error` text
);
--> statement-breakpoint
CREATE UNIQUE INDEX `job_open_once` ON `job` (`dedupe_key`) WHERE "state" in ('waiting', 'running');--> statement-breakpoint
CREATE INDEX `job_next` ON `job` (`state`,`run_at`);--> statement-breakpoint
CREATE TABLE `page_image` (
	`id` text PRIMARY KEY NOT NULL,
	`upload` text NOT NULL,
	`index` integer NOT NULL,
	`sitting` text NOT NULL,
	`original` text,
	`display` text,
	`thumb` text,
	`width_px` integer,
	`height_px` integer,
	`turns` integer DEFAULT 0 NOT NULL,
	`mm_to_px` text,
	`residual_mm` real,
	`state` text DEFAULT 'waiting' NOT NULL,
	`page` text,
	`why` text,
	`rev` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`upload`) REFERENCES `upload`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`sitting`) REFERENCES `sitting`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`original`) REFERENCES `blob`(`sha256`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`display`) REFERENCES `blob`(`sha256`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`thumb`) REFERENCES `blob`(`sha256`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`page`) REFERENCES `page`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `page_image_of_upload` ON `page_image` (`upload`,`index`);--> statement-breakpoint
CREATE UNIQUE INDEX `page_image_one_placed` ON `page_image` (`page`) WHERE "state" = 'placed';--> statement-breakpoint
CREATE INDEX `page_image_by_state` ON `page_image` (`sitting`,`state`);--> statement-breakpoint
CREATE INDEX `page_image_by_original` ON `page_image` (`original`);--> statement-breakpoint
CREATE TABLE `upload` (
	`id` text PRIMARY KEY NOT NULL,
	`batch` text NOT NULL,
	`file_name` text NOT NULL,
	`size` integer NOT NULL,
	`part_size` integer NOT NULL,
	`sha256` text,
	`state` text DEFAULT 'sending' NOT NULL,
	`problem` text,
	`made_at` integer NOT NULL,
	FOREIGN KEY (`batch`) REFERENCES `batch`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `upload_by_batch` ON `upload` (`batch`);--> statement-breakpoint
CREATE TABLE `upload_part` (
	`upload` text NOT NULL,
	`part` integer NOT NULL,
	`size` integer NOT NULL,
	FOREIGN KEY (`upload`) REFERENCES `upload`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `upload_part_once` ON `upload_part` (`upload`,`part`);--> statement-breakpoint
CREATE TABLE `ruling` (
	`id` text PRIMARY KEY NOT NULL,
	`answer` text NOT NULL,
	`kind` text NOT NULL,
	`third_reading` text,
	`text` text,
	`code` text,
	`canonical` text,
	`value` text,
	`grains` integer,
	`reason` text,
	`by` text NOT NULL,
	`at` integer NOT NULL,
	FOREIGN KEY (`answer`) REFERENCES `answer`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`third_reading`) REFERENCES `reading`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`by`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `ruling_by_answer` ON `ruling` (`answer`);--> statement-breakpoint
CREATE TABLE `ruling_end` (
	`ruling` text PRIMARY KEY NOT NULL,
	`why` text NOT NULL,
	`by` text NOT NULL,
	`at` integer NOT NULL,
	FOREIGN KEY (`ruling`) REFERENCES `ruling`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`by`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `score` (
	`id` text PRIMARY KEY NOT NULL,
	`answer` text NOT NULL,
	`scheme_version` text NOT NULL,
	`reading` text,
	`ruling` text,
	`verdict` text,
	`grains` integer NOT NULL,
	`cause` text NOT NULL,
	`at` integer NOT NULL,
	FOREIGN KEY (`answer`) REFERENCES `answer`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`scheme_version`) REFERENCES `scheme_version`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`reading`) REFERENCES `reading`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`verdict`) REFERENCES `verdict`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `score_by_answer` ON `score` (`answer`);--> statement-breakpoint
CREATE TABLE `total` (
	`script` text PRIMARY KEY NOT NULL,
	`grains` integer NOT NULL,
	`missing` integer NOT NULL,
	`rounded_grains` integer NOT NULL,
	`rev` integer DEFAULT 1 NOT NULL,
	FOREIGN KEY (`script`) REFERENCES `script`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `verdict` (
	`id` text PRIMARY KEY NOT NULL,
	`item_scheme` text NOT NULL,
	`canonical` text NOT NULL,
	`context` text NOT NULL,
	`grains` integer,
	`rule` text NOT NULL,
	`numbers` text NOT NULL,
	FOREIGN KEY (`item_scheme`) REFERENCES `item_scheme`(`hash`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `verdict_of_input` ON `verdict` (`item_scheme`,`canonical`,`context`);--> statement-breakpoint
CREATE TABLE `audit_entry` (
	`n` integer PRIMARY KEY NOT NULL,
	`at` integer NOT NULL,
	`actor` text,
	`act` text NOT NULL,
	`sitting` text,
	`subject` text,
	`before` text,
	`after` text,
	`reason` text,
	`prev_hash` text NOT NULL,
	`hash` text NOT NULL
);
--> statement-breakpoint
CREATE INDEX `audit_by_subject` ON `audit_entry` (`subject`);--> statement-breakpoint
CREATE INDEX `audit_by_sitting` ON `audit_entry` (`sitting`,`at`);--> statement-breakpoint
CREATE TABLE `idempotency` (
	`key` text NOT NULL,
	`person` text NOT NULL,
	`request_hash` text NOT NULL,
	`status` integer NOT NULL,
	`response` text NOT NULL,
	`at` integer NOT NULL,
	PRIMARY KEY(`person`, `key`)
);
--> statement-breakpoint
CREATE INDEX `idempotency_by_age` ON `idempotency` (`at`);