CREATE TABLE `activity` (
	`id` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`at` integer NOT NULL,
	`person_id` text,
	`action` text NOT NULL,
	`study_id` text,
	`subject_id` text,
	`detail` text DEFAULT '' NOT NULL
);
--> statement-breakpoint
CREATE INDEX `activity_study` ON `activity` (`study_id`);--> statement-breakpoint
CREATE TABLE `alignment_tables` (
	`id` text PRIMARY KEY NOT NULL,
	`alignment_id` text NOT NULL,
	`position` integer NOT NULL,
	`table_id` text NOT NULL,
	`sample_id` text,
	`sample_name` text NOT NULL,
	`table_digest` text NOT NULL,
	`intensity` blob NOT NULL,
	`member` blob NOT NULL,
	`corrected_minutes` blob NOT NULL,
	`left_out_row` blob NOT NULL,
	`left_out_group` blob NOT NULL,
	`offset_ppm` real NOT NULL,
	`offset_applied` integer NOT NULL,
	`time_corrected` integer NOT NULL,
	`landmarks` integer NOT NULL,
	`drift_reason` text NOT NULL,
	`drift_minutes` blob NOT NULL,
	`drift_shift` blob NOT NULL,
	`residual_median_ppm` real,
	`residual_median_minutes` real,
	FOREIGN KEY (`alignment_id`) REFERENCES `alignments`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`table_id`) REFERENCES `tables`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`sample_id`) REFERENCES `samples`(`id`) ON UPDATE no action ON DELETE set null
);
--> statement-breakpoint
CREATE INDEX `alignment_tables_alignment` ON `alignment_tables` (`alignment_id`);--> statement-breakpoint
CREATE INDEX `alignment_tables_table` ON `alignment_tables` (`table_id`);--> statement-breakpoint
CREATE TABLE `alignments` (
	`id` text PRIMARY KEY NOT NULL,
	`study_id` text NOT NULL,
	`number` integer NOT NULL,
	`practice` integer DEFAULT false NOT NULL,
	`as_given` integer DEFAULT false NOT NULL,
	`settings` text NOT NULL,
	`engine_version` text NOT NULL,
	`rerun_of` text,
	`differs` text DEFAULT '[]' NOT NULL,
	`groups` integer NOT NULL,
	`reference` integer NOT NULL,
	`mz` blob NOT NULL,
	`retention_minutes` blob NOT NULL,
	`group_size` blob NOT NULL,
	`neighbour_start` blob NOT NULL,
	`neighbour_list` blob NOT NULL,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`study_id`) REFERENCES `studies`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`created_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `alignments_study` ON `alignments` (`study_id`);--> statement-breakpoint
CREATE TABLE `comparison_versions` (
	`id` text PRIMARY KEY NOT NULL,
	`comparison_id` text NOT NULL,
	`study_id` text NOT NULL,
	`alignment_id` text NOT NULL,
	`number` integer NOT NULL,
	`side_a_name` text NOT NULL,
	`side_b_name` text NOT NULL,
	`settings` text NOT NULL,
	`samples` text NOT NULL,
	`engine_version` text NOT NULL,
	`differs` text DEFAULT '[]' NOT NULL,
	`cautions` text DEFAULT '[]' NOT NULL,
	`counts` text NOT NULL,
	`columns` blob NOT NULL,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`comparison_id`) REFERENCES `comparisons`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`study_id`) REFERENCES `studies`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`alignment_id`) REFERENCES `alignments`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE UNIQUE INDEX `comparison_versions_number` ON `comparison_versions` (`comparison_id`,`number`);--> statement-breakpoint
CREATE INDEX `comparison_versions_alignment` ON `comparison_versions` (`alignment_id`);--> statement-breakpoint
CREATE TABLE `comparisons` (
	`id` text PRIMARY KEY NOT NULL,
	`study_id` text NOT NULL,
	`title` text NOT NULL,
	`practice` integer DEFAULT false NOT NULL,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	`archived_at` integer,
	FOREIGN KEY (`study_id`) REFERENCES `studies`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`created_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `comparisons_study` ON `comparisons` (`study_id`);--> statement-breakpoint
