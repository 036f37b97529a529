CREATE TABLE `second_factor_use` (
	`user_id` text PRIMARY KEY NOT NULL,
	`last_step` integer NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE cascade
) STRICT;
