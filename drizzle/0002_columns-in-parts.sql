CREATE TABLE `table_columns` (
	`table_id` text NOT NULL,
	`name` text NOT NULL,
	`part` integer NOT NULL,
	`bytes` blob NOT NULL,
	PRIMARY KEY(`table_id`, `name`, `part`),
	FOREIGN KEY (`table_id`) REFERENCES `tables`(`id`) ON UPDATE no action ON DELETE cascade
);
