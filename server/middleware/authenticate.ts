import type { Request } from 'express';
import jwt from 'jsonwebtoken';
import { DataTypes, type Model, type ModelStatic, Op, QueryTypes } from 'sequelize';
import type { Deps } from '../deps.ts';
import { Person, Project, Session, Token } from '../models/index.ts';
import { ProblemError } from '../problem.ts';
import { hashSecret } from '../services/secrets.ts';
import type { Caller } from './caller.ts';

export const COOKIE = 'steelyard_session';
const MINUTE = 60_000;

/**
 * Who asks, by token or by session cookie; null where the request shows neither.
 *
 * @throws ProblemError 401 where what is shown does not hold
 */
export async function authenticate(request: Request, deps: Deps): Promise<Caller | null> {
  const header = request.get('authorization');
  if (header) return byToken(header, deps);
  const cookie = (request.cookies as Record<string, string>)[COOKIE];
  return cookie ? bySession(cookie, deps) : null;
}

async function byToken(header: string, { sequelize }: Deps): Promise<Caller> {
  const secret = /^Bearer (\S+)$/i.exec(header)?.[1];
  const token = secret ? await findToken(hashSecret(secret), sequelize) : null;
  const refuse = (found: string) =>
    new ProblemError(401, 'TOKEN_NOT_VALID', `expected a valid token, found ${found}`, {
      hint: 'make a new one on the page Tokens',
    });
  if (!token) throw refuse('one that this server does not know');
  if (token.revokedAt) throw refuse('one that was revoked');
  if (token.expiresAt.getTime() <= Date.now()) throw refuse('one that has expired');
  const person = token.person!;
  if (token.kind === 'person' && !person.active) throw refuse("one whose person's account is shut");
  if (!token.lastUsedAt || Date.now() - token.lastUsedAt.getTime() > MINUTE) await noteUse(token, sequelize);
  return { person, session: null, token };
}

/** A token with its person and project in one plain query: CI asks often, and a model's joins cost more than the rest. */
async function findToken(secretHash: string, sequelize: Deps['sequelize']): Promise<Token | null> {
  const [found] = await sequelize.query<{ token: object; person: object; project: object }>(
    `SELECT to_jsonb(t) AS token, to_jsonb(p) AS person, to_jsonb(j) AS project
     FROM tokens t JOIN people p ON p.id = t.person_id JOIN projects j ON j.id = t.project_id
     WHERE t.secret_hash = $1`,
    { bind: [secretHash], type: QueryTypes.SELECT },
  );
  if (!found) return null;
  const token = modelOf(Token, found.token);
  token.person = modelOf(Person, found.person);
  token.project = modelOf(Project, found.project);
  return token;
}

/** A model from a row as JSON: columns by their names in the table, times from text. */
function modelOf<M extends Model>(model: ModelStatic<M>, row: object): M {
  const values = Object.entries(model.getAttributes()).map(([name, { field, type }]) => {
    const value = (row as Record<string, unknown>)[field ?? name];
    return [name, type instanceof DataTypes.DATE && value !== null ? new Date(value as string) : value];
  });
  return model.build(Object.fromEntries(values), { isNewRecord: false, raw: true });
}

/** Once a minute is enough, and one of many requests at once writes it: nobody waits for a lock to say so again. */
async function noteUse({ id }: Token, sequelize: Deps['sequelize']): Promise<void> {
  await sequelize.query(
    `UPDATE tokens SET last_used_at = now() WHERE id IN (
       SELECT id FROM tokens WHERE id = $1 AND (last_used_at IS NULL OR last_used_at < now() - interval '1 minute')
       FOR UPDATE SKIP LOCKED)`,
    { bind: [id] },
  );
}

async function bySession(cookie: string, { config }: Deps): Promise<Caller | null> {
  let id: string;
  try {
    const claims = jwt.verify(cookie, config.SECRET, { algorithms: ['HS256'] });
    id = (claims as { sid: string }).sid;
  } catch {
    return null;
  }
  const session = await Session.findOne({
    where: { id, revokedAt: null, expiresAt: { [Op.gt]: new Date() } },
  });
  const person = session && (await Person.findByPk(session.personId));
  if (!session || !person?.active) return null;
  if (Date.now() - session.seenAt.getTime() > MINUTE) {
    const now = new Date();
    await Session.update({ seenAt: now }, { where: { id } });
    await Person.update({ lastSeenAt: now }, { where: { id: person.id } });
  }
  return { person, session, token: null };
}
