CREATE UNIQUE INDEX `grants_once` ON `grants` (`user_id`, `role`, coalesce(`station_code`, ''), coalesce(`session_id`, ''));--> statement-breakpoint
CREATE TRIGGER `journal_no_update` BEFORE UPDATE ON `journal`
BEGIN
	SELECT RAISE(ABORT, 'the journal is append-only');
END;--> statement-breakpoint
CREATE TRIGGER `journal_no_delete` BEFORE DELETE ON `journal`
BEGIN
	SELECT RAISE(ABORT, 'the journal is append-only');
END;--> statement-breakpoint
CREATE TRIGGER `subjects_no_delete` BEFORE DELETE ON `subjects`
BEGIN
	SELECT RAISE(ABORT, 'a subject is never deleted');
END;--> statement-breakpoint
CREATE TRIGGER `subjects_rev_rises` BEFORE UPDATE ON `subjects` WHEN NEW.`rev` < OLD.`rev`
BEGIN
	SELECT RAISE(ABORT, 'a revision never falls');
END;--> statement-breakpoint
CREATE TRIGGER `stations_code_stays` BEFORE UPDATE OF `code` ON `stations` WHEN NEW.`code` <> OLD.`code`
BEGIN
	SELECT RAISE(ABORT, 'the code of a station does not change');
END;--> statement-breakpoint
CREATE TRIGGER `scan_stations_something_left` BEFORE INSERT ON `scan_stations`
WHEN NEW.`late_seconds` + NEW.`early_seconds` >= (SELECT `length_seconds` FROM `scans` WHERE `session_id` = NEW.`session_id` AND `id` = NEW.`scan_id`)
BEGIN
	SELECT RAISE(ABORT, 'late + early must be less than the length of the scan');
END;
