INSERT INTO `table_columns` (`table_id`, `name`, `part`, `bytes`) SELECT `id`, 'mz', 0, `mz` FROM `tables`;--> statement-breakpoint
INSERT INTO `table_columns` (`table_id`, `name`, `part`, `bytes`) SELECT `id`, 'retentionMinutes', 0, `retention_minutes` FROM `tables`;--> statement-breakpoint
INSERT INTO `table_columns` (`table_id`, `name`, `part`, `bytes`) SELECT `id`, 'intensity', 0, `intensity` FROM `tables`;--> statement-breakpoint
INSERT INTO `table_columns` (`table_id`, `name`, `part`, `bytes`) SELECT `id`, 'width', 0, `width` FROM `tables` WHERE `width` IS NOT NULL;--> statement-breakpoint
INSERT INTO `table_columns` (`table_id`, `name`, `part`, `bytes`) SELECT `id`, 'wideRow', 0, `wide_row` FROM `tables` WHERE `wide_row` IS NOT NULL;
