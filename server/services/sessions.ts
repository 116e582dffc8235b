import { randomUUID } from 'node:crypto';
import type { Request, Response } from 'express';
import jwt from 'jsonwebtoken';
import type { Transaction } from 'sequelize';
import type { Session as SessionAnswer } from '#core/api/people.ts';
import type { Config } from '../config.ts';
import { COOKIE } from '../middleware/authenticate.ts';
import { type Person, Session } from '../models/index.ts';
import { DEMO_SIGN_INS } from './demo-sign-ins.ts';

const DAYS = 14;
const DAY = 86_400_000;

/** Signs a person in here: a row that can be revoked, and a cookie that names it. */
export async function openSession(
  person: Person,
  request: Request,
  response: Response,
  config: Config,
  transaction?: Transaction,
): Promise<void> {
  const expiresAt = new Date(Date.now() + DAYS * DAY);
  const session = await Session.create(
    {
      id: randomUUID(),
      personId: person.id,
      agent: (request.get('user-agent') ?? '').slice(0, 200),
      expiresAt,
    },
    { transaction: transaction ?? null },
  );
  const cookie = jwt.sign({ sid: session.id }, config.SECRET, { algorithm: 'HS256', expiresIn: `${DAYS}d` });
  response.cookie(COOKIE, cookie, { ...cookieOptions(config), expires: expiresAt });
}

export function clearCookie(response: Response, config: Config): void {
  response.clearCookie(COOKIE, cookieOptions(config));
}

const cookieOptions = ({ PUBLIC_URL }: Config) => ({
  httpOnly: true,
  sameSite: 'strict' as const,
  secure: PUBLIC_URL.startsWith('https:'),
  path: '/',
});

/** Ends sessions at once: the next request under them finds nobody. */
export async function revokeSessions(personId: number, transaction?: Transaction): Promise<void> {
  await Session.update(
    { revokedAt: new Date() },
    { where: { personId, revokedAt: null }, transaction: transaction ?? null },
  );
}

export const presentSession = (person: Person | null, config: Config): SessionAnswer => ({
  person: person && {
    id: person.id,
    name: person.name,
    email: person.email,
    administrator: person.administrator,
  },
  demo: config.DEMO === 'yes',
  demoSignIns: config.DEMO === 'yes' ? DEMO_SIGN_INS : [],
});
