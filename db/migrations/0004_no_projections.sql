DROP TABLE `pass_state`;--> statement-breakpoint
DROP TABLE `subject_state`;