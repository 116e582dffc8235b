import { sqlMigration } from './migration.ts';

/** Names are written out, not referred to, so that an entry outlives what it tells of; nothing in it can be changed. */
export const createAudit = sqlMigration(
  '20261201090500-create-audit',
  `
  CREATE TABLE audit_entries (
    id      bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    at      timestamptz NOT NULL DEFAULT clock_timestamp(),
    who     text NOT NULL,
    action  text NOT NULL,
    project text,
    what    text NOT NULL,
    address text
  );
  CREATE FUNCTION refuse_change_of_audit() RETURNS trigger LANGUAGE plpgsql AS
    $$ BEGIN RAISE EXCEPTION 'audit entries stay as they are'; END $$;
  CREATE TRIGGER audit_entries_stay BEFORE UPDATE OR DELETE ON audit_entries
    FOR EACH ROW EXECUTE FUNCTION refuse_change_of_audit();
  CREATE TRIGGER audit_entries_are_not_emptied BEFORE TRUNCATE ON audit_entries
    FOR EACH STATEMENT EXECUTE FUNCTION refuse_change_of_audit();
  `,
  'DROP TABLE audit_entries; DROP FUNCTION refuse_change_of_audit',
);
