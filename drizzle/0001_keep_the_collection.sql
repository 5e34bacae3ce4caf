CREATE TABLE `dataset_series` (
	`accession` integer NOT NULL,
	`position` integer NOT NULL,
	`series_id` text NOT NULL,
	`label` text NOT NULL,
	`variant` text NOT NULL,
	`origin` text NOT NULL,
	`points` integer NOT NULL,
	`on_curve` integer NOT NULL,
	`warning` integer NOT NULL,
	`off_curve` integer NOT NULL,
	`rms_z` real NOT NULL,
	`p_value` real,
	`energy` blob NOT NULL,
	`energy_u` blob NOT NULL,
	`activity` blob NOT NULL,
	`activity_u` blob NOT NULL,
	`expected` blob NOT NULL,
	`expected_u` blob NOT NULL,
	`residual_u` blob NOT NULL,
	`z` blob NOT NULL,
	`p` blob NOT NULL,
	`q` blob NOT NULL,
	`flags` blob NOT NULL,
	PRIMARY KEY(`accession`, `position`),
	FOREIGN KEY (`accession`) REFERENCES `datasets`(`accession`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `dataset_series_variant` ON `dataset_series` (`variant`);--> statement-breakpoint
CREATE TABLE `datasets` (
	`accession` integer PRIMARY KEY NOT NULL,
	`deposit_id` text NOT NULL,
	`lab_id` text NOT NULL,
	`system` text NOT NULL,
	`title` text NOT NULL,
	`revision` integer NOT NULL,
	`licence` text NOT NULL,
	`readout` text NOT NULL,
	`ligands` text NOT NULL,
	`points` integer NOT NULL,
	`on_curve` integer NOT NULL,
	`warning` integer NOT NULL,
	`off_curve` integer NOT NULL,
	`rms_z` real NOT NULL,
	`p_value` real,
	`lowest_energy` real NOT NULL,
	`highest_energy` real NOT NULL,
	`fitted_here` integer NOT NULL,
	`published_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`deposit_id`) REFERENCES `deposits`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`lab_id`) REFERENCES `laboratories`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `datasets_deposit_id_unique` ON `datasets` (`deposit_id`);--> statement-breakpoint
CREATE INDEX `datasets_published` ON `datasets` (`published_at`);--> statement-breakpoint
CREATE INDEX `datasets_system` ON `datasets` (`system`);--> statement-breakpoint
CREATE INDEX `datasets_lab` ON `datasets` (`lab_id`);--> statement-breakpoint
CREATE TABLE `density_cells` (
	`accession` integer NOT NULL,
	`position` integer NOT NULL,
	`flag` text NOT NULL,
	`energy_cell` integer NOT NULL,
	`activity_cell` integer NOT NULL,
	`points` integer NOT NULL,
	PRIMARY KEY(`accession`, `position`, `flag`, `energy_cell`, `activity_cell`),
	FOREIGN KEY (`accession`) REFERENCES `datasets`(`accession`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `density_cells_energy` ON `density_cells` (`accession`,`energy_cell`,`flag`,`points`);--> statement-breakpoint
CREATE TABLE `off_curve_points` (
	`accession` integer NOT NULL,
	`position` integer NOT NULL,
	`point` integer NOT NULL,
	`energy` real NOT NULL,
	`activity` real NOT NULL,
	`expected` real NOT NULL,
	`z` real NOT NULL,
	PRIMARY KEY(`accession`, `position`, `point`),
	FOREIGN KEY (`accession`) REFERENCES `datasets`(`accession`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `off_curve_points_energy` ON `off_curve_points` (`energy`);--> statement-breakpoint
CREATE TABLE `audit_trail` (
	`id` integer PRIMARY KEY NOT NULL,
	`at` integer NOT NULL,
	`actor` text NOT NULL,
	`action` text NOT NULL,
	`subject` text NOT NULL,
	`detail` text DEFAULT '' NOT NULL
);
--> statement-breakpoint
CREATE INDEX `audit_trail_subject` ON `audit_trail` (`subject`);--> statement-breakpoint
CREATE TABLE `decisions` (
	`id` integer PRIMARY KEY NOT NULL,
	`deposit_id` text NOT NULL,
	`revision` integer NOT NULL,
	`kind` text NOT NULL,
	`letter` text NOT NULL,
	`decided_by` text NOT NULL,
	`decided_at` integer NOT NULL,
	FOREIGN KEY (`deposit_id`) REFERENCES `deposits`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `decisions_deposit` ON `decisions` (`deposit_id`);--> statement-breakpoint
CREATE TABLE `deposits` (
	`id` text PRIMARY KEY NOT NULL,
	`lab_id` text NOT NULL,
	`state` text NOT NULL,
	`document` text NOT NULL,
	`version` integer NOT NULL,
	`title` text NOT NULL,
	`system` text DEFAULT '' NOT NULL,
	`errors` text DEFAULT '[]' NOT NULL,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	`accession` integer,
	FOREIGN KEY (`lab_id`) REFERENCES `laboratories`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `deposits_accession_unique` ON `deposits` (`accession`);--> statement-breakpoint
CREATE INDEX `deposits_lab` ON `deposits` (`lab_id`,`state`);--> statement-breakpoint
CREATE INDEX `deposits_state` ON `deposits` (`state`);--> statement-breakpoint
CREATE TABLE `files` (
	`id` text PRIMARY KEY NOT NULL,
	`deposit_id` text NOT NULL,
	`name` text NOT NULL,
	`size` integer NOT NULL,
	`sha256` text NOT NULL,
	`media_type` text NOT NULL,
	`object_key` text NOT NULL,
	`uploaded_by` text NOT NULL,
	`uploaded_at` integer NOT NULL,
	FOREIGN KEY (`deposit_id`) REFERENCES `deposits`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `files_deposit` ON `files` (`deposit_id`);--> statement-breakpoint
CREATE TABLE `idempotency_keys` (
	`key_hash` text PRIMARY KEY NOT NULL,
	`body_hash` text NOT NULL,
	`outcome` text NOT NULL,
	`created_at` integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE `revisions` (
	`id` integer PRIMARY KEY NOT NULL,
	`deposit_id` text NOT NULL,
	`number` integer NOT NULL,
	`document` text NOT NULL,
	`sha256` text NOT NULL,
	`assessment` text NOT NULL,
	`summary` text NOT NULL,
	`engine` text NOT NULL,
	`policy` integer NOT NULL,
	`submitted_by` text NOT NULL,
	`submitted_at` integer NOT NULL,
	`published_at` integer,
	FOREIGN KEY (`deposit_id`) REFERENCES `deposits`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `revisions_number` ON `revisions` (`deposit_id`,`number`);--> statement-breakpoint
CREATE TABLE `lab_tokens` (
	`id` text PRIMARY KEY NOT NULL,
	`lab_id` text NOT NULL,
	`name` text NOT NULL,
	`token_hash` text NOT NULL,
	`scopes` text NOT NULL,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	`last_used_at` integer,
	`revoked_at` integer,
	FOREIGN KEY (`lab_id`) REFERENCES `laboratories`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `lab_tokens_token_hash_unique` ON `lab_tokens` (`token_hash`);--> statement-breakpoint
CREATE INDEX `lab_tokens_lab` ON `lab_tokens` (`lab_id`);--> statement-breakpoint
CREATE TABLE `laboratories` (
	`id` text PRIMARY KEY NOT NULL,
	`slug` text NOT NULL,
	`name` text NOT NULL,
	`institution` text NOT NULL,
	`created_at` integer NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `laboratories_slug_unique` ON `laboratories` (`slug`);--> statement-breakpoint
CREATE TABLE `memberships` (
	`person_id` text NOT NULL,
	`lab_id` text NOT NULL,
	`role` text NOT NULL,
	`created_at` integer NOT NULL,
	PRIMARY KEY(`person_id`, `lab_id`),
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`lab_id`) REFERENCES `laboratories`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `memberships_lab` ON `memberships` (`lab_id`);--> statement-breakpoint
CREATE TABLE `people` (
	`id` text PRIMARY KEY NOT NULL,
	`email` text NOT NULL,
	`name` text NOT NULL,
	`password_hash` text NOT NULL,
	`role` text NOT NULL,
	`disabled_at` integer,
	`created_at` integer NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `people_email_unique` ON `people` (`email`);--> statement-breakpoint
CREATE TABLE `sessions` (
	`id_hash` text PRIMARY KEY NOT NULL,
	`person_id` text NOT NULL,
	`created_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `sessions_person` ON `sessions` (`person_id`);--> statement-breakpoint
CREATE TABLE `sign_in_attempts` (
	`id` text PRIMARY KEY NOT NULL,
	`account_key` text NOT NULL,
	`address_key` text NOT NULL,
	`at` integer NOT NULL
);
--> statement-breakpoint
CREATE INDEX `sign_in_attempts_account` ON `sign_in_attempts` (`account_key`,`at`);--> statement-breakpoint
CREATE INDEX `sign_in_attempts_address` ON `sign_in_attempts` (`address_key`,`at`);--> statement-breakpoint
CREATE TABLE `systems` (
	`slug` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`protein` text NOT NULL,
	`ligands` text NOT NULL,
	`status` text NOT NULL,
	`created_at` integer NOT NULL
);
