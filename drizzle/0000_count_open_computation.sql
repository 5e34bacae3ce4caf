CREATE TABLE `computation_leases` (
	`id` text PRIMARY KEY NOT NULL,
	`address_key` text NOT NULL,
	`reserved_points` integer NOT NULL,
	`expires_at` integer NOT NULL
);
--> statement-breakpoint
CREATE INDEX `computation_leases_address` ON `computation_leases` (`address_key`);--> statement-breakpoint
CREATE TABLE `computation_use` (
	`address_key` text NOT NULL,
	`second` integer NOT NULL,
	`calls` integer NOT NULL,
	`points` integer NOT NULL,
	PRIMARY KEY(`address_key`, `second`)
);
--> statement-breakpoint
CREATE INDEX `computation_use_second` ON `computation_use` (`second`);--> statement-breakpoint
CREATE TABLE `install_keys` (
	`name` text PRIMARY KEY NOT NULL,
	`value` blob NOT NULL
);
