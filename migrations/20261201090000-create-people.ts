import { sqlMigration } from './migration.ts';

export const createPeople = sqlMigration(
  '20261201090000-create-people',
  `
  CREATE TABLE people (
    id            integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    email         text NOT NULL CHECK (email = lower(email) AND length(email) BETWEEN 3 AND 254),
    name          text NOT NULL CHECK (length(name) BETWEEN 1 AND 100),
    password_hash text,
    administrator boolean NOT NULL DEFAULT false,
    active        boolean NOT NULL DEFAULT true,
    mail_limits   boolean NOT NULL DEFAULT true,
    mail_releases boolean NOT NULL DEFAULT true,
    last_seen_at  timestamptz,
    created_at    timestamptz NOT NULL DEFAULT now()
  );
  CREATE UNIQUE INDEX people_email ON people (email);

  CREATE TABLE sessions (
    id         uuid PRIMARY KEY,
    person_id  integer NOT NULL REFERENCES people ON DELETE CASCADE,
    agent      text NOT NULL DEFAULT '',
    created_at timestamptz NOT NULL DEFAULT now(),
    seen_at    timestamptz NOT NULL DEFAULT now(),
    expires_at timestamptz NOT NULL,
    revoked_at timestamptz
  );
  CREATE INDEX sessions_person ON sessions (person_id);

  CREATE TABLE sign_in_failures (
    id      bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    account text NOT NULL,
    address text NOT NULL,
    at      timestamptz NOT NULL DEFAULT now()
  );
  CREATE INDEX sign_in_failures_address ON sign_in_failures (address, at);

  CREATE TABLE resets (
    id         integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    person_id  integer NOT NULL REFERENCES people ON DELETE CASCADE,
    link_hash  text NOT NULL UNIQUE,
    created_at timestamptz NOT NULL DEFAULT now(),
    expires_at timestamptz NOT NULL,
    used_at    timestamptz
  );
  CREATE INDEX resets_person ON resets (person_id);
  `,
  'DROP TABLE resets, sign_in_failures, sessions, people',
);
