CREATE TABLE `cable_comments` (
	`id` text PRIMARY KEY NOT NULL,
	`cable_id` text NOT NULL,
	`revision` integer NOT NULL,
	`person_id` text NOT NULL,
	`said_at` text NOT NULL,
	`text` text NOT NULL,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`cable_id`,`revision`) REFERENCES `cable_revisions`(`cable_id`,`revision`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `cable_comments_by_cable` ON `cable_comments` (`cable_id`,`said_at`);--> statement-breakpoint
CREATE TABLE `cable_events` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`cable_id` text NOT NULL,
	`revision` integer NOT NULL,
	`at` text NOT NULL,
	`person_id` text NOT NULL,
	`step` text NOT NULL,
	`state` text NOT NULL,
	`condition` text,
	`note` text NOT NULL,
	`answers` text,
	FOREIGN KEY (`cable_id`) REFERENCES `cables`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `cable_events_by_cable` ON `cable_events` (`cable_id`,`at`);--> statement-breakpoint
CREATE TABLE `cable_lots` (
	`id` text PRIMARY KEY NOT NULL,
	`cable_id` text NOT NULL,
	`lot` text NOT NULL,
	`reel` text DEFAULT '' NOT NULL,
	`length_m` real,
	`figures` text NOT NULL,
	`note` text DEFAULT '' NOT NULL,
	`measured_at` text NOT NULL,
	`added_by_id` text NOT NULL,
	`added_at` text NOT NULL,
	FOREIGN KEY (`cable_id`) REFERENCES `cables`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`added_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `cable_lots_name` ON `cable_lots` (`cable_id`,`lot`,`reel`);--> statement-breakpoint
CREATE TABLE `cable_reports` (
	`id` text PRIMARY KEY NOT NULL,
	`cable_id` text NOT NULL,
	`revision` integer NOT NULL,
	`person_id` text NOT NULL,
	`reported_at` text NOT NULL,
	`text` text NOT NULL,
	`settled_at` text,
	`settled_by_id` text,
	`outcome` text,
	`answer` text,
	FOREIGN KEY (`cable_id`) REFERENCES `cables`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`settled_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `cable_reports_by_cable` ON `cable_reports` (`cable_id`,`reported_at`);--> statement-breakpoint
CREATE TABLE `cable_waivers` (
	`id` text PRIMARY KEY NOT NULL,
	`cable_id` text NOT NULL,
	`run_id` text NOT NULL,
	`reason` text NOT NULL,
	`until` text NOT NULL,
	`given_by_id` text NOT NULL,
	`given_at` text NOT NULL,
	`ended_at` text,
	FOREIGN KEY (`cable_id`) REFERENCES `cables`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`run_id`) REFERENCES `runs`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`given_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `cable_waivers_by_cable` ON `cable_waivers` (`cable_id`);--> statement-breakpoint
CREATE INDEX `cable_waivers_by_run` ON `cable_waivers` (`run_id`);--> statement-breakpoint
CREATE TABLE `run_reels` (
	`run_id` text NOT NULL,
	`lot_id` text NOT NULL,
	FOREIGN KEY (`run_id`) REFERENCES `runs`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`lot_id`) REFERENCES `cable_lots`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE UNIQUE INDEX `run_reels_once` ON `run_reels` (`run_id`,`lot_id`);--> statement-breakpoint
CREATE TABLE `cable_evidence` (
	`id` text PRIMARY KEY NOT NULL,
	`cable_id` text NOT NULL,
	`revision` integer NOT NULL,
	`file_name` text NOT NULL,
	`media_type` text NOT NULL,
	`size_bytes` integer NOT NULL,
	`hash` text NOT NULL,
	`title` text NOT NULL,
	`content` blob NOT NULL,
	`added_by_id` text NOT NULL,
	`added_at` text NOT NULL,
	FOREIGN KEY (`added_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`cable_id`,`revision`) REFERENCES `cable_revisions`(`cable_id`,`revision`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `cable_evidence_by_cable` ON `cable_evidence` (`cable_id`,`added_at`);--> statement-breakpoint
CREATE TABLE `cable_import_rows` (
	`import_id` text NOT NULL,
	`row` integer NOT NULL,
	`text` text NOT NULL,
	`faults` text NOT NULL,
	`cable_id` text,
	PRIMARY KEY(`import_id`, `row`),
	FOREIGN KEY (`import_id`) REFERENCES `cable_imports`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE TABLE `cable_imports` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`file_name` text NOT NULL,
	`started_by_id` text NOT NULL,
	`started_at` text NOT NULL,
	`committed_at` text,
	`row_count` integer NOT NULL,
	`drafts` integer DEFAULT 0 NOT NULL,
	`quarantined` integer DEFAULT 0 NOT NULL,
	`skipped` integer DEFAULT 0 NOT NULL,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`started_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `cable_imports_by_team` ON `cable_imports` (`team_id`,`started_at`);--> statement-breakpoint
CREATE TABLE `limit_lines` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`name` text NOT NULL,
	`source` text NOT NULL,
	`line` text NOT NULL,
	`added_by_id` text NOT NULL,
	`added_at` text NOT NULL,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`added_by_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `limit_lines_name` ON `limit_lines` (`team_id`,`name`);--> statement-breakpoint
CREATE TABLE `letters` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`to_address` text NOT NULL,
	`subject` text NOT NULL,
	`body` text NOT NULL,
	`written_at` text NOT NULL,
	`state` text NOT NULL,
	`tries` integer DEFAULT 0 NOT NULL,
	`next_try_at` text NOT NULL,
	`sent_at` text,
	`error` text,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `letters_due` ON `letters` (`state`,`next_try_at`);--> statement-breakpoint
CREATE INDEX `letters_by_team` ON `letters` (`team_id`,`written_at`);--> statement-breakpoint
CREATE TABLE `notices` (
	`id` text PRIMARY KEY NOT NULL,
	`team_id` text NOT NULL,
	`person_id` text NOT NULL,
	`at` text NOT NULL,
	`kind` text NOT NULL,
	`text` text NOT NULL,
	`link` text NOT NULL,
	`read_at` text,
	FOREIGN KEY (`team_id`) REFERENCES `teams`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `notices_by_person` ON `notices` (`person_id`,`team_id`,`at`);--> statement-breakpoint
ALTER TABLE `cable_revisions` ADD `version` integer DEFAULT 1 NOT NULL;--> statement-breakpoint
ALTER TABLE `cable_revisions` ADD `submitted_at` text;--> statement-breakpoint
ALTER TABLE `cable_revisions` ADD `inputs` text;--> statement-breakpoint
ALTER TABLE `cables` ADD `review_due_at` text;--> statement-breakpoint
ALTER TABLE `teams` ADD `rules` text;--> statement-breakpoint
-- What was typed of an approved revision stays as its values do.
CREATE TRIGGER `cable_revisions_approved_inputs_stay`
BEFORE UPDATE OF `inputs` ON `cable_revisions`
WHEN OLD.`approved_at` IS NOT NULL
BEGIN
  SELECT RAISE(ABORT, 'the values of an approved revision never change');
END;
--> statement-breakpoint
-- The history of an entry is only ever added to.
CREATE TRIGGER `cable_events_stay`
BEFORE UPDATE ON `cable_events`
BEGIN
  SELECT RAISE(ABORT, 'what happened to an entry never changes');
END;
