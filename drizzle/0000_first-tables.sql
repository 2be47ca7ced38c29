CREATE TABLE `cable_revisions` (
	`cable_id` text NOT NULL,
	`revision` integer NOT NULL,
	`state` text NOT NULL,
	`condition` text,
	`reason` text NOT NULL,
	`author_id` text NOT NULL,
	`created_at` text NOT NULL,
	`approved_by_id` text,
	`approved_at` text,
	`name` text NOT NULL,
	`family` text NOT NULL,
	`model` text NOT NULL,
	`construction` text,
	`build` text,
	`figures` text NOT NULL,
	`limits` text NOT NULL,
	`z0_ohm` real NOT NULL,
	`velocity_factor` real NOT NULL,
	`capacitance_f_per_m` real NOT NULL,
	`delay_s_per_m` real NOT NULL,
	`loss_low_db_per_100m` real NOT NULL,
	`loss_high_db_per_100m` real NOT NULL,
	`outer_diameter_mm` real,
	`max_frequency_hz` real,
	`words` text NOT NULL,
	PRIMARY KEY(`cable_id`, `revision`),
	FOREIGN KEY (`cable_id`) REFERENCES `cables`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`author_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`approved_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `cable_revisions_by_state` ON `cable_revisions` (`state`,`family`);--> statement-breakpoint
CREATE INDEX `cable_revisions_by_author` ON `cable_revisions` (`author_id`);--> statement-breakpoint
CREATE TABLE `cables` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`designation` text NOT NULL,
	`aliases` text NOT NULL,
	`preferred` integer DEFAULT false NOT NULL,
	`current_revision` integer NOT NULL,
	`successor_id` text,
	`equivalence` text,
	`created_at` text NOT NULL,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`successor_id`) REFERENCES `cables`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `cables_designation` ON `cables` (`team_id`,`designation`);--> statement-breakpoint
CREATE TABLE `run_assignees` (
	`run_id` text NOT NULL,
	`person_id` text NOT NULL,
	PRIMARY KEY(`run_id`, `person_id`),
	FOREIGN KEY (`run_id`) REFERENCES `runs`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `run_assignees_by_person` ON `run_assignees` (`person_id`);--> statement-breakpoint
CREATE TABLE `run_cables` (
	`run_id` text NOT NULL,
	`cable_id` text NOT NULL,
	`revision` integer NOT NULL,
	PRIMARY KEY(`run_id`, `cable_id`, `revision`),
	FOREIGN KEY (`run_id`) REFERENCES `runs`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`cable_id`,`revision`) REFERENCES `cable_revisions`(`cable_id`,`revision`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `run_cables_by_cable` ON `run_cables` (`cable_id`);--> statement-breakpoint
CREATE TABLE `run_revisions` (
	`run_id` text NOT NULL,
	`version` integer NOT NULL,
	`saved_at` text NOT NULL,
	`saved_by_id` text NOT NULL,
	`sentence` text NOT NULL,
	`content` text NOT NULL,
	PRIMARY KEY(`run_id`, `version`),
	FOREIGN KEY (`run_id`) REFERENCES `runs`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`saved_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `runs` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`number` text NOT NULL,
	`name` text NOT NULL,
	`site` text NOT NULL,
	`folder` text NOT NULL,
	`state` text NOT NULL,
	`condition` text,
	`owner_id` text NOT NULL,
	`circuit` text NOT NULL,
	`temperature_c` real NOT NULL,
	`design_hz` real NOT NULL,
	`available_power_w` real,
	`band_hz` text,
	`targets` text NOT NULL,
	`source_name` text NOT NULL,
	`load_name` text NOT NULL,
	`version` integer NOT NULL,
	`created_at` text NOT NULL,
	`changed_at` text NOT NULL,
	`changed_by_id` text NOT NULL,
	`removed_at` text,
	`removed_by_id` text,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`owner_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`changed_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`removed_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `runs_number` ON `runs` (`team_id`,`number`);--> statement-breakpoint
CREATE INDEX `runs_by_change` ON `runs` (`team_id`,`changed_at`,`id`);--> statement-breakpoint
CREATE TABLE `members` (
	`team_id` text NOT NULL,
	`person_id` text NOT NULL,
	`role` text NOT NULL,
	PRIMARY KEY(`team_id`, `person_id`),
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `members_by_person` ON `members` (`person_id`);--> statement-breakpoint
CREATE TABLE `people` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`email` text NOT NULL,
	`password_hash` text NOT NULL,
	`created_at` text NOT NULL
);
--> statement-breakpoint
CREATE UNIQUE INDEX `people_email_unique` ON `people` (`email`);--> statement-breakpoint
CREATE TABLE `sessions` (
	`id` text PRIMARY KEY NOT NULL,
	`person_id` text NOT NULL,
	`team_id` text NOT NULL,
	`created_at` text NOT NULL,
	`expires_at_ms` integer NOT NULL,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `sessions_by_person` ON `sessions` (`person_id`);--> statement-breakpoint
CREATE TABLE `sign_in_attempts` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`address_hash` text NOT NULL,
	`account_hash` text NOT NULL,
	`at_ms` integer NOT NULL
);
--> statement-breakpoint
CREATE INDEX `sign_in_attempts_by_address` ON `sign_in_attempts` (`address_hash`,`at_ms`);--> statement-breakpoint
CREATE INDEX `sign_in_attempts_by_account` ON `sign_in_attempts` (`account_hash`,`at_ms`);--> statement-breakpoint
CREATE TABLE `teams` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`next_run_number` integer DEFAULT 1 NOT NULL,
	`words_version` integer DEFAULT 0 NOT NULL,
	`created_at` text NOT NULL
);
--> statement-breakpoint
CREATE TABLE `tokens` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`person_id` text NOT NULL,
	`name` text NOT NULL,
	`hash` text NOT NULL,
	`created_at` text NOT NULL,
	`expires_at_ms` integer,
	`revoked_at` text,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE UNIQUE INDEX `tokens_hash_unique` ON `tokens` (`hash`);--> statement-breakpoint
CREATE INDEX `tokens_by_person` ON `tokens` (`team_id`,`person_id`);