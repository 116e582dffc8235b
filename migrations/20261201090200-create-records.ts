import { sqlMigration } from './migration.ts';

/** Records and inputs belong to a project: whoever knows a hash learns nothing of another project's files. */
export const createRecords = sqlMigration(
  '20261201090200-create-records',
  `
  CREATE TABLE inputs (
    id         bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    project_id integer NOT NULL REFERENCES projects ON DELETE CASCADE,
    sha256     text NOT NULL CHECK (sha256 ~ '^[0-9a-f]{64}$'),
    size       bigint NOT NULL CHECK (size >= 0),
    content    bytea NOT NULL,
    created_at timestamptz NOT NULL DEFAULT now(),
    UNIQUE (project_id, sha256)
  );
  -- The content comes packed: a second packing costs time and saves nothing.
  ALTER TABLE inputs ALTER COLUMN content SET STORAGE EXTERNAL;

  CREATE TABLE records (
    id             bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    project_id     integer NOT NULL REFERENCES projects ON DELETE CASCADE,
    stamp          text NOT NULL CHECK (stamp ~ '^[0-9a-f]{64}$'),
    content_sha256 text NOT NULL,
    content        bytea NOT NULL,
    recomputation  text NOT NULL DEFAULT 'waiting'
                   CHECK (recomputation IN ('waiting', 'recomputed', 'differs', 'not recomputable')),
    recomputation_detail text,
    recomputed_at  timestamptz,
    drawing        text,
    created_at     timestamptz NOT NULL DEFAULT now(),
    UNIQUE (project_id, stamp, content_sha256)
  );
  CREATE INDEX records_waiting ON records (id) WHERE recomputation = 'waiting';
  ALTER TABLE records ALTER COLUMN content SET STORAGE EXTERNAL;

  CREATE TABLE runs (
    id           bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    project_id   integer NOT NULL REFERENCES projects ON DELETE CASCADE,
    record_id    bigint NOT NULL REFERENCES records,
    origin       text NOT NULL,
    assembly     text NOT NULL,
    state        text NOT NULL,
    branch       text NOT NULL DEFAULT '',
    verdict      text NOT NULL CHECK (verdict IN ('within', 'outside', 'unlimited')),
    at           timestamptz(3) NOT NULL DEFAULT clock_timestamp(),
    commit       text,
    tag          text,
    dirty        boolean NOT NULL DEFAULT false,
    author       text,
    person_id    integer NOT NULL REFERENCES people,
    token_id     integer REFERENCES tokens,
    judged_on    text NOT NULL CHECK (judged_on IN ('basic', 'predicted')),
    mass         double precision NOT NULL CHECK (mass < 'Infinity'),
    figures      double precision[] NOT NULL,
    nearest      text[],
    outside      text[] NOT NULL DEFAULT '{}',
    file_units   jsonb NOT NULL,
    provenance   jsonb NOT NULL,
    release      text CHECK (release IN ('asked', 'released', 'withdrawn')),
    UNIQUE (record_id, origin)
  );

  CREATE TABLE choices (
    project_id integer NOT NULL REFERENCES projects ON DELETE CASCADE,
    kind       text NOT NULL CHECK (kind IN ('assembly', 'state', 'branch')),
    value      text NOT NULL,
    PRIMARY KEY (project_id, kind, value)
  );
  `,
  'DROP TABLE choices, runs, records, inputs',
);
