CREATE TABLE `issued_pass` (
	`event_id` text NOT NULL,
	`record_hash` text NOT NULL,
	`club_id` text NOT NULL,
	`subject_key` text NOT NULL,
	`pass_id` text NOT NULL,
	PRIMARY KEY(`event_id`, `record_hash`),
	FOREIGN KEY (`event_id`) REFERENCES `event`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE INDEX `issued_pass_id` ON `issued_pass` (`event_id`,`pass_id`);--> statement-breakpoint
INSERT INTO `issued_pass` (`event_id`, `record_hash`, `club_id`, `subject_key`, `pass_id`) SELECT `event_id`, `record_hash`, `club_id`, `subject_key`, `pass_id` FROM `pass_state`;
