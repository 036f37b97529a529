CREATE TABLE `activity` (
	`id` integer PRIMARY KEY NOT NULL,
	`at` integer NOT NULL,
	`drive_id` integer,
	`actor` text NOT NULL,
	`action` text NOT NULL,
	`subject` text NOT NULL,
	`before` text,
	`after` text,
	`reason` text,
	`request_id` text,
	FOREIGN KEY (`drive_id`) REFERENCES `drive`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `activity_drive` ON `activity` (`drive_id`,`at`);--> statement-breakpoint
CREATE INDEX `activity_subject` ON `activity` (`subject`,`at`);--> statement-breakpoint
CREATE TABLE `job_lease` (
	`name` text PRIMARY KEY NOT NULL,
	`owner` text NOT NULL,
	`until` integer NOT NULL
) STRICT;
--> statement-breakpoint
CREATE TABLE `catalog` (
	`id` integer PRIMARY KEY NOT NULL,
	`public_id` text NOT NULL,
	`name` text NOT NULL,
	`created_at` integer NOT NULL
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `catalog_publicId_unique` ON `catalog` (`public_id`);--> statement-breakpoint
CREATE TABLE `catalog_category` (
	`version_id` integer NOT NULL,
	`slug` text NOT NULL,
	`position` integer NOT NULL,
	`name_en` text NOT NULL,
	`name_es` text,
	PRIMARY KEY(`version_id`, `slug`),
	FOREIGN KEY (`version_id`) REFERENCES `catalog_version`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE TABLE `catalog_item` (
	`id` integer PRIMARY KEY NOT NULL,
	`version_id` integer NOT NULL,
	`code` text NOT NULL,
	`slug` text NOT NULL,
	`category` text NOT NULL,
	`position` integer NOT NULL,
	`price_cents` integer NOT NULL,
	`net_weight_g` integer NOT NULL,
	`printed_weight` text NOT NULL,
	`tax_category` text NOT NULL,
	`dietary` text NOT NULL,
	`case_pack` integer NOT NULL,
	`volume_ml` integer NOT NULL,
	`tally_marks` integer DEFAULT 1 NOT NULL,
	`picture_hash` text,
	`available` integer DEFAULT true NOT NULL,
	FOREIGN KEY (`version_id`) REFERENCES `catalog_version`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`picture_hash`) REFERENCES `picture`(`hash`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "catalog_item_code_form" CHECK("catalog_item"."code" glob '[0-9][0-9][0-9][0-9]'),
	CONSTRAINT "catalog_item_price" CHECK("catalog_item"."price_cents" > 0 and "catalog_item"."price_cents" < 100000000),
	CONSTRAINT "catalog_item_sizes" CHECK("catalog_item"."net_weight_g" > 0 and "catalog_item"."case_pack" > 0 and "catalog_item"."volume_ml" > 0)
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `catalog_item_code` ON `catalog_item` (`version_id`,`code`);--> statement-breakpoint
CREATE TABLE `catalog_item_text` (
	`item_id` integer NOT NULL,
	`locale` text NOT NULL,
	`name` text NOT NULL,
	`pieces` text NOT NULL,
	`serves` text NOT NULL,
	`description` text NOT NULL,
	`preparation` text NOT NULL,
	PRIMARY KEY(`item_id`, `locale`),
	FOREIGN KEY (`item_id`) REFERENCES `catalog_item`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "catalog_item_text_locale" CHECK("catalog_item_text"."locale" in ('en', 'es'))
) STRICT;
--> statement-breakpoint
CREATE TABLE `catalog_version` (
	`id` integer PRIMARY KEY NOT NULL,
	`catalog_id` integer NOT NULL,
	`version` integer NOT NULL,
	`published_at` integer NOT NULL,
	FOREIGN KEY (`catalog_id`) REFERENCES `catalog`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `catalog_version_number` ON `catalog_version` (`catalog_id`,`version`);--> statement-breakpoint
CREATE TABLE `picture` (
	`hash` text PRIMARY KEY NOT NULL,
	`width` integer NOT NULL,
	`height` integer NOT NULL,
	`created_at` integer NOT NULL
) STRICT;
--> statement-breakpoint
CREATE TABLE `safety_revision` (
	`id` integer PRIMARY KEY NOT NULL,
	`catalog_id` integer NOT NULL,
	`code` text NOT NULL,
	`effective_at` integer NOT NULL,
	`contains` text NOT NULL,
	`contains_none` integer NOT NULL,
	`may_contain` text NOT NULL,
	`storage` text NOT NULL,
	`best_quality_min` integer,
	`best_quality_max` integer,
	FOREIGN KEY (`catalog_id`) REFERENCES `catalog`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "safety_revision_complete" CHECK(json_valid("safety_revision"."contains") and json_valid("safety_revision"."may_contain") and ("safety_revision"."contains" <> '[]' or "safety_revision"."contains_none" = 1)),
	CONSTRAINT "safety_revision_storage" CHECK("safety_revision"."storage" in ('frozen_ready', 'frozen_raw_dough', 'frozen_to_cook', 'refrigerated_after_thaw', 'shelf_stable'))
) STRICT;
--> statement-breakpoint
CREATE INDEX `safety_revision_current` ON `safety_revision` (`catalog_id`,`code`,`effective_at`);--> statement-breakpoint
CREATE TABLE `drive` (
	`id` integer PRIMARY KEY NOT NULL,
	`public_id` text NOT NULL,
	`organization_id` integer NOT NULL,
	`catalog_version_id` integer NOT NULL,
	`name` text NOT NULL,
	`purpose` text NOT NULL,
	`time_zone` text NOT NULL,
	`currency` text DEFAULT 'usd' NOT NULL,
	`opens_on` text NOT NULL,
	`opens_time` text NOT NULL,
	`closes_on` text NOT NULL,
	`closes_time` text NOT NULL,
	`opens_at` integer NOT NULL,
	`closes_at` integer NOT NULL,
	`closed_early_at` integer,
	`turn_in_on` text NOT NULL,
	`launched_at` integer,
	`payments_stopped_at` integer,
	`payments_stopped_why` text,
	`contact_name` text NOT NULL,
	`contact_email` text NOT NULL,
	`payee_wording` text NOT NULL,
	`goal_cents` integer,
	`rep_user_id` text,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`organization_id`) REFERENCES `organization`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`catalog_version_id`) REFERENCES `catalog_version`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`rep_user_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "drive_opens_before_it_closes" CHECK("drive"."opens_at" < "drive"."closes_at"),
	CONSTRAINT "drive_currency" CHECK("drive"."currency" = 'usd')
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `drive_publicId_unique` ON `drive` (`public_id`);--> statement-breakpoint
CREATE INDEX `drive_organization` ON `drive` (`organization_id`);--> statement-breakpoint
CREATE INDEX `drive_rep` ON `drive` (`rep_user_id`);--> statement-breakpoint
CREATE INDEX `drive_closes` ON `drive` (`closes_at`);--> statement-breakpoint
CREATE TABLE `drive_terms` (
	`id` integer PRIMARY KEY NOT NULL,
	`drive_id` integer NOT NULL,
	`version` integer NOT NULL,
	`share_bp` integer NOT NULL,
	`fee_rate_bp` integer NOT NULL,
	`fee_fixed_cents` integer NOT NULL,
	`organization_bears_card_fees` integer NOT NULL,
	`tax` text NOT NULL,
	`seller_of_record` text NOT NULL,
	`prize_every` integer NOT NULL,
	`prizes_borne_by` text NOT NULL,
	`delivery_minimum_cents` integer NOT NULL,
	`freight_cents` integer NOT NULL,
	`invoice_due_days` integer NOT NULL,
	`claim_days` integer NOT NULL,
	`delivery_from` text NOT NULL,
	`delivery_to` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`drive_id`) REFERENCES `drive`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "drive_terms_share" CHECK("drive_terms"."share_bp" between 0 and 10000),
	CONSTRAINT "drive_terms_window" CHECK("drive_terms"."delivery_from" <= "drive_terms"."delivery_to"),
	CONSTRAINT "drive_terms_seller_of_record" CHECK("drive_terms"."seller_of_record" in ('organization', 'operator')),
	CONSTRAINT "drive_terms_prizes" CHECK("drive_terms"."prize_every" > 0 and "drive_terms"."prizes_borne_by" in ('organization', 'operator'))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `drive_terms_version` ON `drive_terms` (`drive_id`,`version`);--> statement-breakpoint
CREATE TABLE `organization` (
	`id` integer PRIMARY KEY NOT NULL,
	`public_id` text NOT NULL,
	`name` text NOT NULL,
	`created_at` integer NOT NULL
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `organization_publicId_unique` ON `organization` (`public_id`);--> statement-breakpoint
CREATE TABLE `account` (
	`id` text PRIMARY KEY NOT NULL,
	`user_id` text NOT NULL,
	`account_id` text NOT NULL,
	`provider_id` text NOT NULL,
	`access_token` text,
	`refresh_token` text,
	`id_token` text,
	`access_token_expires_at` integer,
	`refresh_token_expires_at` integer,
	`scope` text,
	`password` text,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE cascade
) STRICT;
--> statement-breakpoint
CREATE INDEX `account_user` ON `account` (`user_id`);--> statement-breakpoint
CREATE TABLE `rate_limit` (
	`id` text PRIMARY KEY NOT NULL,
	`key` text NOT NULL,
	`count` integer NOT NULL,
	`last_request` integer NOT NULL
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `rate_limit_key_unique` ON `rate_limit` (`key`);--> statement-breakpoint
CREATE TABLE `session` (
	`id` text PRIMARY KEY NOT NULL,
	`user_id` text NOT NULL,
	`token` text NOT NULL,
	`expires_at` integer NOT NULL,
	`ip_address` text,
	`user_agent` text,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE cascade
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `session_token_unique` ON `session` (`token`);--> statement-breakpoint
CREATE INDEX `session_user` ON `session` (`user_id`);--> statement-breakpoint
CREATE TABLE `two_factor` (
	`id` text PRIMARY KEY NOT NULL,
	`user_id` text NOT NULL,
	`secret` text NOT NULL,
	`backup_codes` text NOT NULL,
	`verified` integer DEFAULT true,
	`failed_verification_count` integer DEFAULT 0,
	`locked_until` integer,
	FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE cascade
) STRICT;
--> statement-breakpoint
CREATE INDEX `two_factor_user` ON `two_factor` (`user_id`);--> statement-breakpoint
CREATE TABLE `user` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`email` text NOT NULL,
	`email_verified` integer DEFAULT false NOT NULL,
	`image` text,
	`two_factor_enabled` integer DEFAULT false,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `user_email_unique` ON `user` (`email`);--> statement-breakpoint
CREATE TABLE `verification` (
	`id` text PRIMARY KEY NOT NULL,
	`identifier` text NOT NULL,
	`value` text NOT NULL,
	`expires_at` integer NOT NULL,
	`created_at` integer NOT NULL,
	`updated_at` integer NOT NULL
) STRICT;
--> statement-breakpoint
CREATE INDEX `verification_identifier` ON `verification` (`identifier`);--> statement-breakpoint
CREATE TABLE `ledger_account` (
	`code` text PRIMARY KEY NOT NULL,
	`kind` text NOT NULL
) STRICT;
--> statement-breakpoint
CREATE TABLE `ledger_entry` (
	`id` integer PRIMARY KEY NOT NULL,
	`journal_id` integer NOT NULL,
	`drive_id` integer NOT NULL,
	`debit` text NOT NULL,
	`credit` text NOT NULL,
	`amount_cents` integer NOT NULL,
	FOREIGN KEY (`journal_id`) REFERENCES `ledger_journal`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`drive_id`) REFERENCES `drive`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`debit`) REFERENCES `ledger_account`(`code`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`credit`) REFERENCES `ledger_account`(`code`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "ledger_entry_positive" CHECK("ledger_entry"."amount_cents" > 0 and "ledger_entry"."amount_cents" < 1000000000000),
	CONSTRAINT "ledger_entry_two_sides" CHECK("ledger_entry"."debit" <> "ledger_entry"."credit")
) STRICT;
--> statement-breakpoint
CREATE INDEX `ledger_entry_journal` ON `ledger_entry` (`journal_id`);--> statement-breakpoint
CREATE INDEX `ledger_entry_debit` ON `ledger_entry` (`drive_id`,`debit`,`amount_cents`);--> statement-breakpoint
CREATE INDEX `ledger_entry_credit` ON `ledger_entry` (`drive_id`,`credit`,`amount_cents`);--> statement-breakpoint
CREATE TABLE `ledger_journal` (
	`id` integer PRIMARY KEY NOT NULL,
	`drive_id` integer NOT NULL,
	`kind` text NOT NULL,
	`subject` text NOT NULL,
	`at` integer NOT NULL,
	FOREIGN KEY (`drive_id`) REFERENCES `drive`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `ledger_journal_once` ON `ledger_journal` (`kind`,`subject`);--> statement-breakpoint
CREATE INDEX `ledger_journal_drive` ON `ledger_journal` (`drive_id`,`at`);--> statement-breakpoint
CREATE TABLE `outbox` (
	`id` integer PRIMARY KEY NOT NULL,
	`kind` text NOT NULL,
	`subject` text NOT NULL,
	`recipient` text NOT NULL,
	`recipient_name` text NOT NULL,
	`recipient_email` text NOT NULL,
	`locale` text NOT NULL,
	`facts` text NOT NULL,
	`message_id` text NOT NULL,
	`state` text NOT NULL,
	`attempts` integer DEFAULT 0 NOT NULL,
	`next_attempt_at` integer NOT NULL,
	`lease_until` integer,
	`created_at` integer NOT NULL,
	`sent_at` integer,
	`response` text,
	`last_error` text,
	CONSTRAINT "outbox_state" CHECK("outbox"."state" in ('waiting', 'sending', 'sent', 'failed')),
	CONSTRAINT "outbox_sent" CHECK(("outbox"."state" = 'sent') = ("outbox"."sent_at" is not null and "outbox"."response" is not null))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `outbox_messageId_unique` ON `outbox` (`message_id`);--> statement-breakpoint
CREATE UNIQUE INDEX `outbox_once` ON `outbox` (`kind`,`subject`,`recipient`);--> statement-breakpoint
CREATE INDEX `outbox_due` ON `outbox` (`next_attempt_at`) WHERE "outbox"."state" in ('waiting', 'sending');--> statement-breakpoint
CREATE INDEX `outbox_failed` ON `outbox` (`created_at`) WHERE "outbox"."state" = 'failed';--> statement-breakpoint
CREATE TABLE `drive_day` (
	`drive_id` integer NOT NULL,
	`day` text NOT NULL,
	`orders` integer NOT NULL,
	`items` integer NOT NULL,
	`items_cents` integer NOT NULL,
	`gift_cents` integer NOT NULL,
	`refunded_cents` integer NOT NULL,
	PRIMARY KEY(`drive_id`, `day`),
	FOREIGN KEY (`drive_id`) REFERENCES `drive`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE TABLE `customer_order` (
	`id` integer PRIMARY KEY NOT NULL,
	`public_id` text NOT NULL,
	`number` text NOT NULL,
	`drive_id` integer NOT NULL,
	`terms_id` integer NOT NULL,
	`link_id` integer NOT NULL,
	`status` text NOT NULL,
	`idempotency_key` text NOT NULL,
	`request_hash` text NOT NULL,
	`locale` text NOT NULL,
	`currency` text NOT NULL,
	`item_count` integer NOT NULL,
	`items_cents` integer NOT NULL,
	`gift_cents` integer NOT NULL,
	`tax_cents` integer NOT NULL,
	`cover_cents` integer NOT NULL,
	`total_cents` integer NOT NULL,
	`fee_cents` integer NOT NULL,
	`refunded_cents` integer DEFAULT 0 NOT NULL,
	`placed_at` integer NOT NULL,
	`paid_at` integer,
	`ended_at` integer,
	`replaced_by_id` integer,
	FOREIGN KEY (`drive_id`) REFERENCES `drive`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`terms_id`) REFERENCES `drive_terms`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`link_id`) REFERENCES `store_link`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "customer_order_status" CHECK("customer_order"."status" in ('awaiting_payment', 'paid', 'partly_refunded', 'refunded', 'canceled', 'expired')),
	CONSTRAINT "customer_order_total" CHECK("customer_order"."total_cents" = "customer_order"."items_cents" + "customer_order"."gift_cents" + "customer_order"."tax_cents" + "customer_order"."cover_cents"),
	CONSTRAINT "customer_order_amounts" CHECK("customer_order"."items_cents" >= 0 and "customer_order"."gift_cents" >= 0 and "customer_order"."tax_cents" >= 0 and "customer_order"."cover_cents" >= 0 and "customer_order"."fee_cents" >= 0 and "customer_order"."total_cents" > 0),
	CONSTRAINT "customer_order_refunds" CHECK("customer_order"."refunded_cents" between 0 and "customer_order"."total_cents"),
	CONSTRAINT "customer_order_paid" CHECK(("customer_order"."status" in ('paid', 'partly_refunded', 'refunded')) = ("customer_order"."paid_at" is not null)),
	CONSTRAINT "customer_order_locale" CHECK("customer_order"."locale" in ('en', 'es'))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `customer_order_publicId_unique` ON `customer_order` (`public_id`);--> statement-breakpoint
CREATE UNIQUE INDEX `customer_order_number_unique` ON `customer_order` (`number`);--> statement-breakpoint
CREATE UNIQUE INDEX `customer_order_key` ON `customer_order` (`link_id`,`idempotency_key`);--> statement-breakpoint
CREATE INDEX `customer_order_drive_placed` ON `customer_order` (`drive_id`,`placed_at`);--> statement-breakpoint
CREATE INDEX `customer_order_drive_status` ON `customer_order` (`drive_id`,`status`,`placed_at`);--> statement-breakpoint
CREATE INDEX `customer_order_waiting` ON `customer_order` (`placed_at`) WHERE "customer_order"."status" = 'awaiting_payment';--> statement-breakpoint
CREATE TABLE `order_customer` (
	`order_id` integer PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`email` text NOT NULL,
	`relationship` text NOT NULL,
	FOREIGN KEY (`order_id`) REFERENCES `customer_order`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE TABLE `order_line` (
	`id` integer PRIMARY KEY NOT NULL,
	`order_id` integer NOT NULL,
	`position` integer NOT NULL,
	`recipient_id` integer NOT NULL,
	`seller_id` integer NOT NULL,
	`item_id` integer NOT NULL,
	`code` text NOT NULL,
	`name` text NOT NULL,
	`unit_price_cents` integer NOT NULL,
	`quantity` integer NOT NULL,
	`amount_cents` integer NOT NULL,
	`tax_cents` integer NOT NULL,
	`tally_marks` integer NOT NULL,
	`contains` text NOT NULL,
	`contains_none` integer NOT NULL,
	`may_contain` text NOT NULL,
	`storage` text NOT NULL,
	`best_quality_min` integer,
	`best_quality_max` integer,
	`refunded_quantity` integer DEFAULT 0 NOT NULL,
	`refunded_cents` integer DEFAULT 0 NOT NULL,
	FOREIGN KEY (`order_id`) REFERENCES `customer_order`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`recipient_id`) REFERENCES `order_recipient`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`seller_id`) REFERENCES `seller`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`item_id`) REFERENCES `catalog_item`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "order_line_quantity" CHECK("order_line"."quantity" between 1 and 99),
	CONSTRAINT "order_line_amount" CHECK("order_line"."amount_cents" = "order_line"."quantity" * "order_line"."unit_price_cents"),
	CONSTRAINT "order_line_refunded_quantity" CHECK("order_line"."refunded_quantity" between 0 and "order_line"."quantity"),
	CONSTRAINT "order_line_refunded" CHECK("order_line"."refunded_cents" between 0 and "order_line"."amount_cents" + "order_line"."tax_cents")
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `order_line_position` ON `order_line` (`order_id`,`position`);--> statement-breakpoint
CREATE INDEX `order_line_seller` ON `order_line` (`seller_id`,`order_id`);--> statement-breakpoint
CREATE TABLE `order_recipient` (
	`id` integer PRIMARY KEY NOT NULL,
	`order_id` integer NOT NULL,
	`label` text,
	`handover` text NOT NULL,
	FOREIGN KEY (`order_id`) REFERENCES `customer_order`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "order_recipient_handover" CHECK("order_recipient"."handover" in ('seller_family', 'family_keeps', 'give_away'))
) STRICT;
--> statement-breakpoint
CREATE INDEX `order_recipient_order` ON `order_recipient` (`order_id`);--> statement-breakpoint
CREATE TABLE `seller_tally` (
	`drive_id` integer NOT NULL,
	`seller_id` integer NOT NULL,
	`code` text NOT NULL,
	`channel` text NOT NULL,
	`state` text NOT NULL,
	`quantity` integer NOT NULL,
	`marks` integer NOT NULL,
	`amount_cents` integer NOT NULL,
	PRIMARY KEY(`drive_id`, `seller_id`, `code`, `channel`, `state`),
	FOREIGN KEY (`drive_id`) REFERENCES `drive`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`seller_id`) REFERENCES `seller`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "seller_tally_channel" CHECK("seller_tally"."channel" in ('online', 'paper')),
	CONSTRAINT "seller_tally_state" CHECK("seller_tally"."state" in ('credited', 'provisional')),
	CONSTRAINT "seller_tally_never_negative" CHECK("seller_tally"."quantity" >= 0 and "seller_tally"."amount_cents" >= 0 and "seller_tally"."marks" >= 0)
) STRICT;
--> statement-breakpoint
CREATE INDEX `seller_tally_seller` ON `seller_tally` (`seller_id`,`state`);--> statement-breakpoint
CREATE TABLE `payment_event` (
	`event_id` text PRIMARY KEY NOT NULL,
	`type` text NOT NULL,
	`facts` text NOT NULL,
	`received_at` integer NOT NULL,
	`processed_at` integer,
	`outcome` text,
	`attempts` integer DEFAULT 0 NOT NULL
) STRICT;
--> statement-breakpoint
CREATE INDEX `payment_event_open` ON `payment_event` (`received_at`) WHERE "payment_event"."processed_at" is null;--> statement-breakpoint
CREATE TABLE `payment_put_aside` (
	`id` integer PRIMARY KEY NOT NULL,
	`public_id` text NOT NULL,
	`session_id` text NOT NULL,
	`order_id` integer,
	`reason` text NOT NULL,
	`amount_cents` integer NOT NULL,
	`currency` text NOT NULL,
	`created_at` integer NOT NULL,
	`resolved_at` integer,
	`resolution` text,
	FOREIGN KEY (`order_id`) REFERENCES `customer_order`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `payment_put_aside_publicId_unique` ON `payment_put_aside` (`public_id`);--> statement-breakpoint
CREATE UNIQUE INDEX `payment_put_aside_once` ON `payment_put_aside` (`session_id`,`reason`);--> statement-breakpoint
CREATE INDEX `payment_put_aside_open` ON `payment_put_aside` (`created_at`) WHERE "payment_put_aside"."resolved_at" is null;--> statement-breakpoint
CREATE TABLE `payment_session` (
	`id` integer PRIMARY KEY NOT NULL,
	`order_id` integer NOT NULL,
	`session_id` text NOT NULL,
	`url` text NOT NULL,
	`expires_at` integer NOT NULL,
	`payment_intent_id` text,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`order_id`) REFERENCES `customer_order`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `payment_session_orderId_unique` ON `payment_session` (`order_id`);--> statement-breakpoint
CREATE UNIQUE INDEX `payment_session_sessionId_unique` ON `payment_session` (`session_id`);--> statement-breakpoint
CREATE INDEX `payment_session_intent` ON `payment_session` (`payment_intent_id`);--> statement-breakpoint
CREATE TABLE `refund` (
	`id` integer PRIMARY KEY NOT NULL,
	`public_id` text NOT NULL,
	`order_id` integer NOT NULL,
	`state` text NOT NULL,
	`amount_cents` integer NOT NULL,
	`gift_cents` integer NOT NULL,
	`cover_cents` integer NOT NULL,
	`reason` text NOT NULL,
	`requested_by` text,
	`requested_at` integer NOT NULL,
	`provider_refund_id` text,
	`finished_at` integer,
	FOREIGN KEY (`order_id`) REFERENCES `customer_order`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`requested_by`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "refund_state" CHECK("refund"."state" in ('requested', 'succeeded', 'failed')),
	CONSTRAINT "refund_amount" CHECK("refund"."amount_cents" > 0 and "refund"."gift_cents" >= 0 and "refund"."cover_cents" >= 0)
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `refund_publicId_unique` ON `refund` (`public_id`);--> statement-breakpoint
CREATE UNIQUE INDEX `refund_providerRefundId_unique` ON `refund` (`provider_refund_id`);--> statement-breakpoint
CREATE INDEX `refund_order` ON `refund` (`order_id`);--> statement-breakpoint
CREATE INDEX `refund_open` ON `refund` (`requested_at`) WHERE "refund"."state" = 'requested';--> statement-breakpoint
CREATE TABLE `refund_line` (
	`refund_id` integer NOT NULL,
	`order_line_id` integer NOT NULL,
	`quantity` integer NOT NULL,
	`amount_cents` integer NOT NULL,
	`tax_cents` integer NOT NULL,
	PRIMARY KEY(`refund_id`, `order_line_id`),
	FOREIGN KEY (`refund_id`) REFERENCES `refund`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`order_line_id`) REFERENCES `order_line`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "refund_line_quantity" CHECK("refund_line"."quantity" > 0 and "refund_line"."amount_cents" >= 0 and "refund_line"."tax_cents" >= 0)
) STRICT;
--> statement-breakpoint
CREATE TABLE `drive_member` (
	`drive_id` integer NOT NULL,
	`user_id` text NOT NULL,
	`role` text NOT NULL,
	`since` integer NOT NULL,
	PRIMARY KEY(`drive_id`, `user_id`),
	FOREIGN KEY (`drive_id`) REFERENCES `drive`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "drive_member_role" CHECK("drive_member"."role" in ('lead', 'treasurer', 'helper'))
) STRICT;
--> statement-breakpoint
CREATE INDEX `drive_member_user` ON `drive_member` (`user_id`);--> statement-breakpoint
CREATE TABLE `guardian` (
	`seller_id` integer NOT NULL,
	`user_id` text NOT NULL,
	`since` integer NOT NULL,
	PRIMARY KEY(`seller_id`, `user_id`),
	FOREIGN KEY (`seller_id`) REFERENCES `seller`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `guardian_user` ON `guardian` (`user_id`);--> statement-breakpoint
CREATE TABLE `staff_member` (
	`user_id` text NOT NULL,
	`role` text NOT NULL,
	`since` integer NOT NULL,
	PRIMARY KEY(`user_id`, `role`),
	FOREIGN KEY (`user_id`) REFERENCES `user`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "staff_member_role" CHECK("staff_member"."role" in ('admin', 'rep', 'clerk', 'warehouse'))
) STRICT;
--> statement-breakpoint
CREATE TABLE `seller` (
	`id` integer PRIMARY KEY NOT NULL,
	`public_id` text NOT NULL,
	`drive_id` integer NOT NULL,
	`kind` text NOT NULL,
	`group_id` integer,
	`number` integer,
	`withdrawn_at` integer,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`drive_id`) REFERENCES `drive`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`group_id`) REFERENCES `seller_group`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "seller_kind" CHECK("seller"."kind" in ('student', 'group', 'organization')),
	CONSTRAINT "seller_number_of_students" CHECK(("seller"."kind" = 'student') = ("seller"."number" is not null)),
	CONSTRAINT "seller_number_range" CHECK("seller"."number" is null or "seller"."number" between 100 and 999),
	CONSTRAINT "seller_group_where_due" CHECK("seller"."kind" = 'organization' or "seller"."group_id" is not null)
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `seller_publicId_unique` ON `seller` (`public_id`);--> statement-breakpoint
CREATE UNIQUE INDEX `seller_number` ON `seller` (`drive_id`,`number`);--> statement-breakpoint
CREATE INDEX `seller_group_members` ON `seller` (`group_id`);--> statement-breakpoint
CREATE TABLE `seller_group` (
	`id` integer PRIMARY KEY NOT NULL,
	`public_id` text NOT NULL,
	`drive_id` integer NOT NULL,
	`name` text NOT NULL,
	`position` integer NOT NULL,
	FOREIGN KEY (`drive_id`) REFERENCES `drive`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `seller_group_publicId_unique` ON `seller_group` (`public_id`);--> statement-breakpoint
CREATE UNIQUE INDEX `seller_group_name` ON `seller_group` (`drive_id`,`name`);--> statement-breakpoint
CREATE TABLE `seller_person` (
	`seller_id` integer PRIMARY KEY NOT NULL,
	`first_name` text NOT NULL,
	`last_name` text NOT NULL,
	`name_shown_since` integer,
	FOREIGN KEY (`seller_id`) REFERENCES `seller`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE TABLE `store_link` (
	`id` integer PRIMARY KEY NOT NULL,
	`token` text NOT NULL,
	`drive_id` integer NOT NULL,
	`seller_id` integer NOT NULL,
	`state` text NOT NULL,
	`created_at` integer NOT NULL,
	`ended_at` integer,
	FOREIGN KEY (`drive_id`) REFERENCES `drive`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`seller_id`) REFERENCES `seller`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "store_link_state" CHECK("store_link"."state" in ('live', 'paused', 'replaced')),
	CONSTRAINT "store_link_token" CHECK(length("store_link"."token") = 22),
	CONSTRAINT "store_link_ended" CHECK(("store_link"."state" = 'replaced') = ("store_link"."ended_at" is not null))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `store_link_token_unique` ON `store_link` (`token`);--> statement-breakpoint
CREATE INDEX `store_link_seller` ON `store_link` (`seller_id`);--> statement-breakpoint
CREATE UNIQUE INDEX `store_link_one_alive` ON `store_link` (`seller_id`) WHERE "store_link"."state" <> 'replaced';--> statement-breakpoint
CREATE TRIGGER ledger_entry_no_update BEFORE UPDATE ON ledger_entry BEGIN SELECT raise(ABORT, 'ledger entries are never changed'); END;--> statement-breakpoint
CREATE TRIGGER ledger_entry_no_delete BEFORE DELETE ON ledger_entry BEGIN SELECT raise(ABORT, 'ledger entries are never deleted'); END;--> statement-breakpoint
CREATE TRIGGER ledger_journal_no_update BEFORE UPDATE ON ledger_journal BEGIN SELECT raise(ABORT, 'ledger journals are never changed'); END;--> statement-breakpoint
CREATE TRIGGER ledger_journal_no_delete BEFORE DELETE ON ledger_journal BEGIN SELECT raise(ABORT, 'ledger journals are never deleted'); END;--> statement-breakpoint
CREATE TRIGGER drive_terms_no_update BEFORE UPDATE ON drive_terms BEGIN SELECT raise(ABORT, 'terms are never changed, only followed by a next version'); END;--> statement-breakpoint
CREATE TRIGGER activity_no_update BEFORE UPDATE ON activity BEGIN SELECT raise(ABORT, 'the activity log is never changed'); END;--> statement-breakpoint
INSERT INTO ledger_account (code, kind) VALUES
	('cash_operator', 'asset'), ('cash_organization', 'asset'), ('receivables', 'asset'),
	('sales', 'income'), ('gifts', 'income'), ('tax', 'liability'), ('cover', 'income'),
	('refunds', 'contra_income'), ('card_fees', 'expense');
