ALTER TABLE `tables` DROP COLUMN `mz`;--> statement-breakpoint
ALTER TABLE `tables` DROP COLUMN `retention_minutes`;--> statement-breakpoint
ALTER TABLE `tables` DROP COLUMN `intensity`;--> statement-breakpoint
ALTER TABLE `tables` DROP COLUMN `width`;--> statement-breakpoint
ALTER TABLE `tables` DROP COLUMN `wide_row`;