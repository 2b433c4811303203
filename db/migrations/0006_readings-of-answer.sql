DROP INDEX `reading_by_answer`;--> statement-breakpoint
CREATE INDEX `reading_by_answer` ON `reading` (`answer`,`reader`);