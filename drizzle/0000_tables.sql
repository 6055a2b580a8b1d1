CREATE TABLE `carriers` (
	`id` binary(16) NOT NULL,
	`name` varchar(120) NOT NULL,
	`policy_version` int NOT NULL DEFAULT 1,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `carriers_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `changes` (
	`carrier_id` binary(16) NOT NULL,
	`seq` int NOT NULL,
	`at` datetime(3) NOT NULL,
	`kind` varchar(40) NOT NULL,
	`truck_id` binary(16),
	`subject_id` binary(16),
	`data` json,
	CONSTRAINT `changes_carrier_id_seq_pk` PRIMARY KEY(`carrier_id`,`seq`)
);
--> statement-breakpoint
CREATE TABLE `feed_heads` (
	`carrier_id` binary(16) NOT NULL,
	`seq` int NOT NULL DEFAULT 0,
	CONSTRAINT `feed_heads_carrier_id` PRIMARY KEY(`carrier_id`)
);
--> statement-breakpoint
CREATE TABLE `leases` (
	`name` varchar(40) NOT NULL,
	`holder` char(36) NOT NULL,
	`until` datetime(3) NOT NULL,
	CONSTRAINT `leases_name` PRIMARY KEY(`name`)
);
--> statement-breakpoint
CREATE TABLE `policies` (
	`carrier_id` binary(16) NOT NULL,
	`version` int NOT NULL,
	`settings` json NOT NULL,
	`created_by` binary(16),
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `policies_carrier_id_version_pk` PRIMARY KEY(`carrier_id`,`version`)
);
--> statement-breakpoint
CREATE TABLE `yards` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`name` varchar(80) NOT NULL,
	`zone` varchar(64) NOT NULL,
	`elevation_m` double NOT NULL,
	`phone` varchar(32),
	`shop_opens_minute` smallint NOT NULL DEFAULT 360,
	`winter` boolean NOT NULL DEFAULT false,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `yards_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `clearances` (
	`carrier_id` binary(16) NOT NULL,
	`truck_id` binary(16) NOT NULL,
	`driver_id` binary(16) NOT NULL,
	`walk_id` binary(16) NOT NULL,
	`tags_seq` int NOT NULL,
	`valid_until` datetime(3) NOT NULL,
	CONSTRAINT `clearances_carrier_id_truck_id_driver_id_pk` PRIMARY KEY(`carrier_id`,`truck_id`,`driver_id`)
);
--> statement-breakpoint
CREATE TABLE `handovers` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`truck_id` binary(16) NOT NULL,
	`driver_id` binary(16) NOT NULL,
	`handed_by` binary(16) NOT NULL,
	`decided_at` datetime(3) NOT NULL,
	`gate_seq` int NOT NULL,
	`hash` binary(32) NOT NULL,
	`returned_at` datetime(3),
	`open_truck` binary(16) GENERATED ALWAYS AS ((if(`returned_at` is null, `truck_id`, null))) STORED,
	CONSTRAINT `handovers_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`),
	CONSTRAINT `handovers_one_open` UNIQUE(`carrier_id`,`open_truck`)
);
--> statement-breakpoint
CREATE TABLE `returns` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`handover_id` binary(16) NOT NULL,
	`truck_id` binary(16) NOT NULL,
	`driver_id` binary(16) NOT NULL,
	`taken_by` binary(16) NOT NULL,
	`returned_at` datetime(3) NOT NULL,
	`pump_hours` double,
	`aboard` enum('empty','loaded') NOT NULL,
	`ends_day` boolean NOT NULL,
	`note` varchar(1000),
	`hash` binary(32) NOT NULL,
	CONSTRAINT `returns_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`),
	CONSTRAINT `returns_one_per_handover` UNIQUE(`carrier_id`,`handover_id`)
);
--> statement-breakpoint
CREATE TABLE `runs` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`handover_id` binary(16) NOT NULL,
	`name` varchar(120) NOT NULL,
	`pressure_off_load` boolean NOT NULL,
	`towing` boolean NOT NULL,
	`hazmat` boolean NOT NULL,
	`vacuum_pa` int NOT NULL,
	`fill_l` int NOT NULL,
	`hose_mm` int NOT NULL,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `runs_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`),
	CONSTRAINT `runs_needs` CHECK(vacuum_pa >= 0 and fill_l >= 0 and hose_mm >= 0)
);
--> statement-breakpoint
CREATE TABLE `audit` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`at` datetime(3) NOT NULL,
	`actor_id` binary(16),
	`action` varchar(60) NOT NULL,
	`subject_id` binary(16),
	`detail` json,
	CONSTRAINT `audit_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `invitations` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`email` varchar(254) NOT NULL,
	`name` varchar(80) NOT NULL,
	`roles` json NOT NULL,
	`certifier` boolean NOT NULL DEFAULT false,
	`yard_id` binary(16),
	`token_hash` binary(32) NOT NULL,
	`invited_by` binary(16) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`accepted_at` datetime(3),
	`revoked_at` datetime(3),
	CONSTRAINT `invitations_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`),
	CONSTRAINT `invitations_token` UNIQUE(`token_hash`)
);
--> statement-breakpoint
CREATE TABLE `mail_outbox` (
	`id` binary(16) NOT NULL,
	`carrier_id` binary(16),
	`dedupe_key` varchar(190) NOT NULL,
	`recipient` varchar(254) NOT NULL,
	`template` enum('sign-in-code','invitation','red-tag','key-freed') NOT NULL,
	`props` json NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`send_after` datetime(3) NOT NULL,
	`tries` smallint NOT NULL DEFAULT 0,
	`sent_at` datetime(3),
	`failed_at` datetime(3),
	`last_error` varchar(190),
	CONSTRAINT `mail_outbox_id` PRIMARY KEY(`id`),
	CONSTRAINT `mail_outbox_once` UNIQUE(`dedupe_key`)
);
--> statement-breakpoint
CREATE TABLE `memberships` (
	`carrier_id` binary(16) NOT NULL,
	`person_id` binary(16) NOT NULL,
	`roles` json NOT NULL,
	`certifier` boolean NOT NULL DEFAULT false,
	`on_call_order` smallint,
	`yard_id` binary(16),
	`created_at` datetime(3) NOT NULL,
	`deactivated_at` datetime(3),
	CONSTRAINT `memberships_carrier_id_person_id_pk` PRIMARY KEY(`carrier_id`,`person_id`)
);
--> statement-breakpoint
CREATE TABLE `people` (
	`id` binary(16) NOT NULL,
	`email` varchar(254) NOT NULL,
	`name` varchar(80) NOT NULL,
	`phone` varchar(32),
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `people_id` PRIMARY KEY(`id`),
	CONSTRAINT `people_email` UNIQUE(`email`)
);
--> statement-breakpoint
CREATE TABLE `rate_limits` (
	`key` varchar(255) NOT NULL,
	`points` int NOT NULL DEFAULT 0,
	`expire` bigint unsigned,
	CONSTRAINT `rate_limits_key` PRIMARY KEY(`key`)
);
--> statement-breakpoint
CREATE TABLE `sessions` (
	`id` binary(16) NOT NULL,
	`token_hash` binary(32) NOT NULL,
	`person_id` binary(16) NOT NULL,
	`carrier_id` binary(16),
	`device` varchar(120) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`last_seen_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`revoked_at` datetime(3),
	CONSTRAINT `sessions_id` PRIMARY KEY(`id`),
	CONSTRAINT `sessions_token` UNIQUE(`token_hash`)
);
--> statement-breakpoint
CREATE TABLE `sign_in_codes` (
	`id` binary(16) NOT NULL,
	`email` varchar(254) NOT NULL,
	`browser_hash` binary(32) NOT NULL,
	`code_hash` binary(32) NOT NULL,
	`tries` smallint NOT NULL DEFAULT 0,
	`created_at` datetime(3) NOT NULL,
	`expires_at` datetime(3) NOT NULL,
	`ended_at` datetime(3),
	CONSTRAINT `sign_in_codes_id` PRIMARY KEY(`id`)
);
--> statement-breakpoint
CREATE TABLE `acknowledgements` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`truck_id` binary(16) NOT NULL,
	`driver_id` binary(16) NOT NULL,
	`walk_id` binary(16),
	`items` json NOT NULL,
	`satisfied` boolean NOT NULL,
	`note` varchar(1000),
	`signed_at` datetime(3) NOT NULL,
	`received_at` datetime(3) NOT NULL,
	`signature` json NOT NULL,
	`hash` binary(32) NOT NULL,
	CONSTRAINT `acknowledgements_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `photos` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`truck_id` binary(16) NOT NULL,
	`tag_id` binary(16),
	`walk_id` binary(16),
	`owner_id` binary(16) NOT NULL,
	`sha256` binary(32) NOT NULL,
	`bytes` int NOT NULL,
	`promised_at` datetime(3) NOT NULL,
	`stored_at` datetime(3),
	`object_key` varchar(190),
	`thumb_key` varchar(190),
	`width` smallint,
	`height` smallint,
	CONSTRAINT `photos_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`),
	CONSTRAINT `photos_stored_whole` CHECK((stored_at is null) = (object_key is null))
);
--> statement-breakpoint
CREATE TABLE `run_limits` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`tag_id` binary(16) NOT NULL,
	`truck_id` binary(16) NOT NULL,
	`limit` json,
	`until_day` date NOT NULL,
	`signed_by` binary(16) NOT NULL,
	`signed_at` datetime(3) NOT NULL,
	`signature` json NOT NULL,
	`hash` binary(32) NOT NULL,
	CONSTRAINT `run_limits_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `sign_offs` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`tag_id` binary(16) NOT NULL,
	`truck_id` binary(16) NOT NULL,
	`kind` enum('repaired','not-needed') NOT NULL,
	`work` enum('adjusted','cleaned','repaired','replaced'),
	`parts` varchar(400),
	`reason` varchar(1000),
	`value_entered` double,
	`value_unit` varchar(12),
	`value_si` double,
	`road_tested` boolean,
	`remote` boolean NOT NULL DEFAULT false,
	`own_finding` boolean NOT NULL DEFAULT false,
	`signed_by` binary(16) NOT NULL,
	`signed_at` datetime(3) NOT NULL,
	`signature` json NOT NULL,
	`hash` binary(32) NOT NULL,
	CONSTRAINT `sign_offs_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`),
	CONSTRAINT `sign_offs_one_per_tag` UNIQUE(`carrier_id`,`tag_id`),
	CONSTRAINT `sign_offs_says_what` CHECK((kind = 'repaired' and work is not null) or (kind = 'not-needed' and reason is not null))
);
--> statement-breakpoint
CREATE TABLE `tag_changes` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`tag_id` binary(16) NOT NULL,
	`truck_id` binary(16) NOT NULL,
	`walk_id` binary(16),
	`seen` enum('same','worse','gone') NOT NULL,
	`colour` enum('white','yellow','red') NOT NULL,
	`limit` json,
	`note` varchar(1000),
	`changed_by` binary(16) NOT NULL,
	`changed_at` datetime(3) NOT NULL,
	CONSTRAINT `tag_changes_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `tags` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`truck_id` binary(16) NOT NULL,
	`walk_id` binary(16),
	`kind` enum('defect','not-satisfied') NOT NULL DEFAULT 'defect',
	`disputes_sign_off_id` binary(16),
	`check_key` varchar(80),
	`problem_key` varchar(60),
	`fitting_id` binary(16),
	`part` varchar(40),
	`colour` enum('white','yellow','red') NOT NULL,
	`limit` json,
	`title` varchar(160) NOT NULL,
	`note` varchar(1000),
	`road_safety` boolean NOT NULL,
	`driver_fix` boolean NOT NULL DEFAULT false,
	`remote` boolean NOT NULL DEFAULT false,
	`raised_by` binary(16) NOT NULL,
	`raised_at` datetime(3) NOT NULL,
	`received_at` datetime(3) NOT NULL,
	`signed_off_at` datetime(3),
	CONSTRAINT `tags_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`),
	CONSTRAINT `tags_limit_is_yellow` CHECK(`limit` is null or colour = 'yellow'),
	CONSTRAINT `tags_not_satisfied` CHECK(kind = 'defect' or colour = 'red')
);
--> statement-breakpoint
CREATE TABLE `dated_tests` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`truck_id` binary(16) NOT NULL,
	`kind` varchar(40) NOT NULL,
	`passed_on` date,
	`due_on` date NOT NULL,
	`note` varchar(200),
	`recorded_by` binary(16) NOT NULL,
	`recorded_at` datetime(3) NOT NULL,
	CONSTRAINT `dated_tests_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`),
	CONSTRAINT `dated_tests_order` CHECK(passed_on is null or due_on >= passed_on)
);
--> statement-breakpoint
CREATE TABLE `fittings` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`truck_id` binary(16) NOT NULL,
	`kind` varchar(40) NOT NULL,
	`attributes` json NOT NULL,
	`fitted_at` datetime(3) NOT NULL,
	`removed_at` datetime(3),
	CONSTRAINT `fittings_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `own_checks` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`truck_id` binary(16),
	`station` varchar(20) NOT NULL,
	`cadence` enum('daily','weekly','monthly') NOT NULL,
	`label` varchar(80) NOT NULL,
	`good` varchar(160) NOT NULL,
	`colour` enum('white','yellow','red') NOT NULL,
	`created_by` binary(16) NOT NULL,
	`created_at` datetime(3) NOT NULL,
	`removed_at` datetime(3),
	CONSTRAINT `own_checks_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `rounds` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`truck_id` binary(16) NOT NULL,
	`kind` enum('weekly','monthly') NOT NULL,
	`done_on` date NOT NULL,
	`done_at` datetime(3) NOT NULL,
	`done_by` binary(16) NOT NULL,
	`walk_id` binary(16),
	`pump_hours` double,
	CONSTRAINT `rounds_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `set_points` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`truck_id` binary(16) NOT NULL,
	`reading` varchar(40) NOT NULL,
	`unit` varchar(12) NOT NULL,
	`entered` json NOT NULL,
	`set_point_si` double NOT NULL,
	`low_si` double,
	`high_si` double,
	`stop_si` double,
	`set_by` binary(16) NOT NULL,
	`set_at` datetime(3) NOT NULL,
	`replaced_at` datetime(3),
	CONSTRAINT `set_points_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `sheet_versions` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`truck_id` binary(16) NOT NULL,
	`hash` binary(32) NOT NULL,
	`setup_version` int NOT NULL,
	`body` json NOT NULL,
	`made_here` boolean NOT NULL DEFAULT true,
	`created_at` datetime(3) NOT NULL,
	CONSTRAINT `sheet_versions_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`),
	CONSTRAINT `sheet_versions_once` UNIQUE(`carrier_id`,`truck_id`,`hash`,`setup_version`)
);
--> statement-breakpoint
CREATE TABLE `trucks` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`unit_number` varchar(20) NOT NULL,
	`kind` enum('powered','towed') NOT NULL,
	`vin` char(17),
	`yard_id` binary(16) NOT NULL,
	`in_service` boolean NOT NULL DEFAULT true,
	`created_at` datetime(3) NOT NULL,
	`setup_version` int NOT NULL DEFAULT 1,
	`gate_seq` int NOT NULL DEFAULT 0,
	`tags_seq` int NOT NULL DEFAULT 0,
	`policy_version` int NOT NULL DEFAULT 1,
	`gate_fault` varchar(190),
	`out_handover` binary(16),
	`open_reds` int NOT NULL DEFAULT 0,
	`yellow_block_at` datetime(3),
	`tests_block_at` datetime(3),
	`rounds_block_at` datetime(3),
	`rounds_block_hours` double,
	`pump_hours` double NOT NULL DEFAULT 0,
	`limits_mask` int NOT NULL DEFAULT 0,
	`limit_vacuum_pa` int,
	`limit_fill_l` int,
	`limit_hose_mm` int,
	`standing` enum('held','walk-due','limited','cleared','out') NOT NULL DEFAULT 'held',
	`standing_until` datetime(3),
	`standing_detail` json,
	CONSTRAINT `trucks_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`),
	CONSTRAINT `trucks_unit_number` UNIQUE(`carrier_id`,`unit_number`),
	CONSTRAINT `trucks_limits_mask` CHECK(limits_mask between 0 and 15),
	CONSTRAINT `trucks_gate_counts` CHECK(gate_seq >= 0 and tags_seq >= 0 and open_reds >= 0 and pump_hours >= 0),
	CONSTRAINT `trucks_unit_number_form` CHECK(unit_number regexp '^[A-Z0-9][A-Z0-9-]{0,19}$')
);
--> statement-breakpoint
CREATE TABLE `answers` (
	`carrier_id` binary(16) NOT NULL,
	`walk_id` binary(16) NOT NULL,
	`check_key` varchar(80) NOT NULL,
	`body` json NOT NULL,
	CONSTRAINT `answers_carrier_id_walk_id_check_key_pk` PRIMARY KEY(`carrier_id`,`walk_id`,`check_key`)
);
--> statement-breakpoint
CREATE TABLE `conflicts` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`record_id` binary(16) NOT NULL,
	`kind` varchar(24) NOT NULL,
	`hash` binary(32) NOT NULL,
	`body` json NOT NULL,
	`person_id` binary(16) NOT NULL,
	`received_at` datetime(3) NOT NULL,
	CONSTRAINT `conflicts_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `readings` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`truck_id` binary(16) NOT NULL,
	`walk_id` binary(16),
	`check_key` varchar(80) NOT NULL,
	`fitting_id` binary(16),
	`quantity` varchar(20) NOT NULL,
	`counts_from` datetime(3) NOT NULL,
	`entered` double NOT NULL,
	`unit` varchar(12) NOT NULL,
	`si` double NOT NULL,
	`verdict` varchar(24),
	`elevation_m` double,
	`station_pa` double,
	`pump_hours` double,
	`liquid_l` double,
	`new_segment` boolean NOT NULL DEFAULT false,
	CONSTRAINT `readings_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `receipts` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`kind` varchar(24) NOT NULL,
	`hash` binary(32) NOT NULL,
	`body` json NOT NULL,
	`person_id` binary(16) NOT NULL,
	`received_at` datetime(3) NOT NULL,
	CONSTRAINT `receipts_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`)
);
--> statement-breakpoint
CREATE TABLE `walks` (
	`carrier_id` binary(16) NOT NULL,
	`id` binary(16) NOT NULL,
	`truck_id` binary(16) NOT NULL,
	`driver_id` binary(16) NOT NULL,
	`kind` enum('before','after','takeover') NOT NULL,
	`base_walk_id` binary(16),
	`corrects_walk_id` binary(16),
	`sheet_id` binary(16) NOT NULL,
	`setup_version` int NOT NULL,
	`hash` binary(32) NOT NULL,
	`signed_at` datetime(3) NOT NULL,
	`age_ms` bigint NOT NULL,
	`received_at` datetime(3) NOT NULL,
	`counts_from` datetime(3) NOT NULL,
	`yard_day` date NOT NULL,
	`complete` boolean NOT NULL,
	`clears_not` varchar(40),
	`limits` json NOT NULL,
	`missing` json NOT NULL,
	`signature` json NOT NULL,
	CONSTRAINT `walks_carrier_id_id_pk` PRIMARY KEY(`carrier_id`,`id`),
	CONSTRAINT `walks_clears_whole` CHECK(clears_not is not null or complete),
	CONSTRAINT `walks_takeover_base` CHECK((kind = 'takeover') = (base_walk_id is not null))
);
--> statement-breakpoint
ALTER TABLE `policies` ADD CONSTRAINT `policies_carrier` FOREIGN KEY (`carrier_id`) REFERENCES `carriers`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `yards` ADD CONSTRAINT `yards_carrier` FOREIGN KEY (`carrier_id`) REFERENCES `carriers`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `clearances` ADD CONSTRAINT `clearances_truck` FOREIGN KEY (`carrier_id`,`truck_id`) REFERENCES `trucks`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `handovers` ADD CONSTRAINT `handovers_truck` FOREIGN KEY (`carrier_id`,`truck_id`) REFERENCES `trucks`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `handovers` ADD CONSTRAINT `handovers_driver` FOREIGN KEY (`carrier_id`,`driver_id`) REFERENCES `memberships`(`carrier_id`,`person_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `handovers` ADD CONSTRAINT `handovers_handed_by` FOREIGN KEY (`carrier_id`,`handed_by`) REFERENCES `memberships`(`carrier_id`,`person_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `returns` ADD CONSTRAINT `returns_handover` FOREIGN KEY (`carrier_id`,`handover_id`) REFERENCES `handovers`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `runs` ADD CONSTRAINT `runs_handover` FOREIGN KEY (`carrier_id`,`handover_id`) REFERENCES `handovers`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `audit` ADD CONSTRAINT `audit_carrier` FOREIGN KEY (`carrier_id`) REFERENCES `carriers`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invitations` ADD CONSTRAINT `invitations_carrier` FOREIGN KEY (`carrier_id`) REFERENCES `carriers`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `invitations` ADD CONSTRAINT `invitations_by` FOREIGN KEY (`carrier_id`,`invited_by`) REFERENCES `memberships`(`carrier_id`,`person_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `mail_outbox` ADD CONSTRAINT `mail_outbox_carrier` FOREIGN KEY (`carrier_id`) REFERENCES `carriers`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `memberships` ADD CONSTRAINT `memberships_carrier` FOREIGN KEY (`carrier_id`) REFERENCES `carriers`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `memberships` ADD CONSTRAINT `memberships_person` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `memberships` ADD CONSTRAINT `memberships_yard` FOREIGN KEY (`carrier_id`,`yard_id`) REFERENCES `yards`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sessions` ADD CONSTRAINT `sessions_person` FOREIGN KEY (`person_id`) REFERENCES `people`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `acknowledgements` ADD CONSTRAINT `acknowledgements_truck` FOREIGN KEY (`carrier_id`,`truck_id`) REFERENCES `trucks`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `acknowledgements` ADD CONSTRAINT `acknowledgements_driver` FOREIGN KEY (`carrier_id`,`driver_id`) REFERENCES `memberships`(`carrier_id`,`person_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `photos` ADD CONSTRAINT `photos_truck` FOREIGN KEY (`carrier_id`,`truck_id`) REFERENCES `trucks`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `photos` ADD CONSTRAINT `photos_tag` FOREIGN KEY (`carrier_id`,`tag_id`) REFERENCES `tags`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `run_limits` ADD CONSTRAINT `run_limits_tag` FOREIGN KEY (`carrier_id`,`tag_id`) REFERENCES `tags`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sign_offs` ADD CONSTRAINT `sign_offs_tag` FOREIGN KEY (`carrier_id`,`tag_id`) REFERENCES `tags`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sign_offs` ADD CONSTRAINT `sign_offs_signed_by` FOREIGN KEY (`carrier_id`,`signed_by`) REFERENCES `memberships`(`carrier_id`,`person_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `tag_changes` ADD CONSTRAINT `tag_changes_tag` FOREIGN KEY (`carrier_id`,`tag_id`) REFERENCES `tags`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `tags` ADD CONSTRAINT `tags_truck` FOREIGN KEY (`carrier_id`,`truck_id`) REFERENCES `trucks`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `tags` ADD CONSTRAINT `tags_walk` FOREIGN KEY (`carrier_id`,`walk_id`) REFERENCES `walks`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `tags` ADD CONSTRAINT `tags_raised_by` FOREIGN KEY (`carrier_id`,`raised_by`) REFERENCES `memberships`(`carrier_id`,`person_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `dated_tests` ADD CONSTRAINT `dated_tests_truck` FOREIGN KEY (`carrier_id`,`truck_id`) REFERENCES `trucks`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `fittings` ADD CONSTRAINT `fittings_truck` FOREIGN KEY (`carrier_id`,`truck_id`) REFERENCES `trucks`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `own_checks` ADD CONSTRAINT `own_checks_truck` FOREIGN KEY (`carrier_id`,`truck_id`) REFERENCES `trucks`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `own_checks` ADD CONSTRAINT `own_checks_carrier` FOREIGN KEY (`carrier_id`) REFERENCES `carriers`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `rounds` ADD CONSTRAINT `rounds_truck` FOREIGN KEY (`carrier_id`,`truck_id`) REFERENCES `trucks`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `set_points` ADD CONSTRAINT `set_points_truck` FOREIGN KEY (`carrier_id`,`truck_id`) REFERENCES `trucks`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `sheet_versions` ADD CONSTRAINT `sheet_versions_truck` FOREIGN KEY (`carrier_id`,`truck_id`) REFERENCES `trucks`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `trucks` ADD CONSTRAINT `trucks_carrier` FOREIGN KEY (`carrier_id`) REFERENCES `carriers`(`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `trucks` ADD CONSTRAINT `trucks_yard` FOREIGN KEY (`carrier_id`,`yard_id`) REFERENCES `yards`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `answers` ADD CONSTRAINT `answers_walk` FOREIGN KEY (`carrier_id`,`walk_id`) REFERENCES `walks`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `readings` ADD CONSTRAINT `readings_truck` FOREIGN KEY (`carrier_id`,`truck_id`) REFERENCES `trucks`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `readings` ADD CONSTRAINT `readings_walk` FOREIGN KEY (`carrier_id`,`walk_id`) REFERENCES `walks`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `walks` ADD CONSTRAINT `walks_truck` FOREIGN KEY (`carrier_id`,`truck_id`) REFERENCES `trucks`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `walks` ADD CONSTRAINT `walks_driver` FOREIGN KEY (`carrier_id`,`driver_id`) REFERENCES `memberships`(`carrier_id`,`person_id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `walks` ADD CONSTRAINT `walks_sheet` FOREIGN KEY (`carrier_id`,`sheet_id`) REFERENCES `sheet_versions`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `walks` ADD CONSTRAINT `walks_base` FOREIGN KEY (`carrier_id`,`base_walk_id`) REFERENCES `walks`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE `walks` ADD CONSTRAINT `walks_corrects` FOREIGN KEY (`carrier_id`,`corrects_walk_id`) REFERENCES `walks`(`carrier_id`,`id`) ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX `handovers_of_truck` ON `handovers` (`carrier_id`,`truck_id`,`decided_at`);--> statement-breakpoint
CREATE INDEX `returns_of_truck` ON `returns` (`carrier_id`,`truck_id`,`returned_at`);--> statement-breakpoint
CREATE INDEX `runs_of_handover` ON `runs` (`carrier_id`,`handover_id`);--> statement-breakpoint
CREATE INDEX `mail_outbox_waiting` ON `mail_outbox` (`sent_at`,`failed_at`,`send_after`);--> statement-breakpoint
CREATE INDEX `memberships_of_person` ON `memberships` (`person_id`);--> statement-breakpoint
CREATE INDEX `sessions_of_person` ON `sessions` (`person_id`);--> statement-breakpoint
CREATE INDEX `sign_in_codes_live` ON `sign_in_codes` (`email`,`browser_hash`,`ended_at`);--> statement-breakpoint
CREATE INDEX `acknowledgements_of_truck` ON `acknowledgements` (`carrier_id`,`truck_id`,`driver_id`,`received_at`);--> statement-breakpoint
CREATE INDEX `photos_of_tag` ON `photos` (`carrier_id`,`tag_id`);--> statement-breakpoint
CREATE INDEX `photos_of_walk` ON `photos` (`carrier_id`,`walk_id`);--> statement-breakpoint
CREATE INDEX `run_limits_of_tag` ON `run_limits` (`carrier_id`,`tag_id`,`signed_at`);--> statement-breakpoint
CREATE INDEX `sign_offs_of_truck` ON `sign_offs` (`carrier_id`,`truck_id`,`signed_at`);--> statement-breakpoint
CREATE INDEX `tag_changes_of_tag` ON `tag_changes` (`carrier_id`,`tag_id`,`changed_at`);--> statement-breakpoint
CREATE INDEX `tags_of_truck` ON `tags` (`carrier_id`,`truck_id`,`signed_off_at`);--> statement-breakpoint
CREATE INDEX `tags_open` ON `tags` (`carrier_id`,`signed_off_at`,`colour`,`raised_at`);--> statement-breakpoint
CREATE INDEX `dated_tests_of_truck` ON `dated_tests` (`carrier_id`,`truck_id`,`kind`,`recorded_at`);--> statement-breakpoint
CREATE INDEX `fittings_of_truck` ON `fittings` (`carrier_id`,`truck_id`);--> statement-breakpoint
CREATE INDEX `rounds_of_truck` ON `rounds` (`carrier_id`,`truck_id`,`kind`,`done_on`);--> statement-breakpoint
CREATE INDEX `set_points_of_truck` ON `set_points` (`carrier_id`,`truck_id`,`reading`);--> statement-breakpoint
CREATE INDEX `trucks_by_yard` ON `trucks` (`carrier_id`,`yard_id`,`unit_number`);--> statement-breakpoint
CREATE INDEX `trucks_standing_until` ON `trucks` (`standing_until`);--> statement-breakpoint
CREATE INDEX `conflicts_of_record` ON `conflicts` (`carrier_id`,`record_id`,`hash`);--> statement-breakpoint
CREATE INDEX `readings_of_truck` ON `readings` (`carrier_id`,`truck_id`,`check_key`,`counts_from`);--> statement-breakpoint
CREATE INDEX `readings_by_quantity` ON `readings` (`carrier_id`,`truck_id`,`quantity`,`counts_from`);--> statement-breakpoint
CREATE INDEX `walks_of_truck` ON `walks` (`carrier_id`,`truck_id`,`counts_from`);--> statement-breakpoint
CREATE INDEX `walks_of_driver` ON `walks` (`carrier_id`,`driver_id`,`counts_from`);