CREATE TABLE `credential` (
	`id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`account_id` varchar(255) NOT NULL,
	`provider_id` varchar(255) NOT NULL,
	`person_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`access_token` text,
	`refresh_token` text,
	`id_token` text,
	`access_token_expires_at` datetime(3),
	`refresh_token_expires_at` datetime(3),
	`scope` text,
	`password` text,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `credential_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `person` (
	`id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(255) NOT NULL,
	`email` varchar(255) character set utf8mb4 collate utf8mb4_nopad_bin NOT NULL,
	`email_verified` boolean NOT NULL DEFAULT false,
	`image` text,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `person_id` PRIMARY KEY(`id`),
	CONSTRAINT `person_email` UNIQUE(`email`)
);
--> statement-breakpoint
CREATE TABLE `rate_limit` (
	`id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`key` varchar(255) character set utf8mb4 collate utf8mb4_nopad_bin NOT NULL,
	`count` int NOT NULL,
	`last_request` bigint NOT NULL,
	CONSTRAINT `rate_limit_id` PRIMARY KEY(`id`),
	CONSTRAINT `rate_limit_key` UNIQUE(`key`)
);
--> statement-breakpoint
CREATE TABLE `session` (
	`id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`token` varchar(255) character set utf8mb4 collate utf8mb4_nopad_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	`ip_address` text,
	`user_agent` text,
	`person_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `session_id` PRIMARY KEY(`id`),
	CONSTRAINT `session_token` UNIQUE(`token`)
);
--> statement-breakpoint
CREATE TABLE `verification` (
	`id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`identifier` varchar(255) character set utf8mb4 collate utf8mb4_nopad_bin NOT NULL,
	`value` text NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`updated_at` datetime(3) NOT NULL,
	CONSTRAINT `verification_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `accepted` (
	`vessel_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(255) character set utf8mb4 collate utf8mb4_nopad_bin NOT NULL,
	`seq` int NOT NULL,
	`body` json NOT NULL,
	CONSTRAINT `accepted_vessel_id_id_pk` PRIMARY KEY(`vessel_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `cable` (
	`vessel_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` int NOT NULL,
	`body` json NOT NULL,
	CONSTRAINT `cable_vessel_id_id_pk` PRIMARY KEY(`vessel_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `change_log` (
	`vessel_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`seq` int NOT NULL,
	`change_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`label` varchar(200) NOT NULL,
	`patches` json NOT NULL,
	`person_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `change_log_vessel_id_seq_pk` PRIMARY KEY(`vessel_id`,`seq`),
	CONSTRAINT `change_log_change` UNIQUE(`vessel_id`,`change_id`)
);
--> statement-breakpoint
CREATE TABLE `design` (
	`vessel_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`seq` int NOT NULL,
	`vessel` json,
	`basis` json NOT NULL,
	CONSTRAINT `design_vessel_id` PRIMARY KEY(`vessel_id`)
);
--> statement-breakpoint
CREATE TABLE `design_reference` (
	`vessel_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`family` varchar(16) NOT NULL,
	`entity_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`to_family` varchar(16) NOT NULL,
	`to_id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	CONSTRAINT `design_reference_key` PRIMARY KEY(`vessel_id`,`family`,`entity_id`,`to_family`,`to_id`)
);
--> statement-breakpoint
CREATE TABLE `device` (
	`vessel_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` int NOT NULL,
	`body` json NOT NULL,
	CONSTRAINT `device_vessel_id_id_pk` PRIMARY KEY(`vessel_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `mode` (
	`vessel_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` int NOT NULL,
	`body` json NOT NULL,
	CONSTRAINT `mode_vessel_id_id_pk` PRIMARY KEY(`vessel_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `note` (
	`vessel_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` int NOT NULL,
	`body` json NOT NULL,
	CONSTRAINT `note_vessel_id_id_pk` PRIMARY KEY(`vessel_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `revision` (
	`id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`vessel_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`number` int NOT NULL,
	`letter` varchar(2) NOT NULL,
	`note` varchar(500),
	`issued_by` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`issued_at` datetime(3) NOT NULL,
	`seq` int NOT NULL,
	`design` json NOT NULL,
	CONSTRAINT `revision_id` PRIMARY KEY(`id`),
	CONSTRAINT `revision_number` UNIQUE(`vessel_id`,`number`)
);
--> statement-breakpoint
CREATE TABLE `run` (
	`vessel_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` int NOT NULL,
	`body` json NOT NULL,
	CONSTRAINT `run_vessel_id_id_pk` PRIMARY KEY(`vessel_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `sheet` (
	`vessel_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` int NOT NULL,
	`body` json NOT NULL,
	CONSTRAINT `sheet_vessel_id_id_pk` PRIMARY KEY(`vessel_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `zone` (
	`vessel_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`id` varchar(64) character set ascii collate ascii_bin NOT NULL,
	`seq` int NOT NULL,
	`body` json NOT NULL,
	CONSTRAINT `zone_vessel_id_id_pk` PRIMARY KEY(`vessel_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `audit_log` (
	`id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`at` datetime(3) NOT NULL,
	`person_id` varchar(36) character set ascii collate ascii_bin,
	`vessel_id` varchar(36) character set ascii collate ascii_bin,
	`shop_id` varchar(36) character set ascii collate ascii_bin,
	`deed` varchar(64) NOT NULL,
	`detail` json,
	CONSTRAINT `audit_log_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `outbox` (
	`id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`recipient` varchar(255) character set utf8mb4 collate utf8mb4_nopad_bin NOT NULL,
	`subject` varchar(255) NOT NULL,
	`text` text NOT NULL,
	`made_at` datetime(3) NOT NULL,
	`attempts` int NOT NULL DEFAULT 0,
	`next_try_at` datetime(3),
	`sent_at` datetime(3),
	`last_error` varchar(255),
	CONSTRAINT `outbox_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `shop` (
	`id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(120) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `shop_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `shop_member` (
	`shop_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`person_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`admin` boolean NOT NULL DEFAULT false,
	`joined_at` datetime(3) NOT NULL,
	CONSTRAINT `shop_member_shop_id_person_id_pk` PRIMARY KEY(`shop_id`,`person_id`)
);
--> statement-breakpoint
CREATE TABLE `invitation` (
	`id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`vessel_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`email` varchar(255) character set utf8mb4 collate utf8mb4_nopad_bin NOT NULL,
	`role` enum('designer','installer','reviewer','owner') NOT NULL,
	`token_hash` varchar(64) NOT NULL,
	`invited_by` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`invited_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`accepted_at` datetime(3),
	`withdrawn_at` datetime(3),
	CONSTRAINT `invitation_id` PRIMARY KEY(`id`),
	CONSTRAINT `invitation_token` UNIQUE(`token_hash`)
);
--> statement-breakpoint
CREATE TABLE `vessel` (
	`id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`shop_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`name` varchar(100) NOT NULL,
	`created_by` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`archived_at` datetime(3),
	`deleted_at` datetime(3),
	CONSTRAINT `vessel_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `vessel_member` (
	`vessel_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`person_id` varchar(36) character set ascii collate ascii_bin NOT NULL,
	`role` enum('designer','installer','reviewer','owner') NOT NULL,
	`joined_at` datetime(3) NOT NULL,
	CONSTRAINT `vessel_member_vessel_id_person_id_pk` PRIMARY KEY(`vessel_id`,`person_id`)
);
--> statement-breakpoint
ALTER TABLE `credential` ADD CONSTRAINT `credential_person_id_person_id_fk` FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `session` ADD CONSTRAINT `session_person_id_person_id_fk` FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `accepted` ADD CONSTRAINT `accepted_vessel_id_design_vessel_id_fk` FOREIGN KEY (`vessel_id`) REFERENCES `design`(`vessel_id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `cable` ADD CONSTRAINT `cable_vessel_id_design_vessel_id_fk` FOREIGN KEY (`vessel_id`) REFERENCES `design`(`vessel_id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `change_log` ADD CONSTRAINT `change_log_vessel_id_design_vessel_id_fk` FOREIGN KEY (`vessel_id`) REFERENCES `design`(`vessel_id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `change_log` ADD CONSTRAINT `change_log_person_id_person_id_fk` FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `design` ADD CONSTRAINT `design_vessel_id_vessel_id_fk` FOREIGN KEY (`vessel_id`) REFERENCES `vessel`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `design_reference` ADD CONSTRAINT `design_reference_vessel_id_design_vessel_id_fk` FOREIGN KEY (`vessel_id`) REFERENCES `design`(`vessel_id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `device` ADD CONSTRAINT `device_vessel_id_design_vessel_id_fk` FOREIGN KEY (`vessel_id`) REFERENCES `design`(`vessel_id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `mode` ADD CONSTRAINT `mode_vessel_id_design_vessel_id_fk` FOREIGN KEY (`vessel_id`) REFERENCES `design`(`vessel_id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `note` ADD CONSTRAINT `note_vessel_id_design_vessel_id_fk` FOREIGN KEY (`vessel_id`) REFERENCES `design`(`vessel_id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `revision` ADD CONSTRAINT `revision_vessel_id_design_vessel_id_fk` FOREIGN KEY (`vessel_id`) REFERENCES `design`(`vessel_id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `revision` ADD CONSTRAINT `revision_issued_by_person_id_fk` FOREIGN KEY (`issued_by`) REFERENCES `person`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `run` ADD CONSTRAINT `run_vessel_id_design_vessel_id_fk` FOREIGN KEY (`vessel_id`) REFERENCES `design`(`vessel_id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sheet` ADD CONSTRAINT `sheet_vessel_id_design_vessel_id_fk` FOREIGN KEY (`vessel_id`) REFERENCES `design`(`vessel_id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `zone` ADD CONSTRAINT `zone_vessel_id_design_vessel_id_fk` FOREIGN KEY (`vessel_id`) REFERENCES `design`(`vessel_id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `shop_member` ADD CONSTRAINT `shop_member_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `shop_member` ADD CONSTRAINT `shop_member_person_id_person_id_fk` FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invitation` ADD CONSTRAINT `invitation_vessel_id_vessel_id_fk` FOREIGN KEY (`vessel_id`) REFERENCES `vessel`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invitation` ADD CONSTRAINT `invitation_invited_by_person_id_fk` FOREIGN KEY (`invited_by`) REFERENCES `person`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `vessel` ADD CONSTRAINT `vessel_shop_id_shop_id_fk` FOREIGN KEY (`shop_id`) REFERENCES `shop`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `vessel` ADD CONSTRAINT `vessel_created_by_person_id_fk` FOREIGN KEY (`created_by`) REFERENCES `person`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `vessel_member` ADD CONSTRAINT `vessel_member_vessel_id_vessel_id_fk` FOREIGN KEY (`vessel_id`) REFERENCES `vessel`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `vessel_member` ADD CONSTRAINT `vessel_member_person_id_person_id_fk` FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `credential_person` ON `credential` (`person_id`);--> statement-breakpoint
CREATE INDEX `session_person` ON `session` (`person_id`);--> statement-breakpoint
CREATE INDEX `verification_identifier` ON `verification` (`identifier`);--> statement-breakpoint
CREATE INDEX `design_reference_to` ON `design_reference` (`vessel_id`,`to_family`,`to_id`);--> statement-breakpoint
CREATE INDEX `audit_log_vessel` ON `audit_log` (`vessel_id`,`at`);--> statement-breakpoint
CREATE INDEX `audit_log_person` ON `audit_log` (`person_id`);--> statement-breakpoint
CREATE INDEX `outbox_due` ON `outbox` (`next_try_at`);--> statement-breakpoint
CREATE INDEX `shop_member_person` ON `shop_member` (`person_id`);--> statement-breakpoint
CREATE INDEX `invitation_vessel` ON `invitation` (`vessel_id`);--> statement-breakpoint
CREATE INDEX `invitation_by` ON `invitation` (`invited_by`,`invited_at`);--> statement-breakpoint
CREATE INDEX `vessel_shop` ON `vessel` (`shop_id`);--> statement-breakpoint
CREATE INDEX `vessel_deleted` ON `vessel` (`deleted_at`);--> statement-breakpoint
CREATE INDEX `vessel_member_person` ON `vessel_member` (`person_id`);