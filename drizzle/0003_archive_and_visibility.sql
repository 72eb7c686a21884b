CREATE TABLE `former_campaign_slugs` (
	`slug` varchar(64) NOT NULL,
	`campaign_id` char(26) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `former_campaign_slugs_slug` PRIMARY KEY(`slug`)
);
--> statement-breakpoint
ALTER TABLE `campaigns` ADD `starts_on` date;--> statement-breakpoint
ALTER TABLE `campaigns` ADD `ends_on` date;--> statement-breakpoint
ALTER TABLE `campaigns` ADD `visibility` enum('members','service') DEFAULT 'members' NOT NULL;--> statement-breakpoint
ALTER TABLE `instruments` ADD `resolving_power` double;--> statement-breakpoint
ALTER TABLE `instruments` ADD `archived_at` datetime(3);--> statement-breakpoint
ALTER TABLE `recipes` ADD `archived_at` datetime(3);--> statement-breakpoint
ALTER TABLE `stations` ADD `archived_at` datetime(3);--> statement-breakpoint
ALTER TABLE `former_campaign_slugs` ADD CONSTRAINT `former_campaign_slugs_campaign_id_campaigns_id_fk` FOREIGN KEY (`campaign_id`) REFERENCES `campaigns`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `campaigns_visibility` ON `campaigns` (`visibility`);