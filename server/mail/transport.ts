import { mkdirSync, readdirSync, readFileSync } from 'node:fs';
import { rename, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import nodemailer from 'nodemailer';
import type { Mail as MailAnswer } from '#core/api/people.ts';
import type { Config } from '../config.ts';

export interface Message {
  readonly id: string;
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  readonly headers: Readonly<Record<string, string>>;
}

export interface MailTransport {
  send(message: Message): Promise<void>;
  close(): void;
}

/** By SMTP where there is a server; else kept on disk, a file a message. */
export function openTransport(config: Config): MailTransport {
  return config.SMTP_URL ? bySmtp(config.SMTP_URL, config.MAIL_FROM) : intoFolder(config.MAIL_FOLDER);
}

function bySmtp(url: string, from: string): MailTransport {
  const transport = nodemailer.createTransport({ url, pool: true, name: 'localhost' } as never);
  return {
    send: async ({ to, subject, text, headers, id }) => {
      await transport.sendMail({
        from,
        to,
        subject,
        text,
        headers,
        messageId: `<steelyard-${id}@${hostOf(from)}>`,
      });
    },
    close: () => transport.close(),
  };
}

const hostOf = (from: string): string => /@([^>\s]+)/.exec(from)?.[1] ?? 'localhost';

function intoFolder(folder: string): MailTransport {
  return {
    send: async (message) => {
      mkdirSync(folder, { recursive: true, mode: 0o700 });
      const file = join(folder, `${message.id.padStart(12, '0')}.json`);
      await writeFile(`${file}.part`, JSON.stringify({ ...message, at: new Date().toISOString() }), {
        mode: 0o600,
      });
      await rename(`${file}.part`, file);
    },
    close: () => {},
  };
}

const SHOWN_AT_MOST = 200;

/** What a folder keeps, newest first. */
export function readMailFolder(folder: string): MailAnswer[] {
  let names: string[];
  try {
    names = readdirSync(folder);
  } catch {
    return [];
  }
  return names
    .filter((name) => name.endsWith('.json'))
    .sort()
    .reverse()
    .slice(0, SHOWN_AT_MOST)
    .map((name) => {
      const { id, at, to, subject, text } = JSON.parse(readFileSync(join(folder, name), 'utf8'));
      return { id, at, to, subject, text };
    });
}
