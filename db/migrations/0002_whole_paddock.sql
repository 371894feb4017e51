CREATE TABLE `password_link` (
	`token_hash` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`account_id` text NOT NULL,
	`created_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	`used_at` integer,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`account_id`) REFERENCES `account`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `password_link_account` ON `password_link` (`account_id`);--> statement-breakpoint
CREATE TABLE `entry_link` (
	`token_hash` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`entry_id` text NOT NULL,
	`person_id` text NOT NULL,
	`created_at` integer NOT NULL,
	`expires_at` integer NOT NULL,
	`revoked_at` integer,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`entry_id`) REFERENCES `entry`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`person_id`) REFERENCES `person`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `entry_link_entry` ON `entry_link` (`entry_id`);--> statement-breakpoint
CREATE TABLE `kit` (
	`id` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`account_id` text NOT NULL,
	`kind` text NOT NULL,
	`name` text NOT NULL,
	`values` text NOT NULL,
	`photo_hash` text,
	`retired` integer DEFAULT false NOT NULL,
	`updated_at` integer NOT NULL,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`account_id`) REFERENCES `account`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `kit_account` ON `kit` (`account_id`);--> statement-breakpoint
CREATE TABLE `printed_pass` (
	`event_id` text NOT NULL,
	`counter` integer NOT NULL,
	`club_id` text NOT NULL,
	`entry_id` text NOT NULL,
	`token` text NOT NULL,
	`day` text NOT NULL,
	`printed_at` integer NOT NULL,
	PRIMARY KEY(`event_id`, `counter`),
	FOREIGN KEY (`event_id`) REFERENCES `event`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`entry_id`) REFERENCES `entry`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `printed_pass_entry` ON `printed_pass` (`entry_id`,`day`);--> statement-breakpoint
CREATE TABLE `timetable_block` (
	`id` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`event_id` text NOT NULL,
	`day` text NOT NULL,
	`kind` text NOT NULL,
	`group_id` text,
	`session` integer,
	`starts_at` integer NOT NULL,
	`ends_at` integer NOT NULL,
	`noise_limit_db` real,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`event_id`) REFERENCES `event`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`group_id`) REFERENCES `run_group`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `timetable_block_event` ON `timetable_block` (`event_id`,`starts_at`);--> statement-breakpoint
CREATE TABLE `mail_outbox` (
	`id` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`event_id` text,
	`entry_id` text,
	`kind` text NOT NULL,
	`to` text NOT NULL,
	`subject` text NOT NULL,
	`text` text NOT NULL,
	`same_as` text NOT NULL,
	`created_at` integer NOT NULL,
	`next_try_at` integer NOT NULL,
	`tries` integer DEFAULT 0 NOT NULL,
	`sent_at` integer,
	`failed_at` integer,
	`last_error` text,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `mail_outbox_same` ON `mail_outbox` (`club_id`,`same_as`);--> statement-breakpoint
CREATE INDEX `mail_outbox_next` ON `mail_outbox` (`next_try_at`);--> statement-breakpoint
CREATE TABLE `photo` (
	`hash` text PRIMARY KEY NOT NULL,
	`club_id` text NOT NULL,
	`event_id` text,
	`account_id` text,
	`device_id` text,
	`stored_hash` text NOT NULL,
	`width` integer NOT NULL,
	`height` integer NOT NULL,
	`bytes` integer NOT NULL,
	`received_at` integer NOT NULL,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `photo_event` ON `photo` (`event_id`);--> statement-breakpoint
ALTER TABLE `car` ADD `owner_account_id` text REFERENCES account(id);--> statement-breakpoint
ALTER TABLE `car` ADD `facts` text DEFAULT '{}' NOT NULL;--> statement-breakpoint
ALTER TABLE `entry` ADD `version` integer DEFAULT 1 NOT NULL;--> statement-breakpoint
ALTER TABLE `person` ADD `minor` integer DEFAULT false NOT NULL;--> statement-breakpoint
ALTER TABLE `event` ADD `kind_of_day` text DEFAULT 'closed-circuit' NOT NULL;--> statement-breakpoint
ALTER TABLE `event` ADD `sample_every` integer DEFAULT 0 NOT NULL;