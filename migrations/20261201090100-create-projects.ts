import { sqlMigration } from './migration.ts';

export const createProjects = sqlMigration(
  '20261201090100-create-projects',
  `
  CREATE TYPE member_role AS ENUM ('viewer', 'engineer', 'approver');

  CREATE TABLE projects (
    id               integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    slug             text NOT NULL UNIQUE CHECK (slug ~ '^[a-z0-9]([a-z0-9-]{0,58}[a-z0-9])?$'),
    name             text NOT NULL CHECK (length(name) BETWEEN 1 AND 100),
    watched_branches text[] NOT NULL DEFAULT '{main}',
    created_at       timestamptz NOT NULL DEFAULT now()
  );

  CREATE TABLE memberships (
    project_id integer NOT NULL REFERENCES projects ON DELETE CASCADE,
    person_id  integer NOT NULL REFERENCES people ON DELETE CASCADE,
    role       member_role NOT NULL,
    created_at timestamptz NOT NULL DEFAULT now(),
    PRIMARY KEY (project_id, person_id)
  );
  CREATE INDEX memberships_person ON memberships (person_id);

  CREATE TABLE invitations (
    id         integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    project_id integer NOT NULL REFERENCES projects ON DELETE CASCADE,
    email      text NOT NULL CHECK (email = lower(email)),
    role       member_role NOT NULL,
    invited_by integer NOT NULL REFERENCES people,
    link_hash  text NOT NULL UNIQUE,
    created_at timestamptz NOT NULL DEFAULT now(),
    expires_at timestamptz NOT NULL,
    used_at    timestamptz
  );
  CREATE INDEX invitations_project ON invitations (project_id);

  CREATE TABLE tokens (
    id           integer GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    project_id   integer NOT NULL REFERENCES projects ON DELETE CASCADE,
    person_id    integer NOT NULL REFERENCES people,
    kind         text NOT NULL CHECK (kind IN ('person', 'machine')),
    label        text NOT NULL CHECK (length(label) BETWEEN 1 AND 100),
    scope        text NOT NULL CHECK (scope IN ('read', 'push')),
    secret_hash  text NOT NULL UNIQUE,
    created_at   timestamptz NOT NULL DEFAULT now(),
    expires_at   timestamptz NOT NULL,
    last_used_at timestamptz,
    revoked_at   timestamptz
  );
  CREATE INDEX tokens_project ON tokens (project_id);
  CREATE INDEX tokens_person ON tokens (person_id);
  `,
  'DROP TABLE tokens, invitations, memberships, projects; DROP TYPE member_role',
);
