CREATE TABLE `order_flag` (
	`id` integer PRIMARY KEY NOT NULL,
	`public_id` text NOT NULL,
	`order_id` integer NOT NULL,
	`seller_id` integer NOT NULL,
	`raised_by` text NOT NULL,
	`note` text NOT NULL,
	`raised_at` integer NOT NULL,
	`resolved_at` integer,
	`resolved_by` text,
	`resolution` text,
	FOREIGN KEY (`order_id`) REFERENCES `customer_order`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`seller_id`) REFERENCES `seller`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`raised_by`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`resolved_by`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "order_flag_resolution" CHECK("order_flag"."resolution" is null or "order_flag"."resolution" in ('known', 'moved', 'refunded')),
	CONSTRAINT "order_flag_resolved" CHECK(("order_flag"."resolved_at" is null) = ("order_flag"."resolution" is null))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `order_flag_publicId_unique` ON `order_flag` (`public_id`);--> statement-breakpoint
CREATE UNIQUE INDEX `order_flag_one_open` ON `order_flag` (`order_id`,`seller_id`) WHERE "order_flag"."resolved_at" is null;--> statement-breakpoint
CREATE INDEX `order_flag_open` ON `order_flag` (`raised_at`) WHERE "order_flag"."resolved_at" is null;--> statement-breakpoint
CREATE TABLE `invitation` (
	`id` integer PRIMARY KEY NOT NULL,
	`public_id` text NOT NULL,
	`token_hash` text NOT NULL,
	`kind` text NOT NULL,
	`drive_id` integer NOT NULL,
	`seller_id` integer,
	`role` text,
	`email` text NOT NULL,
	`invited_by` text NOT NULL,
	`created_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	`accepted_at` integer,
	`accepted_by` text,
	`withdrawn_at` integer,
	FOREIGN KEY (`drive_id`) REFERENCES `drive`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`seller_id`) REFERENCES `seller`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`invited_by`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`accepted_by`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "invitation_kind" CHECK("invitation"."kind" in ('family', 'team')),
	CONSTRAINT "invitation_family_names_a_seller" CHECK(("invitation"."kind" = 'family') = ("invitation"."seller_id" is not null)),
	CONSTRAINT "invitation_team_names_a_role" CHECK(("invitation"."kind" = 'team') = ("invitation"."role" is not null and "invitation"."role" in ('lead', 'treasurer', 'helper')))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `invitation_publicId_unique` ON `invitation` (`public_id`);--> statement-breakpoint
CREATE UNIQUE INDEX `invitation_tokenHash_unique` ON `invitation` (`token_hash`);--> statement-breakpoint
CREATE INDEX `invitation_seller` ON `invitation` (`seller_id`);--> statement-breakpoint
CREATE INDEX `invitation_drive` ON `invitation` (`drive_id`);