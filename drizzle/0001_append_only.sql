-- K3: what was signed is never changed or deleted. Write-once columns alone may be filled, once.
--> statement-breakpoint
CREATE TRIGGER `policies_no_update` BEFORE UPDATE ON `policies` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: policies';
--> statement-breakpoint
CREATE TRIGGER `dated_tests_no_update` BEFORE UPDATE ON `dated_tests` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: dated_tests';
--> statement-breakpoint
CREATE TRIGGER `rounds_no_update` BEFORE UPDATE ON `rounds` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: rounds';
--> statement-breakpoint
CREATE TRIGGER `sheet_versions_no_update` BEFORE UPDATE ON `sheet_versions` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: sheet_versions';
--> statement-breakpoint
CREATE TRIGGER `walks_no_update` BEFORE UPDATE ON `walks` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: walks';
--> statement-breakpoint
CREATE TRIGGER `answers_no_update` BEFORE UPDATE ON `answers` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: answers';
--> statement-breakpoint
CREATE TRIGGER `readings_no_update` BEFORE UPDATE ON `readings` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: readings';
--> statement-breakpoint
CREATE TRIGGER `tag_changes_no_update` BEFORE UPDATE ON `tag_changes` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: tag_changes';
--> statement-breakpoint
CREATE TRIGGER `sign_offs_no_update` BEFORE UPDATE ON `sign_offs` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: sign_offs';
--> statement-breakpoint
CREATE TRIGGER `run_limits_no_update` BEFORE UPDATE ON `run_limits` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: run_limits';
--> statement-breakpoint
CREATE TRIGGER `acknowledgements_no_update` BEFORE UPDATE ON `acknowledgements` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: acknowledgements';
--> statement-breakpoint
CREATE TRIGGER `runs_no_update` BEFORE UPDATE ON `runs` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: runs';
--> statement-breakpoint
CREATE TRIGGER `returns_no_update` BEFORE UPDATE ON `returns` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: returns';
--> statement-breakpoint
CREATE TRIGGER `receipts_no_update` BEFORE UPDATE ON `receipts` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: receipts';
--> statement-breakpoint
CREATE TRIGGER `conflicts_no_update` BEFORE UPDATE ON `conflicts` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: conflicts';
--> statement-breakpoint
CREATE TRIGGER `changes_no_update` BEFORE UPDATE ON `changes` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: changes';
--> statement-breakpoint
CREATE TRIGGER `audit_no_update` BEFORE UPDATE ON `audit` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: audit';
--> statement-breakpoint
CREATE TRIGGER `tags_write_once` BEFORE UPDATE ON `tags` FOR EACH ROW BEGIN
  IF NOT (NEW.`carrier_id` <=> OLD.`carrier_id`
    AND NEW.`id` <=> OLD.`id`
    AND NEW.`truck_id` <=> OLD.`truck_id`
    AND NEW.`walk_id` <=> OLD.`walk_id`
    AND NEW.`kind` <=> OLD.`kind`
    AND NEW.`disputes_sign_off_id` <=> OLD.`disputes_sign_off_id`
    AND NEW.`check_key` <=> OLD.`check_key`
    AND NEW.`problem_key` <=> OLD.`problem_key`
    AND NEW.`fitting_id` <=> OLD.`fitting_id`
    AND NEW.`part` <=> OLD.`part`
    AND NEW.`colour` <=> OLD.`colour`
    AND NEW.`limit` <=> OLD.`limit`
    AND NEW.`title` <=> OLD.`title`
    AND NEW.`note` <=> OLD.`note`
    AND NEW.`road_safety` <=> OLD.`road_safety`
    AND NEW.`driver_fix` <=> OLD.`driver_fix`
    AND NEW.`remote` <=> OLD.`remote`
    AND NEW.`raised_by` <=> OLD.`raised_by`
    AND NEW.`raised_at` <=> OLD.`raised_at`
    AND NEW.`received_at` <=> OLD.`received_at`
    AND (OLD.`signed_off_at` IS NULL OR NEW.`signed_off_at` <=> OLD.`signed_off_at`)) THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: tags';
  END IF;
END;
--> statement-breakpoint
CREATE TRIGGER `handovers_write_once` BEFORE UPDATE ON `handovers` FOR EACH ROW BEGIN
  IF NOT (NEW.`carrier_id` <=> OLD.`carrier_id`
    AND NEW.`id` <=> OLD.`id`
    AND NEW.`truck_id` <=> OLD.`truck_id`
    AND NEW.`driver_id` <=> OLD.`driver_id`
    AND NEW.`handed_by` <=> OLD.`handed_by`
    AND NEW.`decided_at` <=> OLD.`decided_at`
    AND NEW.`gate_seq` <=> OLD.`gate_seq`
    AND NEW.`hash` <=> OLD.`hash`
    AND (OLD.`returned_at` IS NULL OR NEW.`returned_at` <=> OLD.`returned_at`)) THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: handovers';
  END IF;
