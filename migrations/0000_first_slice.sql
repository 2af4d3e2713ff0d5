CREATE TABLE `grants` (
	`id` text PRIMARY KEY NOT NULL,
	`user_id` text NOT NULL,
	`role` text NOT NULL,
	`station_code` text,
	`session_id` text,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`station_code`) REFERENCES `stations`(`code`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`session_id`) REFERENCES `sessions`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "grants_role" CHECK("grants"."role" IN ('admin', 'scheduler', 'operator', 'correlator', 'investigator')),
	CONSTRAINT "grants_station" CHECK(("grants"."role" = 'operator') = ("grants"."station_code" IS NOT NULL)),
	CONSTRAINT "grants_session" CHECK(("grants"."role" = 'investigator') = ("grants"."session_id" IS NOT NULL))
) STRICT;
--> statement-breakpoint
CREATE INDEX `grants_of_user` ON `grants` (`user_id`);--> statement-breakpoint
CREATE TABLE `journal` (
	`seq` integer PRIMARY KEY AUTOINCREMENT NOT NULL,
	`session_id` text NOT NULL,
	`act_id` text NOT NULL,
	`user_id` text NOT NULL,
	`role` text NOT NULL,
	`at_ms` integer NOT NULL,
	`area` text NOT NULL,
	`verb` text NOT NULL,
	`kind` text NOT NULL,
	`of_seq` integer,
	`command` text NOT NULL,
	`inverse` text NOT NULL,
	`subjects` text NOT NULL,
	`tops_before` text NOT NULL,
	FOREIGN KEY (`session_id`) REFERENCES `sessions`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`of_seq`) REFERENCES `journal`(`seq`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "journal_area" CHECK("journal"."area" IN ('plan')),
	CONSTRAINT "journal_kind" CHECK("journal"."kind" IN ('do', 'undo', 'redo') AND ("journal"."kind" = 'do') = ("journal"."of_seq" IS NULL)),
	CONSTRAINT "journal_of" CHECK("journal"."of_seq" < "journal"."seq"),
	CONSTRAINT "journal_json" CHECK(json_valid("journal"."command") AND json_valid("journal"."inverse") AND json_valid("journal"."subjects") AND json_valid("journal"."tops_before"))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `journal_act` ON `journal` (`session_id`,`act_id`);--> statement-breakpoint
CREATE INDEX `journal_of_session` ON `journal` (`session_id`,`seq`);--> statement-breakpoint
CREATE INDEX `journal_of_user` ON `journal` (`session_id`,`user_id`,`seq`);--> statement-breakpoint
CREATE INDEX `journal_of_row` ON `journal` (`of_seq`,`seq`);--> statement-breakpoint
CREATE TABLE `login_sessions` (
	`id` text PRIMARY KEY NOT NULL,
	`user_id` text NOT NULL,
	`expires_at` integer NOT NULL,
	FOREIGN KEY (`user_id`) REFERENCES `users`(`id`) ON UPDATE no action ON DELETE cascade
) STRICT;
--> statement-breakpoint
CREATE INDEX `login_sessions_user` ON `login_sessions` (`user_id`);--> statement-breakpoint
CREATE TABLE `modes` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`band` text NOT NULL,
	`sky_hz` real NOT NULL,
	`channel_bandwidth_hz` real NOT NULL,
	`channels_per_polarisation` integer NOT NULL,
	`polarisations` integer NOT NULL,
	`bits` integer NOT NULL,
	`coherence_seconds` real,
	CONSTRAINT "modes_sky" CHECK("modes"."sky_hz" > 0),
	CONSTRAINT "modes_channels" CHECK("modes"."channel_bandwidth_hz" > 0 AND "modes"."channels_per_polarisation" > 0),
	CONSTRAINT "modes_polarisations" CHECK("modes"."polarisations" IN (1, 2)),
	CONSTRAINT "modes_bits" CHECK("modes"."bits" IN (1, 2)),
	CONSTRAINT "modes_coherence" CHECK("modes"."coherence_seconds" > 0)
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `modes_name_unique` ON `modes` (`name`);--> statement-breakpoint
CREATE TABLE `nodding_groups` (
	`session_id` text NOT NULL,
	`id` text NOT NULL,
	`target_id` text NOT NULL,
	`calibrator_id` text NOT NULL,
	`target_on_seconds` integer NOT NULL,
	`calibrator_on_seconds` integer NOT NULL,
	`turn_seconds` integer NOT NULL,
	`first` text NOT NULL,
	PRIMARY KEY(`session_id`, `id`),
	FOREIGN KEY (`session_id`) REFERENCES `sessions`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`target_id`) REFERENCES `sources`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`calibrator_id`) REFERENCES `sources`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "nodding_groups_pair" CHECK("nodding_groups"."target_id" <> "nodding_groups"."calibrator_id"),
	CONSTRAINT "nodding_groups_times" CHECK("nodding_groups"."target_on_seconds" >= 1 AND "nodding_groups"."calibrator_on_seconds" >= 1 AND "nodding_groups"."turn_seconds" >= 0),
	CONSTRAINT "nodding_groups_first" CHECK("nodding_groups"."first" IN ('target', 'calibrator'))
) STRICT;
--> statement-breakpoint
CREATE TABLE `scan_stations` (
	`session_id` text NOT NULL,
	`scan_id` text NOT NULL,
	`station_code` text NOT NULL,
	`late_seconds` integer NOT NULL,
	`early_seconds` integer NOT NULL,
	PRIMARY KEY(`session_id`, `scan_id`, `station_code`),
	FOREIGN KEY (`session_id`,`scan_id`) REFERENCES `scans`(`session_id`,`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`session_id`,`station_code`) REFERENCES `session_stations`(`session_id`,`station_code`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "scan_stations_times" CHECK("scan_stations"."late_seconds" >= 0 AND "scan_stations"."early_seconds" >= 0)
) STRICT;
--> statement-breakpoint
CREATE TABLE `scans` (
	`session_id` text NOT NULL,
	`id` text NOT NULL,
	`source_id` text NOT NULL,
	`mode_id` text NOT NULL,
	`start_ms` integer NOT NULL,
	`length_seconds` integer NOT NULL,
	`group_id` text,
	`leg` text,
	`comment` text DEFAULT '' NOT NULL,
	PRIMARY KEY(`session_id`, `id`),
	FOREIGN KEY (`session_id`) REFERENCES `sessions`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`source_id`) REFERENCES `sources`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`mode_id`) REFERENCES `modes`(`id`) ON UPDATE no action ON DELETE no action,
	FOREIGN KEY (`session_id`,`group_id`) REFERENCES `nodding_groups`(`session_id`,`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "scans_start" CHECK("scans"."start_ms" % 1000 = 0),
	CONSTRAINT "scans_length" CHECK("scans"."length_seconds" >= 1),
	CONSTRAINT "scans_leg" CHECK(("scans"."group_id" IS NULL) = ("scans"."leg" IS NULL)),
	CONSTRAINT "scans_leg_word" CHECK("scans"."leg" IN ('target', 'calibrator'))
) STRICT;
--> statement-breakpoint
CREATE INDEX `scans_by_start` ON `scans` (`session_id`,`start_ms`,`id`);--> statement-breakpoint
CREATE TABLE `seed_marks` (
	`name` text PRIMARY KEY NOT NULL,
	`start_ms` integer NOT NULL,
	`seeded_at_ms` integer NOT NULL
) STRICT;
--> statement-breakpoint
CREATE TABLE `session_sources` (
	`session_id` text NOT NULL,
	`source_id` text NOT NULL,
	`wanted_scans` integer NOT NULL,
	PRIMARY KEY(`session_id`, `source_id`),
	FOREIGN KEY (`session_id`) REFERENCES `sessions`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`source_id`) REFERENCES `sources`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "session_sources_wanted" CHECK("session_sources"."wanted_scans" >= 0)
) STRICT;
--> statement-breakpoint
CREATE TABLE `session_stations` (
	`session_id` text NOT NULL,
	`station_code` text NOT NULL,
	PRIMARY KEY(`session_id`, `station_code`),
	FOREIGN KEY (`session_id`) REFERENCES `sessions`(`id`) ON UPDATE no action ON DELETE cascade,
	FOREIGN KEY (`station_code`) REFERENCES `stations`(`code`) ON UPDATE no action ON DELETE no action
) STRICT;
--> statement-breakpoint
CREATE TABLE `sessions` (
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
	FOREIGN KEY (`mode_id`) REFERENCES `modes`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "sessions_code" CHECK("sessions"."code" = upper("sessions"."code") AND length(trim("sessions"."code")) > 0),
	CONSTRAINT "sessions_state" CHECK("sessions"."state" IN ('draft', 'offered', 'published', 'closed', 'cancelled')),
	CONSTRAINT "sessions_span" CHECK("sessions"."start_ms" % 1000 = 0 AND "sessions"."length_seconds" >= 1),
	CONSTRAINT "sessions_elevation" CHECK("sessions"."min_elevation_deg" BETWEEN 0 AND 90),
	CONSTRAINT "sessions_spare" CHECK("sessions"."least_spare_seconds" >= 0),
	CONSTRAINT "sessions_snr" CHECK("sessions"."snr_doubtful" > 0 AND "sessions"."snr_doubtful" < "sessions"."snr_fair" AND "sessions"."snr_fair" < "sessions"."snr_strong")
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `sessions_code_unique` ON `sessions` (`code`);--> statement-breakpoint
CREATE TABLE `source_bands` (
	`source_id` text NOT NULL,
	`band` text NOT NULL,
	`flux_jy` real NOT NULL,
	`size_mas` real,
	PRIMARY KEY(`source_id`, `band`),
	FOREIGN KEY (`source_id`) REFERENCES `sources`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "source_bands_flux" CHECK("source_bands"."flux_jy" > 0),
	CONSTRAINT "source_bands_size" CHECK("source_bands"."size_mas" > 0)
) STRICT;
--> statement-breakpoint
CREATE TABLE `sources` (
	`id` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`ra_deg` real NOT NULL,
	`dec_deg` real NOT NULL,
	`role` text NOT NULL,
	CONSTRAINT "sources_name" CHECK(length(trim("sources"."name")) > 0),
	CONSTRAINT "sources_place" CHECK("sources"."ra_deg" >= 0 AND "sources"."ra_deg" < 360 AND "sources"."dec_deg" BETWEEN -90 AND 90),
	CONSTRAINT "sources_role" CHECK("sources"."role" IN ('target', 'phase-ref', 'finder', 'polarisation'))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `sources_name_unique` ON `sources` (`name`);--> statement-breakpoint
CREATE TABLE `station_bands` (
	`station_code` text NOT NULL,
	`band` text NOT NULL,
	`sefd_jy` real NOT NULL,
	PRIMARY KEY(`station_code`, `band`),
	FOREIGN KEY (`station_code`) REFERENCES `stations`(`code`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "station_bands_sefd" CHECK("station_bands"."sefd_jy" > 0)
) STRICT;
--> statement-breakpoint
CREATE TABLE `stations` (
	`code` text PRIMARY KEY NOT NULL,
	`name` text NOT NULL,
	`latitude_deg` real NOT NULL,
	`longitude_deg` real NOT NULL,
	`height_m` real NOT NULL,
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
	CONSTRAINT "stations_code" CHECK("stations"."code" GLOB '[A-Za-z][A-Za-z0-9]'),
	CONSTRAINT "stations_name" CHECK(length(trim("stations"."name")) > 0),
	CONSTRAINT "stations_place" CHECK(abs("stations"."latitude_deg") <= 90 AND abs("stations"."longitude_deg") <= 180),
	CONSTRAINT "stations_elevation" CHECK("stations"."min_elevation_deg" >= 0 AND "stations"."min_elevation_deg" < "stations"."max_elevation_deg" AND "stations"."max_elevation_deg" <= 90),
	CONSTRAINT "stations_horizon" CHECK(json_valid("stations"."horizon")),
	CONSTRAINT "stations_mount" CHECK("stations"."mount_kind" IN ('az-el')),
	CONSTRAINT "stations_axis1" CHECK("stations"."axis1_min_deg" < "stations"."axis1_max_deg"),
	CONSTRAINT "stations_axis2" CHECK("stations"."axis2_min_deg" < "stations"."axis2_max_deg"),
	CONSTRAINT "stations_drive" CHECK("stations"."axis1_rate_deg_per_s" > 0 AND "stations"."axis1_accel_deg_per_s2" > 0 AND "stations"."axis2_rate_deg_per_s" > 0 AND "stations"."axis2_accel_deg_per_s2" > 0),
	CONSTRAINT "stations_settle" CHECK("stations"."settle_seconds" >= 0),
	CONSTRAINT "stations_bits" CHECK("stations"."bits" IN (1, 2)),
	CONSTRAINT "stations_dish" CHECK("stations"."dish_m" > 0)
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `stations_code_any_case` ON `stations` (lower("code"));--> statement-breakpoint
CREATE TABLE `subjects` (
	`session_id` text NOT NULL,
	`id` text NOT NULL,
	`rev` integer NOT NULL,
	`top` integer NOT NULL,
	PRIMARY KEY(`session_id`, `id`),
	FOREIGN KEY (`session_id`) REFERENCES `sessions`(`id`) ON UPDATE no action ON DELETE no action,
	CONSTRAINT "subjects_rev" CHECK("subjects"."rev" >= 0 AND "subjects"."top" >= 0 AND "subjects"."top" <= "subjects"."rev")
) STRICT;
--> statement-breakpoint
CREATE TABLE `users` (
	`id` text PRIMARY KEY NOT NULL,
	`email` text NOT NULL,
	`password_hash` text NOT NULL,
	`theme` text,
	`is_demo` integer DEFAULT false NOT NULL,
	CONSTRAINT "users_email" CHECK("users"."email" = lower("users"."email") AND "users"."email" LIKE '_%@_%'),
	CONSTRAINT "users_theme" CHECK("users"."theme" IN ('day', 'night')),
	CONSTRAINT "users_demo" CHECK("users"."is_demo" IN (0, 1))
) STRICT;
--> statement-breakpoint
CREATE UNIQUE INDEX `users_email_unique` ON `users` (`email`);