-- Held by the database itself, so that no code, import or repair can tidy them: an UPDATE, a DELETE, and the REPLACE that would be both are refused.
-- drizzle-kit rebuilds a table without its triggers and without STRICT: db/assert-database.ts refuses to serve then, and this file says what must come back.
CREATE TRIGGER `record_no_update` BEFORE UPDATE ON `record` BEGIN SELECT RAISE(ABORT, 'record is append-only: an update was refused'); END;
--> statement-breakpoint
CREATE TRIGGER `record_no_delete` BEFORE DELETE ON `record` BEGIN SELECT RAISE(ABORT, 'record is append-only: a delete was refused'); END;
--> statement-breakpoint
CREATE TRIGGER `record_no_replace` BEFORE INSERT ON `record` WHEN EXISTS (SELECT 1 FROM `record` WHERE event_id = NEW.event_id AND seq = NEW.seq OR id = NEW.id) BEGIN SELECT RAISE(ABORT, 'record is append-only: a replace was refused'); END;
--> statement-breakpoint
CREATE TRIGGER `scan_no_update` BEFORE UPDATE ON `scan` BEGIN SELECT RAISE(ABORT, 'scan is append-only: an update was refused'); END;
--> statement-breakpoint
CREATE TRIGGER `scan_no_delete` BEFORE DELETE ON `scan` BEGIN SELECT RAISE(ABORT, 'scan is append-only: a delete was refused'); END;
--> statement-breakpoint
CREATE TRIGGER `scan_no_replace` BEFORE INSERT ON `scan` WHEN EXISTS (SELECT 1 FROM `scan` WHERE id = NEW.id) BEGIN SELECT RAISE(ABORT, 'scan is append-only: a replace was refused'); END;
--> statement-breakpoint
CREATE TRIGGER `audit_no_update` BEFORE UPDATE ON `audit` BEGIN SELECT RAISE(ABORT, 'audit is append-only: an update was refused'); END;
--> statement-breakpoint
CREATE TRIGGER `audit_no_delete` BEFORE DELETE ON `audit` BEGIN SELECT RAISE(ABORT, 'audit is append-only: a delete was refused'); END;
--> statement-breakpoint
CREATE TRIGGER `audit_no_replace` BEFORE INSERT ON `audit` WHEN EXISTS (SELECT 1 FROM `audit` WHERE id = NEW.id) BEGIN SELECT RAISE(ABORT, 'audit is append-only: a replace was refused'); END;
--> statement-breakpoint
CREATE TRIGGER `declaration_no_update` BEFORE UPDATE ON `declaration` BEGIN SELECT RAISE(ABORT, 'declaration is append-only: an update was refused'); END;
--> statement-breakpoint
CREATE TRIGGER `declaration_no_delete` BEFORE DELETE ON `declaration` BEGIN SELECT RAISE(ABORT, 'declaration is append-only: a delete was refused'); END;
--> statement-breakpoint
CREATE TRIGGER `declaration_no_replace` BEFORE INSERT ON `declaration` WHEN EXISTS (SELECT 1 FROM `declaration` WHERE id = NEW.id OR entry_id = NEW.entry_id AND version = NEW.version) BEGIN SELECT RAISE(ABORT, 'declaration is append-only: a replace was refused'); END;
--> statement-breakpoint
CREATE TRIGGER `record_gapless` BEFORE INSERT ON `record` WHEN NEW.seq <> 1 + (SELECT coalesce(max(seq), 0) FROM `record` WHERE event_id = NEW.event_id) BEGIN SELECT RAISE(ABORT, 'record is numbered without gaps: another seq was expected'); END;
