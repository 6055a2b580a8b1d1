DROP INDEX `sign_in_codes_live` ON `sign_in_codes`;--> statement-breakpoint
ALTER TABLE `carriers` ADD `people_seq` int DEFAULT 0 NOT NULL;--> statement-breakpoint
CREATE INDEX `sessions_expiry` ON `sessions` (`expires_at`);--> statement-breakpoint
CREATE INDEX `sign_in_codes_of_browser` ON `sign_in_codes` (`browser_hash`,`created_at`);--> statement-breakpoint
CREATE INDEX `sign_in_codes_expiry` ON `sign_in_codes` (`expires_at`);