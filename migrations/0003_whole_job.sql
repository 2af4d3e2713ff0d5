CREATE TABLE `clock_events` (
	`id` text PRIMARY KEY NOT NULL,
	`station_code` text NOT NULL,
	`at_ms` integer NOT NULL,
	`kind` text NOT NULL,
	`step_seconds` real,
	`note` text DEFAULT '' NOT NULL,
	`user_id` text NOT NULL,
	`role` text NOT NULL,
	`entered_at_ms` integer NOT NULL,
	FOREIGN KEY (`station_code`) REFERENCES `stations`(`code`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "clock_events_kind" CHECK("clock_events"."kind" IN ('steered', 'resync', 'cable', 'receiver', 'power', 'other'))
) STRICT;
--> statement-breakpoint
CREATE INDEX `clock_events_by_time` ON `clock_events` (`station_code`,`at_ms`);--> statement-breakpoint
CREATE TABLE `clock_readings` (
	`id` text PRIMARY KEY NOT NULL,
	`station_code` text NOT NULL,
	`pulse` text NOT NULL,
	`at_ms` integer NOT NULL,
	`offset_seconds` real NOT NULL,
	`counter_seconds` real,
	`sigma_seconds` real,
	`second_check` text NOT NULL,
	`second_off` integer,
	`state` text NOT NULL,
	`reason` text DEFAULT '' NOT NULL,
	`set_aside_by` text,
	`set_aside_role` text,
	`set_aside_at_ms` integer,
	`note` text DEFAULT '' NOT NULL,
	`origin` text NOT NULL,
	`entered_by` text NOT NULL,
	`entered_role` text NOT NULL,
	`entered_at_ms` integer NOT NULL,
	`act_id` text NOT NULL,
	FOREIGN KEY (`station_code`) REFERENCES `stations`(`code`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`set_aside_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`entered_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "clock_readings_pulse" CHECK("clock_readings"."pulse" IN ('formatter', 'maser')),
	CONSTRAINT "clock_readings_offset" CHECK(abs("clock_readings"."offset_seconds") <= 86400.5),
	CONSTRAINT "clock_readings_counter" CHECK("clock_readings"."counter_seconds" >= 0 AND "clock_readings"."counter_seconds" < 1),
	CONSTRAINT "clock_readings_sigma" CHECK("clock_readings"."sigma_seconds" > 0),
	CONSTRAINT "clock_readings_second" CHECK("clock_readings"."second_check" IN ('yes', 'no', 'off') AND ("clock_readings"."second_check" = 'off') = ("clock_readings"."second_off" IS NOT NULL) AND "clock_readings"."second_off" <> 0),
	CONSTRAINT "clock_readings_state" CHECK("clock_readings"."state" IN ('used', 'set-aside', 'waiting') AND ("clock_readings"."state" = 'used' OR length(trim("clock_readings"."reason")) > 0)),
	CONSTRAINT "clock_readings_origin" CHECK("clock_readings"."origin" IN ('form', 'file', 'api', 'desk'))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `clock_readings_act` ON `clock_readings` (`station_code`,`act_id`);--> statement-breakpoint
CREATE INDEX `clock_readings_by_time` ON `clock_readings` (`station_code`,`pulse`,`at_ms`);--> statement-breakpoint
CREATE TABLE `mail_outbox` (
	`id` text PRIMARY KEY NOT NULL,
	`dedupe_key` text NOT NULL,
	`to_address` text NOT NULL,
	`subject` text NOT NULL,
	`text` text NOT NULL,
	`html` text NOT NULL,
	`session_id` text,
	`station_code` text,
	`made_at_ms` integer NOT NULL,
	`state` text NOT NULL,
	`tries` integer DEFAULT 0 NOT NULL,
	`sent_at_ms` integer,
	`provider_id` text,
	`trouble` text DEFAULT '' NOT NULL,
	FOREIGN KEY (`session_id`) REFERENCES `sessions`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "mail_outbox_state" CHECK("mail_outbox"."state" IN ('waiting', 'sent', 'failed')),
	CONSTRAINT "mail_outbox_sent" CHECK(("mail_outbox"."state" = 'sent') = ("mail_outbox"."sent_at_ms" IS NOT NULL)),
	CONSTRAINT "mail_outbox_tries" CHECK("mail_outbox"."tries" >= 0)
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `mail_outbox_dedupe_key_unique` ON `mail_outbox` (`dedupe_key`);--> statement-breakpoint
CREATE INDEX `mail_outbox_by_state` ON `mail_outbox` (`state`,`made_at_ms`);--> statement-breakpoint
CREATE TABLE `mode_channels` (
	`mode_id` text NOT NULL,
	`number` integer NOT NULL,
	`edge_hz` real NOT NULL,
	`sideband` text NOT NULL,
	`polarisation` text NOT NULL,
	`bandwidth_hz` real NOT NULL,
	`bits` integer NOT NULL,
	PRIMARY KEY(`mode_id`, `number`),
	FOREIGN KEY (`mode_id`) REFERENCES `modes`(`id`) ON UPDATE no action ON DELETE cascade,
	CONSTRAINT "mode_channels_number" CHECK("mode_channels"."number" >= 1),
	CONSTRAINT "mode_channels_edge" CHECK("mode_channels"."edge_hz" > 0 AND "mode_channels"."bandwidth_hz" > 0),
	CONSTRAINT "mode_channels_sideband" CHECK("mode_channels"."sideband" IN ('upper', 'lower')),
	CONSTRAINT "mode_channels_polarisation" CHECK("mode_channels"."polarisation" IN ('R', 'L', 'X', 'Y')),
	CONSTRAINT "mode_channels_bits" CHECK("mode_channels"."bits" IN (1, 2))
) STRICT;
--> statement-breakpoint
CREATE TABLE `mode_stations` (
	`mode_id` text NOT NULL,
	`station_code` text NOT NULL,
	`is_able` integer NOT NULL,
	`bits` integer,
	`note` text DEFAULT '' NOT NULL,
	PRIMARY KEY(`mode_id`, `station_code`),
	FOREIGN KEY (`mode_id`) REFERENCES `modes`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`station_code`) REFERENCES `stations`(`code`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "mode_stations_able" CHECK("mode_stations"."is_able" IN (0, 1)),
	CONSTRAINT "mode_stations_bits" CHECK("mode_stations"."bits" IN (1, 2))
) STRICT;
--> statement-breakpoint
CREATE TABLE `offers` (
	`id` text PRIMARY KEY NOT NULL,
	`session_id` text NOT NULL,
	`number` integer NOT NULL,
	`kind` text NOT NULL,
	`snapshot` text NOT NULL,
	`checksum` text NOT NULL,
	`seq` integer NOT NULL,
	`made_at_ms` integer NOT NULL,
	`made_by` text NOT NULL,
	`answer_by_ms` integer,
	`note` text DEFAULT '' NOT NULL,
	FOREIGN KEY (`session_id`) REFERENCES `sessions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`made_by`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "offers_number" CHECK("offers"."number" >= 1),
	CONSTRAINT "offers_kind" CHECK("offers"."kind" IN ('offer', 'publish')),
	CONSTRAINT "offers_snapshot" CHECK(json_valid("offers"."snapshot")),
	CONSTRAINT "offers_checksum" CHECK(length("offers"."checksum") = 64)
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `offers_of_session` ON `offers` (`session_id`,`number`);--> statement-breakpoint
CREATE TABLE `scan_outcomes` (
	`seq` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`session_id` text NOT NULL,
	`scan_id` text NOT NULL,
	`station_code` text NOT NULL,
	`outcome` text NOT NULL,
	`lost` text DEFAULT '[]' NOT NULL,
	`reason` text,
	`text` text DEFAULT '' NOT NULL,
	`user_id` text NOT NULL,
	`role` text NOT NULL,
	`is_on_behalf` integer NOT NULL,
	`at_ms` integer NOT NULL,
	`act_id` text NOT NULL,
	FOREIGN KEY (`session_id`) REFERENCES `sessions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`station_code`) REFERENCES `stations`(`code`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "scan_outcomes_outcome" CHECK("scan_outcomes"."outcome" IN ('good', 'partly', 'lost')),
	CONSTRAINT "scan_outcomes_lost" CHECK(json_valid("scan_outcomes"."lost") AND ("scan_outcomes"."outcome" = 'good') = (json_array_length("scan_outcomes"."lost") = 0)),
	CONSTRAINT "scan_outcomes_reason" CHECK("scan_outcomes"."reason" IN ('wind', 'antenna', 'receiver', 'formatter', 'recorder', 'clock', 'interference', 'other') AND ("scan_outcomes"."outcome" = 'good') = ("scan_outcomes"."reason" IS NULL)),
	CONSTRAINT "scan_outcomes_other" CHECK("scan_outcomes"."reason" IS NOT 'other' OR length(trim("scan_outcomes"."text")) > 0),
	CONSTRAINT "scan_outcomes_behalf" CHECK("scan_outcomes"."is_on_behalf" IN (0, 1))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `scan_outcomes_act` ON `scan_outcomes` (`session_id`,`act_id`);--> statement-breakpoint
CREATE INDEX `scan_outcomes_of_scan` ON `scan_outcomes` (`session_id`,`station_code`,`scan_id`,`seq`);--> statement-breakpoint
CREATE TABLE `session_comments` (
	`id` text PRIMARY KEY NOT NULL,
	`session_id` text NOT NULL,
	`user_id` text NOT NULL,
	`role` text NOT NULL,
	`station_code` text,
	`at_ms` integer NOT NULL,
	`text` text NOT NULL,
	FOREIGN KEY (`session_id`) REFERENCES `sessions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`station_code`) REFERENCES `stations`(`code`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "session_comments_text" CHECK(length(trim("session_comments"."text")) > 0)
) STRICT;
--> statement-breakpoint
CREATE INDEX `session_comments_by_time` ON `session_comments` (`session_id`,`at_ms`);--> statement-breakpoint
CREATE TABLE `slot_replies` (
	`seq` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`session_id` text NOT NULL,
	`station_code` text NOT NULL,
	`offer_id` text NOT NULL,
	`reply` text NOT NULL,
	`hours` text NOT NULL,
	`reason` text DEFAULT '' NOT NULL,
	`user_id` text NOT NULL,
	`role` text NOT NULL,
	`is_on_behalf` integer NOT NULL,
	`at_ms` integer NOT NULL,
	`act_id` text NOT NULL,
	FOREIGN KEY (`session_id`) REFERENCES `sessions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`station_code`) REFERENCES `stations`(`code`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`offer_id`) REFERENCES `offers`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "slot_replies_reply" CHECK("slot_replies"."reply" IN ('confirmed', 'partly', 'declined')),
	CONSTRAINT "slot_replies_hours" CHECK(json_valid("slot_replies"."hours") AND ("slot_replies"."reply" = 'declined') = (json_array_length("slot_replies"."hours") = 0)),
	CONSTRAINT "slot_replies_reason" CHECK("slot_replies"."reply" = 'confirmed' OR length(trim("slot_replies"."reason")) > 0),
	CONSTRAINT "slot_replies_behalf" CHECK("slot_replies"."is_on_behalf" IN (0, 1))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `slot_replies_act` ON `slot_replies` (`session_id`,`act_id`);--> statement-breakpoint
CREATE INDEX `slot_replies_of_station` ON `slot_replies` (`session_id`,`station_code`,`seq`);--> statement-breakpoint
CREATE TABLE `slots` (
	`offer_id` text NOT NULL,
	`station_code` text NOT NULL,
	`start_ms` integer NOT NULL,
	`end_ms` integer NOT NULL,
	`modes` text NOT NULL,
	PRIMARY KEY(`offer_id`, `station_code`),
	FOREIGN KEY (`offer_id`) REFERENCES `offers`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`station_code`) REFERENCES `stations`(`code`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "slots_span" CHECK("slots"."start_ms" < "slots"."end_ms"),
	CONSTRAINT "slots_modes" CHECK(json_valid("slots"."modes"))
) STRICT;
--> statement-breakpoint
CREATE TABLE `station_unavailability` (
	`id` text PRIMARY KEY NOT NULL,
	`station_code` text NOT NULL,
	`start_ms` integer NOT NULL,
	`end_ms` integer NOT NULL,
	`why` text NOT NULL,
	FOREIGN KEY (`station_code`) REFERENCES `stations`(`code`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "station_unavailability_span" CHECK("station_unavailability"."start_ms" < "station_unavailability"."end_ms"),
	CONSTRAINT "station_unavailability_why" CHECK(length(trim("station_unavailability"."why")) > 0)
) STRICT;
--> statement-breakpoint
CREATE INDEX `station_unavailability_by_start` ON `station_unavailability` (`station_code`,`start_ms`);--> statement-breakpoint
PRAGMA foreign_keys=OFF;--> statement-breakpoint
INSERT INTO `mode_channels` (`mode_id`, `number`, `edge_hz`, `sideband`, `polarisation`, `bandwidth_hz`, `bits`)
WITH RECURSIVE `step`(`n`) AS (SELECT 0 UNION ALL SELECT `n` + 1 FROM `step` WHERE `n` < 1023)
SELECT `id`, `n` + 1,
	`sky_hz` + `channel_bandwidth_hz` * ((`n` % `channels_per_polarisation`) - `channels_per_polarisation` / 2.0),
	'upper', CASE WHEN `n` < `channels_per_polarisation` THEN 'R' ELSE 'L' END, `channel_bandwidth_hz`, `bits`
FROM `modes` JOIN `step` ON `n` < `channels_per_polarisation` * `polarisations`;
--> statement-breakpoint
CREATE TABLE `__new_modes` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`band` text NOT NULL,
	`coherence_seconds` real,
	`tone_spacing_hz` real,
	`integration_seconds` real DEFAULT 2 NOT NULL,
	`spectral_channels` integer DEFAULT 64 NOT NULL,
	`retired_at_ms` integer,
	CONSTRAINT "modes_name" CHECK(length(trim("__new_modes"."name")) > 0),
	CONSTRAINT "modes_coherence" CHECK("__new_modes"."coherence_seconds" > 0),
	CONSTRAINT "modes_tones" CHECK("__new_modes"."tone_spacing_hz" > 0),
	CONSTRAINT "modes_correlator" CHECK("__new_modes"."integration_seconds" > 0 AND "__new_modes"."spectral_channels" >= 1)
) STRICT;
--> statement-breakpoint
INSERT INTO `__new_modes`("id", "name", "band", "coherence_seconds") SELECT "id", "name", "band", "coherence_seconds" FROM `modes`;--> statement-breakpoint
DROP TABLE `modes`;--> statement-breakpoint
ALTER TABLE `__new_modes` RENAME TO `modes`;--> statement-breakpoint
PRAGMA foreign_keys=ON;--> statement-breakpoint
CREATE UNIQUE INDEX `modes_name_unique` ON `modes` (`name`);--> statement-breakpoint
CREATE TABLE `__new_sessions` (
	`id` text PRIMARY KEY NOT NULL,
	`code` text NOT NULL,
	`title` text NOT NULL,
	`state` text NOT NULL,
	`start_ms` integer NOT NULL,
	`length_seconds` integer NOT NULL,
	`mode_id` text NOT NULL,
	`min_elevation_deg` real NOT NULL,
	`least_spare_seconds` integer NOT NULL,
	`snr_doubtful` real NOT NULL,
	`snr_fair` real NOT NULL,
	`snr_strong` real NOT NULL,
	`dut1_seconds` real DEFAULT 0 NOT NULL,
	`clock_note_hours` real DEFAULT 24 NOT NULL,
	`clock_unknown_days` real DEFAULT 7 NOT NULL,
	`instrument_sigma_seconds` real DEFAULT 5e-7 NOT NULL,
	`pair_limit_deg` real DEFAULT 3 NOT NULL,
	`pause_every_minutes` integer,
	`pause_minutes` integer,
	`finder_every_minutes` integer,
	`purpose` text DEFAULT '' NOT NULL,
	`rev` integer DEFAULT 0 NOT NULL,
	FOREIGN KEY (`mode_id`) REFERENCES `modes`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "sessions_code" CHECK("__new_sessions"."code" = upper("__new_sessions"."code") AND length(trim("__new_sessions"."code")) > 0),
	CONSTRAINT "sessions_state" CHECK("__new_sessions"."state" IN ('draft', 'offered', 'published', 'closed', 'cancelled')),
	CONSTRAINT "sessions_span" CHECK("__new_sessions"."start_ms" % 1000 = 0 AND "__new_sessions"."length_seconds" >= 1),
	CONSTRAINT "sessions_elevation" CHECK("__new_sessions"."min_elevation_deg" BETWEEN 0 AND 90),
	CONSTRAINT "sessions_spare" CHECK("__new_sessions"."least_spare_seconds" >= 0),
	CONSTRAINT "sessions_dut1" CHECK(abs("__new_sessions"."dut1_seconds") < 0.9),
	CONSTRAINT "sessions_clock" CHECK("__new_sessions"."clock_note_hours" > 0 AND "__new_sessions"."clock_unknown_days" > 0 AND "__new_sessions"."instrument_sigma_seconds" >= 0),
	CONSTRAINT "sessions_pair" CHECK("__new_sessions"."pair_limit_deg" > 0),
	CONSTRAINT "sessions_pause" CHECK(("__new_sessions"."pause_every_minutes" IS NULL) = ("__new_sessions"."pause_minutes" IS NULL) AND "__new_sessions"."pause_minutes" > 0 AND "__new_sessions"."pause_every_minutes" > "__new_sessions"."pause_minutes" AND "__new_sessions"."finder_every_minutes" > 0),
	CONSTRAINT "sessions_snr" CHECK("__new_sessions"."snr_doubtful" > 0 AND "__new_sessions"."snr_doubtful" < "__new_sessions"."snr_fair" AND "__new_sessions"."snr_fair" < "__new_sessions"."snr_strong")
) STRICT;
--> statement-breakpoint
INSERT INTO `__new_sessions`("id", "code", "title", "state", "start_ms", "length_seconds", "mode_id", "min_elevation_deg", "least_spare_seconds", "snr_doubtful", "snr_fair", "snr_strong") SELECT "id", "code", "title", "state", "start_ms", "length_seconds", "mode_id", "min_elevation_deg", "least_spare_seconds", "snr_doubtful", "snr_fair", "snr_strong" FROM `sessions`;--> statement-breakpoint
DROP TABLE `sessions`;--> statement-breakpoint
ALTER TABLE `__new_sessions` RENAME TO `sessions`;--> statement-breakpoint
CREATE UNIQUE INDEX `sessions_code_unique` ON `sessions` (`code`);--> statement-breakpoint
CREATE TABLE `__new_source_bands` (
	`source_id` text NOT NULL,
	`band` text NOT NULL,
	`flux_jy` real NOT NULL,
	`size_mas` real,
	`components` text DEFAULT '[]' NOT NULL,
	PRIMARY KEY(`source_id`, `band`),
	FOREIGN KEY (`source_id`) REFERENCES `sources`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "source_bands_flux" CHECK("__new_source_bands"."flux_jy" > 0),
	CONSTRAINT "source_bands_size" CHECK("__new_source_bands"."size_mas" > 0),
	CONSTRAINT "source_bands_components" CHECK(json_valid("__new_source_bands"."components"))
) STRICT;
--> statement-breakpoint
INSERT INTO `__new_source_bands`("source_id", "band", "flux_jy", "size_mas") SELECT "source_id", "band", "flux_jy", "size_mas" FROM `source_bands`;--> statement-breakpoint
DROP TABLE `source_bands`;--> statement-breakpoint
ALTER TABLE `__new_source_bands` RENAME TO `source_bands`;--> statement-breakpoint
CREATE TABLE `__new_sources` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`ra_deg` real NOT NULL,
	`dec_deg` real NOT NULL,
	`role` text NOT NULL,
	`aliases` text DEFAULT '[]' NOT NULL,
	`proper_motion_east_mas` real,
	`proper_motion_north_mas` real,
	`parallax_mas` real,
	`retired_at_ms` integer,
	CONSTRAINT "sources_name" CHECK(length(trim("__new_sources"."name")) > 0),
	CONSTRAINT "sources_place" CHECK("__new_sources"."ra_deg" >= 0 AND "__new_sources"."ra_deg" < 360 AND "__new_sources"."dec_deg" BETWEEN -90 AND 90),
	CONSTRAINT "sources_aliases" CHECK(json_valid("__new_sources"."aliases")),
	CONSTRAINT "sources_motion" CHECK(("__new_sources"."proper_motion_east_mas" IS NULL) = ("__new_sources"."proper_motion_north_mas" IS NULL) AND "__new_sources"."parallax_mas" >= 0),
	CONSTRAINT "sources_role" CHECK("__new_sources"."role" IN ('target', 'phase-ref', 'finder', 'polarisation'))
) STRICT;
--> statement-breakpoint
INSERT INTO `__new_sources`("id", "name", "ra_deg", "dec_deg", "role") SELECT "id", "name", "ra_deg", "dec_deg", "role" FROM `sources`;--> statement-breakpoint
DROP TABLE `sources`;--> statement-breakpoint
ALTER TABLE `__new_sources` RENAME TO `sources`;--> statement-breakpoint
CREATE UNIQUE INDEX `sources_name_unique` ON `sources` (`name`);--> statement-breakpoint
CREATE TABLE `__new_station_bands` (
	`station_code` text NOT NULL,
	`band` text NOT NULL,
	`sefd_jy` real NOT NULL,
	`feeds` text DEFAULT 'circular' NOT NULL,
	`zenith_opacity` real,
	`gain_curve` text DEFAULT '[]' NOT NULL,
	PRIMARY KEY(`station_code`, `band`),
	FOREIGN KEY (`station_code`) REFERENCES `stations`(`code`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "station_bands_sefd" CHECK("__new_station_bands"."sefd_jy" > 0),
	CONSTRAINT "station_bands_feeds" CHECK("__new_station_bands"."feeds" IN ('circular', 'linear')),
	CONSTRAINT "station_bands_opacity" CHECK("__new_station_bands"."zenith_opacity" >= 0),
	CONSTRAINT "station_bands_gain" CHECK(json_valid("__new_station_bands"."gain_curve"))
) STRICT;
--> statement-breakpoint
INSERT INTO `__new_station_bands`("station_code", "band", "sefd_jy") SELECT "station_code", "band", "sefd_jy" FROM `station_bands`;--> statement-breakpoint
DROP TABLE `station_bands`;--> statement-breakpoint
ALTER TABLE `__new_station_bands` RENAME TO `station_bands`;--> statement-breakpoint
CREATE TABLE `__new_stations` (
	`code` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`latitude_deg` real NOT NULL,
	`longitude_deg` real NOT NULL,
	`height_m` real NOT NULL,
	`position_kind` text DEFAULT 'geodetic' NOT NULL,
	`itrf_x` real,
	`itrf_y` real,
	`itrf_z` real,
	`position_sigma_m` real,
	`position_epoch` real,
	`min_elevation_deg` real NOT NULL,
	`max_elevation_deg` real NOT NULL,
	`horizon` text DEFAULT '[]' NOT NULL,
	`mount_kind` text NOT NULL,
	`axis1_min_deg` real NOT NULL,
	`axis1_max_deg` real NOT NULL,
	`axis1_rate_deg_per_s` real NOT NULL,
	`axis1_accel_deg_per_s2` real NOT NULL,
	`axis2_min_deg` real NOT NULL,
	`axis2_max_deg` real NOT NULL,
	`axis2_rate_deg_per_s` real NOT NULL,
	`axis2_accel_deg_per_s2` real NOT NULL,
	`settle_seconds` real NOT NULL,
	`bits` integer NOT NULL,
	`dish_m` real NOT NULL,
	`time_zone` text NOT NULL,
	`axis_offset_m` real DEFAULT 0 NOT NULL,
	`wrap_sectors` text DEFAULT '[]' NOT NULL,
	`pre_scan_seconds` real DEFAULT 0 NOT NULL,
	`calibration_seconds` real DEFAULT 0 NOT NULL,
	`sun_limit_deg` real,
	`max_channels` integer,
	`max_bits_per_s` real,
	`formatter` text DEFAULT '' NOT NULL,
	`recorder` text DEFAULT '' NOT NULL,
	`recorder_bits_per_s` real,
	`recorder_free_bytes` real,
	`recorder_free_at_ms` integer,
	`counter_start` text DEFAULT 'formatter' NOT NULL,
	`counter_stop` text DEFAULT 'gps' NOT NULL,
	`station_cable_seconds` real DEFAULT 0 NOT NULL,
	`gps_cable_seconds` real DEFAULT 0 NOT NULL,
	`instrument_delay_seconds` real,
	`instrument_delay_sigma_seconds` real,
	`instrument_delay_from_ms` integer,
	`stability_floor` real DEFAULT 2e-14 NOT NULL,
	`drift_per_day` real DEFAULT 1e-15 NOT NULL,
	`contacts` text DEFAULT '' NOT NULL,
	`retired_at_ms` integer,
	CONSTRAINT "stations_code" CHECK("__new_stations"."code" GLOB '[A-Za-z][A-Za-z0-9]'),
	CONSTRAINT "stations_name" CHECK(length(trim("__new_stations"."name")) > 0),
	CONSTRAINT "stations_place" CHECK(abs("__new_stations"."latitude_deg") <= 90 AND abs("__new_stations"."longitude_deg") <= 180),
	CONSTRAINT "stations_elevation" CHECK("__new_stations"."min_elevation_deg" >= 0 AND "__new_stations"."min_elevation_deg" < "__new_stations"."max_elevation_deg" AND "__new_stations"."max_elevation_deg" <= 90),
	CONSTRAINT "stations_horizon" CHECK(json_valid("__new_stations"."horizon")),
	CONSTRAINT "stations_mount" CHECK("__new_stations"."mount_kind" IN ('az-el')),
	CONSTRAINT "stations_axis1" CHECK("__new_stations"."axis1_min_deg" < "__new_stations"."axis1_max_deg"),
	CONSTRAINT "stations_axis2" CHECK("__new_stations"."axis2_min_deg" < "__new_stations"."axis2_max_deg"),
	CONSTRAINT "stations_drive" CHECK("__new_stations"."axis1_rate_deg_per_s" > 0 AND "__new_stations"."axis1_accel_deg_per_s2" > 0 AND "__new_stations"."axis2_rate_deg_per_s" > 0 AND "__new_stations"."axis2_accel_deg_per_s2" > 0),
	CONSTRAINT "stations_settle" CHECK("__new_stations"."settle_seconds" >= 0),
	CONSTRAINT "stations_bits" CHECK("__new_stations"."bits" IN (1, 2)),
	CONSTRAINT "stations_dish" CHECK("__new_stations"."dish_m" > 0),
	CONSTRAINT "stations_position" CHECK("__new_stations"."position_kind" IN ('geodetic', 'itrf') AND ("__new_stations"."position_kind" = 'itrf') = ("__new_stations"."itrf_x" IS NOT NULL AND "__new_stations"."itrf_y" IS NOT NULL AND "__new_stations"."itrf_z" IS NOT NULL)),
	CONSTRAINT "stations_position_sigma" CHECK("__new_stations"."position_sigma_m" >= 0),
	CONSTRAINT "stations_sectors" CHECK(json_valid("__new_stations"."wrap_sectors")),
	CONSTRAINT "stations_before_scan" CHECK("__new_stations"."pre_scan_seconds" >= 0 AND "__new_stations"."calibration_seconds" >= 0),
	CONSTRAINT "stations_sun" CHECK("__new_stations"."sun_limit_deg" BETWEEN 0 AND 180),
	CONSTRAINT "stations_recording" CHECK("__new_stations"."max_channels" > 0 AND "__new_stations"."max_bits_per_s" > 0 AND "__new_stations"."recorder_bits_per_s" > 0 AND "__new_stations"."recorder_free_bytes" >= 0),
	CONSTRAINT "stations_counter" CHECK("__new_stations"."counter_start" IN ('formatter', 'maser', 'gps') AND "__new_stations"."counter_stop" IN ('formatter', 'maser', 'gps') AND ("__new_stations"."counter_start" = 'gps') <> ("__new_stations"."counter_stop" = 'gps')),
	CONSTRAINT "stations_instrument" CHECK(("__new_stations"."instrument_delay_seconds" IS NULL) = ("__new_stations"."instrument_delay_sigma_seconds" IS NULL) AND "__new_stations"."instrument_delay_sigma_seconds" >= 0),
	CONSTRAINT "stations_allowance" CHECK("__new_stations"."stability_floor" > 0 AND "__new_stations"."drift_per_day" >= 0)
) STRICT;
--> statement-breakpoint
INSERT INTO `__new_stations`("code", "name", "latitude_deg", "longitude_deg", "height_m", "min_elevation_deg", "max_elevation_deg", "horizon", "mount_kind", "axis1_min_deg", "axis1_max_deg", "axis1_rate_deg_per_s", "axis1_accel_deg_per_s2", "axis2_min_deg", "axis2_max_deg", "axis2_rate_deg_per_s", "axis2_accel_deg_per_s2", "settle_seconds", "bits", "dish_m", "time_zone") SELECT "code", "name", "latitude_deg", "longitude_deg", "height_m", "min_elevation_deg", "max_elevation_deg", "horizon", "mount_kind", "axis1_min_deg", "axis1_max_deg", "axis1_rate_deg_per_s", "axis1_accel_deg_per_s2", "axis2_min_deg", "axis2_max_deg", "axis2_rate_deg_per_s", "axis2_accel_deg_per_s2", "settle_seconds", "bits", "dish_m", "time_zone" FROM `stations`;--> statement-breakpoint
DROP TABLE `stations`;--> statement-breakpoint
ALTER TABLE `__new_stations` RENAME TO `stations`;--> statement-breakpoint
CREATE UNIQUE INDEX `stations_code_any_case` ON `stations` (lower("code"));--> statement-breakpoint
CREATE TRIGGER `stations_code_stays` BEFORE UPDATE OF `code` ON `stations` WHEN NEW.`code` <> OLD.`code`
BEGIN
	SELECT RAISE(ABORT, 'the code of a station does not change');
END;
