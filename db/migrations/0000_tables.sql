CREATE TABLE `account` (
	`id` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`email` text NOT NULL,
	`name` text NOT NULL,
	`password_hash` text NOT NULL,
	`roles` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `account_email` ON `account` (`club_id`,`email`);--> statement-breakpoint
CREATE TABLE `sign_in` (
	`id_hash` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`account_id` text NOT NULL,
	`created_at` integer NOT NULL,
	`last_seen_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	`idle_expires_at` integer NOT NULL,
	`user_agent` text NOT NULL,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`account_id`) REFERENCES `account`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `sign_in_account` ON `sign_in` (`account_id`);--> statement-breakpoint
CREATE TABLE `club` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL
) STRICT;
--> statement-breakpoint
CREATE TABLE `crew_member` (
	`id` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`event_id` text NOT NULL,
	`person_id` text NOT NULL,
	`role` text NOT NULL,
	`state` text NOT NULL,
	`claim_hash` text,
	`asked_at` integer NOT NULL,
	`decided_at` integer,
	`decided_by_account_id` text,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`event_id`) REFERENCES `event`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `crew_member_role` ON `crew_member` (`event_id`,`person_id`,`role`);--> statement-breakpoint
CREATE INDEX `crew_member_claim` ON `crew_member` (`claim_hash`);--> statement-breakpoint
CREATE TABLE `device` (
	`id` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`event_id` text NOT NULL,
	`kid` integer NOT NULL,
	`name` text NOT NULL,
	`public_key` text NOT NULL,
	`certificate` text NOT NULL,
	`state` text NOT NULL,
	`last_good_seq` integer,
	`enrolled_at` integer NOT NULL,
	`last_contact_at` integer,
	`unsent` integer,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`event_id`) REFERENCES `event`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `device_kid` ON `device` (`event_id`,`kid`);--> statement-breakpoint
CREATE UNIQUE INDEX `device_key` ON `device` (`event_id`,`public_key`);--> statement-breakpoint
CREATE TABLE `device_person` (
	`club_id` text NOT NULL,
	`device_id` text NOT NULL,
	`person_id` text NOT NULL,
	`roles` text NOT NULL,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`device_id`) REFERENCES `device`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `device_person_one` ON `device_person` (`device_id`,`person_id`);--> statement-breakpoint
CREATE TABLE `join_code` (
	`id` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`event_id` text NOT NULL,
	`token_hash` text NOT NULL,
	`role` text NOT NULL,
	`expires_at` integer NOT NULL,
	`created_by_account_id` text NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`event_id`) REFERENCES `event`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `join_code_token` ON `join_code` (`token_hash`);--> statement-breakpoint
CREATE TABLE `server_key` (
	`club_id` text PRIMARY KEY NOT NULL,
	`public_key` text NOT NULL,
	`private_key` text NOT NULL,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE TABLE `car` (
	`id` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`model` text NOT NULL,
	`colour` text NOT NULL,
	`plate` text NOT NULL,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `car_plate` ON `car` (`club_id`,`plate`);--> statement-breakpoint
CREATE TABLE `declaration` (
	`id` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`entry_id` text NOT NULL,
	`version` integer NOT NULL,
	`body` text NOT NULL,
	`signed_at` integer,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`entry_id`) REFERENCES `entry`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `declaration_version` ON `declaration` (`entry_id`,`version`);--> statement-breakpoint
CREATE TABLE `entry` (
	`id` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`event_id` text NOT NULL,
	`car_id` text NOT NULL,
	`code` integer NOT NULL,
	`number` text NOT NULL,
	`plate` text NOT NULL,
	`group_id` text NOT NULL,
	`facts` text NOT NULL,
	`note` text NOT NULL,
	`passenger_seats` integer NOT NULL,
	`withdrawn` integer NOT NULL,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`event_id`) REFERENCES `event`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`car_id`) REFERENCES `car`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`group_id`) REFERENCES `run_group`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `entry_code` ON `entry` (`event_id`,`code`);--> statement-breakpoint
CREATE UNIQUE INDEX `entry_number` ON `entry` (`event_id`,`number`);--> statement-breakpoint
CREATE INDEX `entry_event` ON `entry` (`event_id`);--> statement-breakpoint
CREATE TABLE `entry_import` (
	`id` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`event_id` text NOT NULL,
	`text_hash` text NOT NULL,
	`file_name` text NOT NULL,
	`added` integer NOT NULL,
	`changed` integer NOT NULL,
	`unchanged` integer NOT NULL,
	`by_account_id` text NOT NULL,
	`at` integer NOT NULL,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`event_id`) REFERENCES `event`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `entry_import_event` ON `entry_import` (`event_id`);--> statement-breakpoint
CREATE TABLE `entry_person` (
	`club_id` text NOT NULL,
	`entry_id` text NOT NULL,
	`person_id` text NOT NULL,
	`role` text NOT NULL,
	PRIMARY KEY(`entry_id`, `person_id`, `role`),
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`entry_id`) REFERENCES `entry`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE TABLE `person` (
	`id` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`event_id` text NOT NULL,
	`account_id` text,
	`name` text NOT NULL,
	`email` text,
	`mobile` text,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`event_id`) REFERENCES `event`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `person_event` ON `person` (`event_id`);--> statement-breakpoint
CREATE TABLE `checklist_text` (
	`hash` text PRIMARY KEY NOT NULL,
	`body` text NOT NULL
) STRICT;
--> statement-breakpoint
CREATE TABLE `event` (
	`id` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`code` integer NOT NULL,
	`name` text NOT NULL,
	`venue` text NOT NULL,
	`time_zone` text NOT NULL,
	`first_day` text NOT NULL,
	`last_day` text NOT NULL,
	`checklist_hash` text NOT NULL,
	`limits_hash` text NOT NULL,
	`default_depth` text NOT NULL,
	`depth_policy` text NOT NULL,
	`list_stale_minutes` integer NOT NULL,
	`next_kid` integer NOT NULL,
	`next_entry_code` integer NOT NULL,
	`snapshot_version` integer NOT NULL,
	`created_at` integer NOT NULL,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`checklist_hash`) REFERENCES `checklist_text`(`hash`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`limits_hash`) REFERENCES `limits_text`(`hash`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `event_code` ON `event` (`club_id`,`code`);--> statement-breakpoint
CREATE TABLE `limits_text` (
	`hash` text PRIMARY KEY NOT NULL,
	`body` text NOT NULL
) STRICT;
--> statement-breakpoint
CREATE TABLE `run_group` (
	`id` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`event_id` text NOT NULL,
	`name` text NOT NULL,
	`order` integer NOT NULL,
	`first_session_at` integer,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`event_id`) REFERENCES `event`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `run_group_name` ON `run_group` (`event_id`,`name`);--> statement-breakpoint
CREATE INDEX `run_group_event` ON `run_group` (`event_id`);--> statement-breakpoint
CREATE TABLE `audit` (
	`id` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`event_id` text,
	`at` integer NOT NULL,
	`account_id` text,
	`action` text NOT NULL,
	`detail` text NOT NULL,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `audit_event` ON `audit` (`event_id`,`at`);--> statement-breakpoint
CREATE TABLE `note` (
	`hash` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`event_id` text NOT NULL,
	`salt` text NOT NULL,
	`text` text NOT NULL,
	`seq` integer NOT NULL,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`event_id`) REFERENCES `event`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `note_event` ON `note` (`event_id`,`seq`);--> statement-breakpoint
CREATE TABLE `pass_state` (
	`event_id` text NOT NULL,
	`record_hash` text NOT NULL,
	`club_id` text NOT NULL,
	`subject_key` text NOT NULL,
	`pass_id` text NOT NULL,
	`typed_code` text NOT NULL,
	`state` text NOT NULL,
	`body` text NOT NULL,
	PRIMARY KEY(`event_id`, `record_hash`),
	FOREIGN KEY (`event_id`) REFERENCES `event`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `pass_state_subject` ON `pass_state` (`event_id`,`subject_key`);--> statement-breakpoint
CREATE TABLE `record` (
	`event_id` text NOT NULL,
	`seq` integer NOT NULL,
	`club_id` text NOT NULL,
	`id` text NOT NULL,
	`jws` text NOT NULL,
	`hash` text NOT NULL,
	`chain` text NOT NULL,
	`disposition` text NOT NULL,
	`code` text,
	`kind` text NOT NULL,
	`subject_key` text NOT NULL,
	`device_id` text NOT NULL,
	`device_seq` integer NOT NULL,
	`received_at` integer NOT NULL,
	PRIMARY KEY(`event_id`, `seq`),
	FOREIGN KEY (`event_id`) REFERENCES `event`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `record_id` ON `record` (`id`);--> statement-breakpoint
CREATE INDEX `record_hash` ON `record` (`hash`);--> statement-breakpoint
CREATE INDEX `record_subject` ON `record` (`event_id`,`subject_key`);--> statement-breakpoint
CREATE INDEX `record_device` ON `record` (`device_id`,`device_seq`);--> statement-breakpoint
CREATE TABLE `scan` (
	`id` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`event_id` text NOT NULL,
	`device_id` text NOT NULL,
	`at` integer NOT NULL,
	`answer` text NOT NULL,
	`code` text NOT NULL,
	`entry_id` text,
	`pass_id` text,
	`how` text NOT NULL,
	`aboard` text NOT NULL,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`event_id`) REFERENCES `event`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `scan_event` ON `scan` (`event_id`,`at`);--> statement-breakpoint
CREATE TABLE `subject_state` (
	`event_id` text NOT NULL,
	`subject_key` text NOT NULL,
	`club_id` text NOT NULL,
	`seq` integer NOT NULL,
	`day` text NOT NULL,
	`verdict` text NOT NULL,
	`body` text NOT NULL,
	PRIMARY KEY(`event_id`, `subject_key`),
	FOREIGN KEY (`event_id`) REFERENCES `event`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
