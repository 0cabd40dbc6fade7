CREATE TABLE `trace_maxima` (
	`alignment_id` text NOT NULL,
	`trace_id` text NOT NULL,
	`maxima` blob NOT NULL,
	`created_at` integer NOT NULL,
	PRIMARY KEY(`alignment_id`, `trace_id`),
	FOREIGN KEY (`alignment_id`) REFERENCES `alignments`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`trace_id`) REFERENCES `traces`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE TABLE `traces` (
	`id` text PRIMARY KEY NOT NULL,
	`study_id` text NOT NULL,
	`sample_id` text,
	`file_name` text NOT NULL,
	`sha256` text NOT NULL,
	`bytes` integer NOT NULL,
	`kept_bytes` integer NOT NULL,
	`polarity` text NOT NULL,
	`profile` integer NOT NULL,
	`scans` integer NOT NULL,
	`centroids` integer NOT NULL,
	`intensity_limit` real NOT NULL,
	`lowest_mz` real NOT NULL,
	`highest_mz` real NOT NULL,
	`minutes` blob NOT NULL,
	`total` blob NOT NULL,
	`base` blob NOT NULL,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	`replaced_at` integer,
	FOREIGN KEY (`study_id`) REFERENCES `studies`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`sample_id`) REFERENCES `samples`(`id`) ON UPDATE no action ON DELETE set null,
	FOREIGN KEY (`created_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `traces_study` ON `traces` (`study_id`);--> statement-breakpoint
CREATE INDEX `traces_sample` ON `traces` (`sample_id`);--> statement-breakpoint
ALTER TABLE `comparison_versions` ADD `traces` text DEFAULT '[]' NOT NULL;--> statement-breakpoint
ALTER TABLE `people` ADD `bench_keys` integer DEFAULT true NOT NULL;--> statement-breakpoint
ALTER TABLE `uploads` ADD `kind` text DEFAULT 'table' NOT NULL;