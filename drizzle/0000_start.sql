CREATE TABLE `api_tokens` (
	`id` char(26) NOT NULL,
	`user_id` char(26) NOT NULL,
	`name` varchar(120) NOT NULL,
	`token_hash` varchar(64) NOT NULL,
	`scope` enum('read','submit') NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`expires_at` datetime(3),
	`last_used_at` datetime(3),
	`revoked_at` datetime(3),
	CONSTRAINT `api_tokens_id` PRIMARY KEY(`id`),
	CONSTRAINT `api_tokens_hash` UNIQUE(`token_hash`)
);
--> statement-breakpoint
CREATE TABLE `one_time_links` (
	`id` char(26) NOT NULL,
	`purpose` enum('set-up') NOT NULL,
	`token_hash` varchar(64) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`used_at` datetime(3),
	CONSTRAINT `one_time_links_id` PRIMARY KEY(`id`),
	CONSTRAINT `one_time_links_hash` UNIQUE(`token_hash`)
);
--> statement-breakpoint
CREATE TABLE `sessions` (
	`id` char(26) NOT NULL,
	`user_id` char(26) NOT NULL,
	`user_agent` varchar(300) NOT NULL DEFAULT '',
	`created_at` datetime(3) NOT NULL,
	`last_seen_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`revoked_at` datetime(3),
	CONSTRAINT `sessions_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `users` (
	`id` char(26) NOT NULL,
	`email` varchar(254) NOT NULL,
	`name` varchar(120) NOT NULL,
	`password_hash` varchar(255),
	`is_administrator` boolean NOT NULL DEFAULT false,
	`mail_preference` enum('each','digest','none') NOT NULL DEFAULT 'digest',
	`deactivated_at` datetime(3),
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `users_id` PRIMARY KEY(`id`),
	CONSTRAINT `users_email` UNIQUE(`email`)
);
--> statement-breakpoint
CREATE TABLE `campaigns` (
	`id` char(26) NOT NULL,
	`slug` varchar(64) NOT NULL,
	`title` varchar(200) NOT NULL,
	`kind` enum('airglow','atmosphere','interstellar','comet','laboratory','other') NOT NULL DEFAULT 'other',
	`description` text NOT NULL,
	`self_review` boolean NOT NULL DEFAULT false,
	`archived_at` datetime(3),
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `campaigns_id` PRIMARY KEY(`id`),
	CONSTRAINT `campaigns_slug` UNIQUE(`slug`)
);
--> statement-breakpoint
CREATE TABLE `instruments` (
	`id` char(26) NOT NULL,
	`campaign_id` char(26) NOT NULL,
	`station_id` char(26),
	`slug` varchar(64) NOT NULL,
	`name` varchar(120) NOT NULL,
	`axis_unit` enum('nm','angstrom','um','cm-1','GHz','MHz','Hz','pixel'),
	`medium` enum('vacuum','air'),
	`value_kind` enum('photons','energy'),
	`default_observable` enum('photon-emission','energy-emission','brightness-integral','absorption-area','optical-depth-integral','equivalent-width','level-population','raman-scatter','envelope-only'),
	`fwhm` double,
	`notes` text NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `instruments_id` PRIMARY KEY(`id`),
	CONSTRAINT `instruments_slug` UNIQUE(`campaign_id`,`slug`)
);
--> statement-breakpoint
CREATE TABLE `memberships` (
	`campaign_id` char(26) NOT NULL,
	`user_id` char(26) NOT NULL,
	`role` enum('reader','observer','analyst','lead') NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `memberships_campaign_id_user_id_pk` PRIMARY KEY(`campaign_id`,`user_id`)
);
--> statement-breakpoint
CREATE TABLE `recipes` (
	`id` char(26) NOT NULL,
	`campaign_id` char(26) NOT NULL,
	`slug` varchar(64) NOT NULL,
	`version` int NOT NULL,
	`name` varchar(120) NOT NULL,
	`settings` longtext NOT NULL,
	`created_by` char(26) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `recipes_id` PRIMARY KEY(`id`),
	CONSTRAINT `recipes_version` UNIQUE(`campaign_id`,`slug`,`version`)
);
--> statement-breakpoint
CREATE TABLE `stations` (
	`id` char(26) NOT NULL,
	`campaign_id` char(26) NOT NULL,
	`slug` varchar(64) NOT NULL,
	`name` varchar(120) NOT NULL,
	`latitude` double,
	`longitude` double,
	`altitude` double,
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `stations_id` PRIMARY KEY(`id`),
	CONSTRAINT `stations_slug` UNIQUE(`campaign_id`,`slug`)
);
--> statement-breakpoint
CREATE TABLE `spectra` (
	`id` char(26) NOT NULL,
	`campaign_id` char(26) NOT NULL,
	`owner_id` char(26) NOT NULL,
	`station_id` char(26),
	`instrument_id` char(26),
	`name` varchar(200) NOT NULL,
	`sha256` varchar(64) NOT NULL,
	`byte_count` bigint NOT NULL,
	`format` enum('text','fits','json') NOT NULL,
	`pixel_count` int NOT NULL,
	`wavelength_from` double,
	`wavelength_to` double,
	`about` longtext NOT NULL,
	`missing` longtext NOT NULL,
	`warnings` longtext NOT NULL,
	`observed_at` datetime(3),
	`created_at` datetime(3) NOT NULL,
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `spectra_id` PRIMARY KEY(`id`),
	CONSTRAINT `spectra_bytes` UNIQUE(`campaign_id`,`sha256`)
);
--> statement-breakpoint
CREATE TABLE `batches` (
	`id` char(26) NOT NULL,
	`campaign_id` char(26) NOT NULL,
	`owner_id` char(26) NOT NULL,
	`total` int NOT NULL,
	`note` varchar(2000) NOT NULL DEFAULT '',
	`created_at` datetime(3) NOT NULL,
	`digest_at` datetime(3),
	CONSTRAINT `batches_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `retrieval_events` (
	`id` bigint AUTO_INCREMENT NOT NULL,
	`retrieval_id` char(26) NOT NULL,
	`batch_id` char(26) NOT NULL,
	`kind` enum('phase','progress') NOT NULL,
	`revision` int NOT NULL,
	`phase` enum('PENDING','QUEUED','EXECUTING','COMPLETED','ERROR','ABORTED','HELD') NOT NULL,
	`progress` double NOT NULL,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `retrieval_events_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `retrieval_results` (
	`retrieval_id` char(26) NOT NULL,
	`revision` int NOT NULL,
	`attempt` int NOT NULL,
	`phase` enum('COMPLETED','ERROR','ABORTED') NOT NULL,
	`settings` longtext NOT NULL,
	`result` longtext,
	`provenance` longtext,
	`reason` varchar(2000),
	`note` varchar(2000) NOT NULL DEFAULT '',
	`created_by` char(26) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `retrieval_results_retrieval_id_revision_pk` PRIMARY KEY(`retrieval_id`,`revision`)
);
--> statement-breakpoint
CREATE TABLE `retrievals` (
	`id` char(26) NOT NULL,
	`campaign_id` char(26) NOT NULL,
	`owner_id` char(26) NOT NULL,
	`batch_id` char(26) NOT NULL,
	`batch_order` int NOT NULL,
	`spectrum_id` char(26),
	`line_table` longtext,
	`recipe_id` char(26),
	`station_id` char(26),
	`instrument_id` char(26),
	`name` varchar(200) NOT NULL,
	`note` varchar(2000) NOT NULL DEFAULT '',
	`observed_at` datetime(3),
	`band` varchar(64),
	`revision` int NOT NULL DEFAULT 1,
	`settings` longtext NOT NULL,
	`settings_hash` varchar(64) NOT NULL,
	`phase` enum('PENDING','QUEUED','EXECUTING','COMPLETED','ERROR','ABORTED','HELD') NOT NULL,
	`progress` double NOT NULL DEFAULT 0,
	`attempt` int NOT NULL DEFAULT 0,
	`dispatch` int NOT NULL DEFAULT 0,
	`dispatched_at` datetime(3),
	`heartbeat_at` datetime(3),
	`abort_requested` boolean NOT NULL DEFAULT false,
	`reason` varchar(2000),
	`created_at` datetime(3) NOT NULL,
	`queued_at` datetime(3),
	`started_at` datetime(3),
	`finished_at` datetime(3),
	`temperature` double,
	`u_noise` double,
	`u_systematic` double,
	`strength_set` varchar(64),
	`flag_bits` int unsigned NOT NULL DEFAULT 0,
	`verdict` enum('accept','return'),
	`version` int NOT NULL DEFAULT 1,
	CONSTRAINT `retrievals_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `reviews` (
	`id` char(26) NOT NULL,
	`retrieval_id` char(26) NOT NULL,
	`revision` int NOT NULL,
	`reviewer_id` char(26) NOT NULL,
	`verdict` enum('accept','return') NOT NULL,
	`note` varchar(2000) NOT NULL DEFAULT '',
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `reviews_id` PRIMARY KEY(`id`),
	CONSTRAINT `reviews_once` UNIQUE(`retrieval_id`,`revision`,`reviewer_id`,`created_at`)
);
--> statement-breakpoint
CREATE TABLE `outbox` (
	`id` char(26) NOT NULL,
	`subject_key` varchar(120) NOT NULL,
	`user_id` char(26) NOT NULL,
	`kind` enum('result','failure','digest') NOT NULL,
	`payload` longtext NOT NULL,
	`message_id` varchar(200) NOT NULL,
	`state` enum('waiting','sent','failed') NOT NULL DEFAULT 'waiting',
	`attempts` int NOT NULL DEFAULT 0,
	`last_error` text,
	`next_attempt_at` datetime(3) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`sent_at` datetime(3),
	CONSTRAINT `outbox_id` PRIMARY KEY(`id`),
	CONSTRAINT `outbox_subject` UNIQUE(`subject_key`)
);
--> statement-breakpoint
CREATE TABLE `logbook` (
	`id` char(26) NOT NULL,
	`campaign_id` char(26),
	`object_kind` varchar(32) NOT NULL,
	`object_id` char(26) NOT NULL,
	`actor_id` char(26),
	`action` varchar(64) NOT NULL,
	`detail` longtext NOT NULL,
	`at` datetime(3) NOT NULL,
	CONSTRAINT `logbook_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `idempotency_keys` (
	`user_id` char(26) NOT NULL,
	`key` varchar(200) NOT NULL,
	`body_hash` varchar(64) NOT NULL,
	`status` int NOT NULL,
	`answer` longtext NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `idempotency_keys_user_id_key_pk` PRIMARY KEY(`user_id`,`key`)
);
--> statement-breakpoint
ALTER TABLE `api_tokens` ADD CONSTRAINT `api_tokens_user_id_users_id_fk` FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sessions` ADD CONSTRAINT `sessions_user_id_users_id_fk` FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `instruments` ADD CONSTRAINT `instruments_campaign_id_campaigns_id_fk` FOREIGN KEY (`campaign_id`) REFERENCES `campaigns`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `instruments` ADD CONSTRAINT `instruments_station_id_stations_id_fk` FOREIGN KEY (`station_id`) REFERENCES `stations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `memberships` ADD CONSTRAINT `memberships_campaign_id_campaigns_id_fk` FOREIGN KEY (`campaign_id`) REFERENCES `campaigns`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `memberships` ADD CONSTRAINT `memberships_user_id_users_id_fk` FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `recipes` ADD CONSTRAINT `recipes_campaign_id_campaigns_id_fk` FOREIGN KEY (`campaign_id`) REFERENCES `campaigns`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `recipes` ADD CONSTRAINT `recipes_created_by_users_id_fk` FOREIGN KEY (`created_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `stations` ADD CONSTRAINT `stations_campaign_id_campaigns_id_fk` FOREIGN KEY (`campaign_id`) REFERENCES `campaigns`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `spectra` ADD CONSTRAINT `spectra_campaign_id_campaigns_id_fk` FOREIGN KEY (`campaign_id`) REFERENCES `campaigns`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `spectra` ADD CONSTRAINT `spectra_owner_id_users_id_fk` FOREIGN KEY (`owner_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `spectra` ADD CONSTRAINT `spectra_station_id_stations_id_fk` FOREIGN KEY (`station_id`) REFERENCES `stations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `spectra` ADD CONSTRAINT `spectra_instrument_id_instruments_id_fk` FOREIGN KEY (`instrument_id`) REFERENCES `instruments`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `batches` ADD CONSTRAINT `batches_campaign_id_campaigns_id_fk` FOREIGN KEY (`campaign_id`) REFERENCES `campaigns`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `batches` ADD CONSTRAINT `batches_owner_id_users_id_fk` FOREIGN KEY (`owner_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `retrieval_results` ADD CONSTRAINT `retrieval_results_retrieval_id_retrievals_id_fk` FOREIGN KEY (`retrieval_id`) REFERENCES `retrievals`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `retrieval_results` ADD CONSTRAINT `retrieval_results_created_by_users_id_fk` FOREIGN KEY (`created_by`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `retrievals` ADD CONSTRAINT `retrievals_campaign_id_campaigns_id_fk` FOREIGN KEY (`campaign_id`) REFERENCES `campaigns`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `retrievals` ADD CONSTRAINT `retrievals_owner_id_users_id_fk` FOREIGN KEY (`owner_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `retrievals` ADD CONSTRAINT `retrievals_batch_id_batches_id_fk` FOREIGN KEY (`batch_id`) REFERENCES `batches`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `retrievals` ADD CONSTRAINT `retrievals_spectrum_id_spectra_id_fk` FOREIGN KEY (`spectrum_id`) REFERENCES `spectra`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `retrievals` ADD CONSTRAINT `retrievals_recipe_id_recipes_id_fk` FOREIGN KEY (`recipe_id`) REFERENCES `recipes`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `retrievals` ADD CONSTRAINT `retrievals_station_id_stations_id_fk` FOREIGN KEY (`station_id`) REFERENCES `stations`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `retrievals` ADD CONSTRAINT `retrievals_instrument_id_instruments_id_fk` FOREIGN KEY (`instrument_id`) REFERENCES `instruments`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reviews` ADD CONSTRAINT `reviews_retrieval_id_retrievals_id_fk` FOREIGN KEY (`retrieval_id`) REFERENCES `retrievals`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `reviews` ADD CONSTRAINT `reviews_reviewer_id_users_id_fk` FOREIGN KEY (`reviewer_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `outbox` ADD CONSTRAINT `outbox_user_id_users_id_fk` FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `idempotency_keys` ADD CONSTRAINT `idempotency_keys_user_id_users_id_fk` FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `api_tokens_user` ON `api_tokens` (`user_id`);--> statement-breakpoint
CREATE INDEX `sessions_user` ON `sessions` (`user_id`);--> statement-breakpoint
CREATE INDEX `memberships_user` ON `memberships` (`user_id`);--> statement-breakpoint
CREATE INDEX `spectra_campaign_time` ON `spectra` (`campaign_id`,`observed_at`);--> statement-breakpoint
CREATE INDEX `batches_owner` ON `batches` (`owner_id`,`created_at`);--> statement-breakpoint
CREATE INDEX `retrieval_events_batch` ON `retrieval_events` (`batch_id`,`id`);--> statement-breakpoint
CREATE INDEX `retrieval_events_retrieval` ON `retrieval_events` (`retrieval_id`,`id`);--> statement-breakpoint
CREATE INDEX `retrievals_campaign_created` ON `retrievals` (`campaign_id`,`id`);--> statement-breakpoint
CREATE INDEX `retrievals_campaign_observed` ON `retrievals` (`campaign_id`,`observed_at`,`id`);--> statement-breakpoint
CREATE INDEX `retrievals_campaign_temperature` ON `retrievals` (`campaign_id`,`temperature`,`id`);--> statement-breakpoint
CREATE INDEX `retrievals_batch` ON `retrievals` (`batch_id`,`batch_order`);--> statement-breakpoint
CREATE INDEX `retrievals_phase` ON `retrievals` (`phase`,`heartbeat_at`);--> statement-breakpoint
CREATE INDEX `retrievals_owner` ON `retrievals` (`owner_id`,`id`);--> statement-breakpoint
CREATE INDEX `outbox_due` ON `outbox` (`state`,`next_attempt_at`);--> statement-breakpoint
CREATE INDEX `logbook_object` ON `logbook` (`object_kind`,`object_id`,`id`);--> statement-breakpoint
CREATE INDEX `logbook_campaign` ON `logbook` (`campaign_id`,`id`);