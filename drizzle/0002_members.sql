CREATE TABLE `invitations` (
	`id` char(26) NOT NULL,
	`campaign_id` char(26),
	`email` varchar(254) NOT NULL,
	`role` enum('reader','observer','analyst','lead'),
	`as_administrator` boolean NOT NULL DEFAULT false,
	`token_hash` varchar(64) NOT NULL,
	`round` int NOT NULL DEFAULT 1,
	`open_key` varchar(300),
	`invited_by` char(26) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`sent_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`accepted_at` datetime(3),
	`accepted_by` char(26),
	`withdrawn_at` datetime(3),
	CONSTRAINT `invitations_id` PRIMARY KEY(`id`),
	CONSTRAINT `invitations_token` UNIQUE(`token_hash`),
	CONSTRAINT `invitations_open` UNIQUE(`open_key`)
);
--> statement-breakpoint
ALTER TABLE `outbox` MODIFY COLUMN `user_id` char(26);--> statement-breakpoint
ALTER TABLE `outbox` MODIFY COLUMN `kind` enum('result','failure','digest','invitation','membership','standing') NOT NULL;--> statement-breakpoint
ALTER TABLE `memberships` ADD `version` int DEFAULT 1 NOT NULL;--> statement-breakpoint
ALTER TABLE `retrievals` ADD `attempts_before` int DEFAULT 0 NOT NULL;--> statement-breakpoint
ALTER TABLE `retrievals` ADD `fault` boolean DEFAULT false NOT NULL;--> statement-breakpoint
ALTER TABLE `outbox` ADD `address` varchar(254);--> statement-breakpoint
ALTER TABLE `invitations` ADD CONSTRAINT `invitations_campaign_id_campaigns_id_fk` FOREIGN KEY (`campaign_id`) REFERENCES `campaigns`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invitations` ADD CONSTRAINT `invitations_invited_by_users_id_fk` FOREIGN KEY (`invited_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invitations` ADD CONSTRAINT `invitations_accepted_by_users_id_fk` FOREIGN KEY (`accepted_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `invitations_campaign` ON `invitations` (`campaign_id`,`id`);