CREATE TABLE `share_links` (
	`id` text PRIMARY KEY NOT NULL,
	`study_id` text NOT NULL,
	`version_id` text NOT NULL,
	`label` text DEFAULT '' NOT NULL,
	`allow_export` integer DEFAULT false NOT NULL,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`study_id`) REFERENCES `studies`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`version_id`) REFERENCES `comparison_versions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `share_links_version` ON `share_links` (`version_id`);--> statement-breakpoint
CREATE INDEX `share_links_study` ON `share_links` (`study_id`);--> statement-breakpoint
CREATE TABLE `flags` (
	`id` text PRIMARY KEY NOT NULL,
	`study_id` text NOT NULL,
	`alignment_id` text NOT NULL,
	`feature_index` integer NOT NULL,
	`kind` text NOT NULL,
	`reason` text NOT NULL,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	`removed_at` integer,
	`removed_by` text,
	FOREIGN KEY (`study_id`) REFERENCES `studies`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`alignment_id`) REFERENCES `alignments`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`created_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `flags_feature` ON `flags` (`alignment_id`,`feature_index`);--> statement-breakpoint
CREATE INDEX `flags_study` ON `flags` (`study_id`);--> statement-breakpoint
CREATE TABLE `jobs` (
	`id` text PRIMARY KEY NOT NULL,
	`kind` text NOT NULL,
	`study_id` text,
	`input` text NOT NULL,
	`status` text DEFAULT 'queued' NOT NULL,
	`progress` real DEFAULT 0 NOT NULL,
	`message` text DEFAULT '' NOT NULL,
	`result_id` text,
	`attempts` integer DEFAULT 0 NOT NULL,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	`started_at` integer,
	`ended_at` integer,
	FOREIGN KEY (`study_id`) REFERENCES `studies`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `jobs_status` ON `jobs` (`status`);--> statement-breakpoint
CREATE INDEX `jobs_study` ON `jobs` (`study_id`);--> statement-breakpoint
CREATE TABLE `laboratory` (
	`name` text PRIMARY KEY NOT NULL,
	`value` text NOT NULL
);
--> statement-breakpoint
CREATE TABLE `people` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`sign_in_name` text NOT NULL,
	`email` text,
	`password_hash` text,
	`created_at` integer NOT NULL,
	`closed_at` integer
);
--> statement-breakpoint
CREATE UNIQUE INDEX `people_sign_in_name` ON `people` (`sign_in_name`);--> statement-breakpoint
CREATE TABLE `person_roles` (
	`person_id` text NOT NULL,
	`role` text NOT NULL,
	PRIMARY KEY(`person_id`, `role`),
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE TABLE `sessions` (
	`id` text PRIMARY KEY NOT NULL,
	`person_id` text NOT NULL,
	`secret_hash` text NOT NULL,
	`created_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	`ended_at` integer,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE UNIQUE INDEX `sessions_secret_hash` ON `sessions` (`secret_hash`);--> statement-breakpoint
CREATE INDEX `sessions_person` ON `sessions` (`person_id`);--> statement-breakpoint
CREATE TABLE `secrets` (
	`id` text PRIMARY KEY NOT NULL,
	`kind` text NOT NULL,
	`hash` text NOT NULL,
	`subject` text,
	`created_by` text,
	`created_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	`used_at` integer,
	`withdrawn_at` integer
);
--> statement-breakpoint
CREATE UNIQUE INDEX `secrets_hash` ON `secrets` (`hash`);--> statement-breakpoint
CREATE INDEX `secrets_subject` ON `secrets` (`subject`);--> statement-breakpoint
CREATE TABLE `methods` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`column` text DEFAULT '' NOT NULL,
	`gradient` text DEFAULT '' NOT NULL,
	`polarity` text NOT NULL,
	`void_minutes` real,
	`divert_windows` text DEFAULT '[]' NOT NULL,
	`remark` text DEFAULT '' NOT NULL,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	`archived_at` integer,
	FOREIGN KEY (`created_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE TABLE `samples` (
	`id` text PRIMARY KEY NOT NULL,
	`study_id` text NOT NULL,
	`position` integer NOT NULL,
	`name` text NOT NULL,
	`kind` text DEFAULT 'sample' NOT NULL,
	`side` text,
	`preparation` text DEFAULT '' NOT NULL,
	`amount` real,
	`amount_unit` text DEFAULT 'mg' NOT NULL,
	`volume_ml` real,
	`dilution` real,
	`injection_ul` real,
	`run_order` integer,
	`batch` text DEFAULT '' NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`study_id`) REFERENCES `studies`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE INDEX `samples_study` ON `samples` (`study_id`);--> statement-breakpoint
CREATE TABLE `studies` (
	`id` text PRIMARY KEY NOT NULL,
	`title` text NOT NULL,
	`question` text DEFAULT '' NOT NULL,
	`matrix` text DEFAULT '' NOT NULL,
	`side_a_name` text DEFAULT 'A' NOT NULL,
	`side_b_name` text DEFAULT 'B' NOT NULL,
	`method_id` text NOT NULL,
	`restricted` integer DEFAULT false NOT NULL,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	`last_activity_at` integer NOT NULL,
	`archived_at` integer,
	FOREIGN KEY (`method_id`) REFERENCES `methods`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `studies_method` ON `studies` (`method_id`);--> statement-breakpoint
CREATE TABLE `study_members` (
	`study_id` text NOT NULL,
	`person_id` text NOT NULL,
	PRIMARY KEY(`study_id`, `person_id`),
	FOREIGN KEY (`study_id`) REFERENCES `studies`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE cascade
);
--> statement-breakpoint
CREATE TABLE `layouts` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`fingerprint` text NOT NULL,
	`layout` text NOT NULL,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`created_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `layouts_fingerprint` ON `layouts` (`fingerprint`);--> statement-breakpoint
CREATE TABLE `originals` (
	`sha256` text PRIMARY KEY NOT NULL,
	`bytes` integer NOT NULL,
	`compressed_bytes` integer NOT NULL,
	`created_at` integer NOT NULL
);
--> statement-breakpoint
CREATE TABLE `tables` (
	`id` text PRIMARY KEY NOT NULL,
	`study_id` text NOT NULL,
	`upload_id` text NOT NULL,
	`sample_id` text,
	`original_sha256` text NOT NULL,
	`file_name` text NOT NULL,
	`column_name` text,
	`wide_group` text,
	`empty_share` real,
	`digest` text NOT NULL,
	`layout` text NOT NULL,
	`measure` text NOT NULL,
	`mass_kind` text NOT NULL,
	`features` integer NOT NULL,
	`refused_rows` integer DEFAULT 0 NOT NULL,
	`refused` blob,
	`mz` blob NOT NULL,
	`retention_minutes` blob NOT NULL,
	`intensity` blob NOT NULL,
	`width` blob,
	`wide_row` blob,
	`stated_floor` real,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	`replaced_at` integer,
	`replaced_by` text,
	FOREIGN KEY (`study_id`) REFERENCES `studies`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`upload_id`) REFERENCES `uploads`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`sample_id`) REFERENCES `samples`(`id`) ON UPDATE no action ON DELETE set null,
	FOREIGN KEY (`original_sha256`) REFERENCES `originals`(`sha256`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`created_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `tables_study` ON `tables` (`study_id`);--> statement-breakpoint
CREATE INDEX `tables_sample` ON `tables` (`sample_id`);--> statement-breakpoint
CREATE INDEX `tables_digest` ON `tables` (`digest`);--> statement-breakpoint
CREATE TABLE `uploads` (
	`id` text PRIMARY KEY NOT NULL,
	`study_id` text NOT NULL,
	`file_name` text NOT NULL,
	`sha256` text NOT NULL,
	`bytes` integer NOT NULL,
	`status` text NOT NULL,
	`fingerprint` text,
	`proposal` text,
	`layout` text,
	`remark` text,
	`replaces_table_id` text,
	`job_id` text,
	`created_by` text NOT NULL,
	`created_at` integer NOT NULL,
	`expires_at` integer,
	FOREIGN KEY (`study_id`) REFERENCES `studies`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`created_by`) REFERENCES `people`(`id`) ON UPDATE no action ON DELETE no action
);
--> statement-breakpoint
CREATE INDEX `uploads_study` ON `uploads` (`study_id`);