END;
--> statement-breakpoint
CREATE TRIGGER `photos_write_once` BEFORE UPDATE ON `photos` FOR EACH ROW BEGIN
  IF NOT (NEW.`carrier_id` <=> OLD.`carrier_id`
    AND NEW.`id` <=> OLD.`id`
    AND NEW.`truck_id` <=> OLD.`truck_id`
    AND NEW.`tag_id` <=> OLD.`tag_id`
    AND NEW.`walk_id` <=> OLD.`walk_id`
    AND NEW.`owner_id` <=> OLD.`owner_id`
    AND NEW.`sha256` <=> OLD.`sha256`
    AND NEW.`bytes` <=> OLD.`bytes`
    AND NEW.`promised_at` <=> OLD.`promised_at`
    AND (OLD.`stored_at` IS NULL OR NEW.`stored_at` <=> OLD.`stored_at`)
    AND (OLD.`object_key` IS NULL OR NEW.`object_key` <=> OLD.`object_key`)
    AND (OLD.`thumb_key` IS NULL OR NEW.`thumb_key` <=> OLD.`thumb_key`)
    AND (OLD.`width` IS NULL OR NEW.`width` <=> OLD.`width`)
    AND (OLD.`height` IS NULL OR NEW.`height` <=> OLD.`height`)) THEN
    SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: photos';
  END IF;
END;
--> statement-breakpoint
CREATE TRIGGER `policies_no_delete` BEFORE DELETE ON `policies` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: policies';
--> statement-breakpoint
CREATE TRIGGER `dated_tests_no_delete` BEFORE DELETE ON `dated_tests` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: dated_tests';
--> statement-breakpoint
CREATE TRIGGER `rounds_no_delete` BEFORE DELETE ON `rounds` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: rounds';
--> statement-breakpoint
CREATE TRIGGER `sheet_versions_no_delete` BEFORE DELETE ON `sheet_versions` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: sheet_versions';
--> statement-breakpoint
CREATE TRIGGER `walks_no_delete` BEFORE DELETE ON `walks` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: walks';
--> statement-breakpoint
CREATE TRIGGER `answers_no_delete` BEFORE DELETE ON `answers` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: answers';
--> statement-breakpoint
CREATE TRIGGER `readings_no_delete` BEFORE DELETE ON `readings` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: readings';
--> statement-breakpoint
CREATE TRIGGER `tag_changes_no_delete` BEFORE DELETE ON `tag_changes` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: tag_changes';
--> statement-breakpoint
CREATE TRIGGER `sign_offs_no_delete` BEFORE DELETE ON `sign_offs` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: sign_offs';
--> statement-breakpoint
CREATE TRIGGER `run_limits_no_delete` BEFORE DELETE ON `run_limits` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: run_limits';
--> statement-breakpoint
CREATE TRIGGER `acknowledgements_no_delete` BEFORE DELETE ON `acknowledgements` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: acknowledgements';
--> statement-breakpoint
CREATE TRIGGER `runs_no_delete` BEFORE DELETE ON `runs` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: runs';
--> statement-breakpoint
CREATE TRIGGER `returns_no_delete` BEFORE DELETE ON `returns` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: returns';
--> statement-breakpoint
CREATE TRIGGER `receipts_no_delete` BEFORE DELETE ON `receipts` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: receipts';
--> statement-breakpoint
CREATE TRIGGER `conflicts_no_delete` BEFORE DELETE ON `conflicts` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: conflicts';
--> statement-breakpoint
CREATE TRIGGER `changes_no_delete` BEFORE DELETE ON `changes` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: changes';
--> statement-breakpoint
CREATE TRIGGER `audit_no_delete` BEFORE DELETE ON `audit` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: audit';
--> statement-breakpoint
CREATE TRIGGER `tags_no_delete` BEFORE DELETE ON `tags` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: tags';
--> statement-breakpoint
CREATE TRIGGER `handovers_no_delete` BEFORE DELETE ON `handovers` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: handovers';
--> statement-breakpoint
CREATE TRIGGER `photos_no_delete` BEFORE DELETE ON `photos` FOR EACH ROW SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'append-only: photos';
