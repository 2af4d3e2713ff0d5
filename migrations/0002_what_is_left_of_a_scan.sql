CREATE TRIGGER `scan_stations_something_left_after` BEFORE UPDATE ON `scan_stations`
WHEN NEW.`late_seconds` + NEW.`early_seconds` >= (SELECT `length_seconds` FROM `scans` WHERE `session_id` = NEW.`session_id` AND `id` = NEW.`scan_id`)
BEGIN
	SELECT RAISE(ABORT, 'late + early must be less than the length of the scan');
END;--> statement-breakpoint
CREATE TRIGGER `scans_leave_something` BEFORE UPDATE OF `length_seconds` ON `scans`
WHEN EXISTS (SELECT 1 FROM `scan_stations` WHERE `session_id` = NEW.`session_id` AND `scan_id` = NEW.`id` AND `late_seconds` + `early_seconds` >= NEW.`length_seconds`)
BEGIN
	SELECT RAISE(ABORT, 'late + early must be less than the length of the scan');
END;--> statement-breakpoint
CREATE TRIGGER `scans_at_most_a_day` BEFORE INSERT ON `scans` WHEN NEW.`length_seconds` > 86400
BEGIN
	SELECT RAISE(ABORT, 'a scan lasts at most 24 h');
END;--> statement-breakpoint
CREATE TRIGGER `scans_stay_at_most_a_day` BEFORE UPDATE OF `length_seconds` ON `scans` WHEN NEW.`length_seconds` > 86400
BEGIN
	SELECT RAISE(ABORT, 'a scan lasts at most 24 h');
END;
