import { sqlMigration } from './migration.ts';

export const createMail = sqlMigration(
  '20261201090600-create-mail',
  `
  CREATE TABLE mails (
    id         bigint GENERATED ALWAYS AS IDENTITY PRIMARY KEY,
    recipient  text NOT NULL,
    subject    text NOT NULL,
    text       text NOT NULL,
    headers    jsonb NOT NULL DEFAULT '{}',
    created_at timestamptz NOT NULL DEFAULT now(),
    sent_at    timestamptz,
    failure    text
  );
  CREATE INDEX mails_unsent ON mails (id) WHERE sent_at IS NULL;
  `,
  'DROP TABLE mails',
);
