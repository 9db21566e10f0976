-- A calculation sheet and its events are written once. server/db/guards.ts asserts at every start that these stand.
CREATE TRIGGER `sheets_no_update` BEFORE UPDATE ON `sheets`
BEGIN SELECT RAISE(ABORT, 'a calculation sheet cannot be changed'); END;
--> statement-breakpoint
CREATE TRIGGER `sheets_no_delete` BEFORE DELETE ON `sheets`
BEGIN SELECT RAISE(ABORT, 'a calculation sheet cannot be deleted'); END;
--> statement-breakpoint
CREATE TRIGGER `sheet_events_no_update` BEFORE UPDATE ON `sheet_events`
BEGIN SELECT RAISE(ABORT, 'a sheet event cannot be changed'); END;
--> statement-breakpoint
CREATE TRIGGER `sheet_events_no_delete` BEFORE DELETE ON `sheet_events`
BEGIN SELECT RAISE(ABORT, 'a sheet event cannot be deleted'); END;
