CREATE TABLE `loose_objects` (
	`object_key` text PRIMARY KEY NOT NULL,
	`since` integer NOT NULL
);
--> statement-breakpoint
CREATE INDEX `loose_objects_since` ON `loose_objects` (`since`);--> statement-breakpoint
ALTER TABLE `datasets` ADD `withdrawn_at` integer;--> statement-breakpoint
ALTER TABLE `datasets` ADD `withdrawal_reason` text;--> statement-breakpoint
UPDATE `datasets` SET `withdrawn_at` = (SELECT `updated_at` FROM `deposits` WHERE `deposits`.`id` = `datasets`.`deposit_id` AND `deposits`.`state` = 'withdrawn');--> statement-breakpoint
ALTER TABLE `deposits` ADD `updated_by` text DEFAULT '' NOT NULL;--> statement-breakpoint
UPDATE `deposits` SET `updated_by` = `created_by`;--> statement-breakpoint
ALTER TABLE `deposits` ADD `publish_on` text;--> statement-breakpoint
ALTER TABLE `deposits` ADD `publish_zone` text;--> statement-breakpoint
CREATE INDEX IF NOT EXISTS `idempotency_keys_created` ON `idempotency_keys` (`created_at`);