ALTER TABLE `crop` ADD `sides_confirmed` integer;--> statement-breakpoint
ALTER TABLE `crop` ADD `ink` text;--> statement-breakpoint
ALTER TABLE `job` ADD `crashes` integer DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE `page_image` ADD `frame` integer DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE `page_image` ADD `name` text;--> statement-breakpoint
ALTER TABLE `page_image` ADD `note` text;--> statement-breakpoint
ALTER TABLE `upload` ADD `pages` integer;--> statement-breakpoint
-- Until now the page of a file was also its page of the original.
UPDATE `page_image` SET `frame` = `index`;
