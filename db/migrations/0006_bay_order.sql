CREATE TABLE `call_up` (
	`entry_id` text NOT NULL,
	`day` text NOT NULL,
	`club_id` text NOT NULL,
	`starts_at` integer NOT NULL,
	`ends_at` integer NOT NULL,
	PRIMARY KEY(`entry_id`, `day`),
	FOREIGN KEY (`entry_id`) REFERENCES `entry`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE TABLE `bay_plan` (
	`event_id` text NOT NULL,
	`day` text NOT NULL,
	`club_id` text NOT NULL,
	`opens_at` integer NOT NULL,
	`lanes` integer NOT NULL,
	`window_min` integer NOT NULL,
	`car_min` real NOT NULL,
	`car_sd_min` real NOT NULL,
	`published_at` integer,
	PRIMARY KEY(`event_id`, `day`),
	FOREIGN KEY (`event_id`) REFERENCES `event`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`club_id`) REFERENCES `club`(`id`) ON UPDATE no action ON DELETE no action
) STRICT;
