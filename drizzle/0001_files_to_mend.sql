ALTER TABLE `spectra` MODIFY COLUMN `format` enum('text','fits','json','unknown') NOT NULL;--> statement-breakpoint
ALTER TABLE `spectra` ADD `problem` longtext;