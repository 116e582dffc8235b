import { sqlMigration } from './migration.ts';

export const createReleases = sqlMigration(
  '20261201090400-create-releases',
  `
  CREATE TABLE releases (
    id               integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    project_id       integer NOT NULL REFERENCES projects ON DELETE CASCADE,
    run_id           bigint NOT NULL UNIQUE REFERENCES runs ON DELETE CASCADE,
    state            text NOT NULL CHECK (state IN ('asked', 'released', 'withdrawn')),
    prepared_by      integer NOT NULL REFERENCES people,
    prepared_name    text NOT NULL,
    prepared_at      timestamptz NOT NULL DEFAULT now(),
    checked_by       integer REFERENCES people,
    checked_name     text,
    checked_at       timestamptz,
    approved_by      integer REFERENCES people,
    approved_name    text,
    approved_at      timestamptz,
    reason           text,
    withdrawn_by     integer REFERENCES people,
    withdrawn_name   text,
    withdrawn_at     timestamptz,
    withdrawn_reason text,
    CHECK ((checked_by IS NULL) = (checked_at IS NULL)),
    CHECK ((approved_by IS NULL) = (approved_at IS NULL)),
    CHECK (state <> 'released' OR approved_by IS NOT NULL),
    CHECK ((state = 'withdrawn') = (withdrawn_by IS NOT NULL AND withdrawn_reason IS NOT NULL))
  );
  CREATE INDEX releases_project ON releases (project_id);

  CREATE TABLE comments (
    id         integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    project_id integer NOT NULL REFERENCES projects ON DELETE CASCADE,
    run_id     bigint NOT NULL REFERENCES runs ON DELETE CASCADE,
    person_id  integer NOT NULL REFERENCES people,
    text       text NOT NULL CHECK (length(text) BETWEEN 1 AND 4000),
    created_at timestamptz NOT NULL DEFAULT now()
  );
  CREATE INDEX comments_run ON comments (run_id);
  `,
  'DROP TABLE comments, releases',
);
