CREATE TABLE `sign_in_places` (
	`account_key` text NOT NULL,
	`address_key` text NOT NULL,
	`at` integer NOT NULL,
	PRIMARY KEY(`account_key`, `address_key`)
);
--> statement-breakpoint
CREATE INDEX `sign_in_places_at` ON `sign_in_places` (`at`);--> statement-breakpoint
ALTER TABLE `datasets` ADD `strip` text;--> statement-breakpoint
CREATE TABLE `__new_deposits` (
	`id` text PRIMARY KEY NOT NULL,
	`lab_id` text NOT NULL,
	`state` text NOT NULL,
	`version` integer NOT NULL,
	`title` text NOT NULL,
	`system` text DEFAULT '' NOT NULL,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	`updated_by` text NOT NULL,
	`publish_on` text,
	`publish_zone` text,
	`accession` integer,
	`error_count` integer DEFAULT 0 NOT NULL,
	`errors` text DEFAULT '[]' NOT NULL,
	`document` text NOT NULL,
	FOREIGN KEY (`lab_id`) REFERENCES `laboratories`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
INSERT INTO `__new_deposits` (`id`, `lab_id`, `state`, `version`, `title`, `system`, `created_by`, `created_at`, `updated_at`, `updated_by`, `publish_on`, `publish_zone`, `accession`, `error_count`, `errors`, `document`)
SELECT `id`, `lab_id`, `state`, `version`, `title`, `system`, `created_by`, `created_at`, `updated_at`, `updated_by`, `publish_on`, `publish_zone`, `accession`, json_array_length(`errors`), `errors`, `document` FROM `deposits`;
--> statement-breakpoint
CREATE TABLE `__new_revisions` (
	`id` integer PRIMARY KEY NOT NULL,
	`deposit_id` text NOT NULL,
	`number` integer NOT NULL,
	`title` text NOT NULL,
	`system` text NOT NULL,
	`sha256` text NOT NULL,
	`summary` text NOT NULL,
	`engine` text NOT NULL,
	`policy` integer NOT NULL,
	`submitted_by` text NOT NULL,
	`submitted_at` integer NOT NULL,
	`published_at` integer,
	`document` text NOT NULL,
	`assessment` text NOT NULL,
	FOREIGN KEY (`deposit_id`) REFERENCES `deposits`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
INSERT INTO `__new_revisions` (`id`, `deposit_id`, `number`, `title`, `system`, `sha256`, `summary`, `engine`, `policy`, `submitted_by`, `submitted_at`, `published_at`, `document`, `assessment`)
SELECT `id`, `deposit_id`, `number`, coalesce(substr(json_extract(ltrim(`document`, char(65279)), '$.title'), 1, 300), ''), coalesce(json_extract(ltrim(`document`, char(65279)), '$.system'), ''), `sha256`, `summary`, `engine`, `policy`, `submitted_by`, `submitted_at`, `published_at`, `document`, `assessment` FROM `revisions`;
--> statement-breakpoint
DROP TABLE `revisions`;--> statement-breakpoint
DROP TABLE `deposits`;--> statement-breakpoint
ALTER TABLE `__new_deposits` RENAME TO `deposits`;--> statement-breakpoint
ALTER TABLE `__new_revisions` RENAME TO `revisions`;--> statement-breakpoint
CREATE UNIQUE INDEX `deposits_accession_unique` ON `deposits` (`accession`);--> statement-breakpoint
CREATE INDEX `deposits_lab` ON `deposits` (`lab_id`,`updated_at`);--> statement-breakpoint
CREATE INDEX `deposits_state` ON `deposits` (`state`);--> statement-breakpoint
CREATE UNIQUE INDEX `revisions_number` ON `revisions` (`deposit_id`,`number`);
