CREATE TABLE `jobs` (
	`id` text PRIMARY KEY NOT NULL,
	`kind` text NOT NULL,
	`payload` text NOT NULL,
	`run_at` integer NOT NULL,
	`attempts` integer DEFAULT 0 NOT NULL,
	`lease_token` text,
	`lease_until` integer,
	`last_error` text,
	`given_up_at` integer,
	`created_at` integer NOT NULL
);
--> statement-breakpoint
CREATE INDEX `jobs_due` ON `jobs` (`given_up_at`,`run_at`);--> statement-breakpoint
CREATE TABLE `refits` (
	`id` text PRIMARY KEY NOT NULL,
	`body` blob,
	`progress` real NOT NULL,
	`answer_status` integer,
	`answer` blob,
	`lease_id` text NOT NULL,
	`job_id` text NOT NULL,
	`expires_at` integer NOT NULL
);
--> statement-breakpoint
CREATE INDEX `refits_expiry` ON `refits` (`expires_at`);