import type { Token as TokenAnswer } from '#core/api/people.ts';
import { inTransaction } from '../../database.ts';
import { type Access, type Caller, hasRole, nameOf } from '../../middleware/caller.ts';
import { Token } from '../../models/index.ts';
import { notFound } from '../../problem.ts';
import { audit } from '../../services/audit.ts';
import { hashSecret, newSecret } from '../../services/secrets.ts';
import { smallNumber } from '../numbers.ts';
import type { Handler } from '../route.ts';

const DAY = 86_400_000;

const listTokens: Handler<'listTokens'> = async ({ caller, access }) => {
  const found = await Token.findAll({
    where: { projectId: access.project.id },
    include: 'person',
    order: [['createdAt', 'DESC']],
  });
  return found
    .filter((token) => isVisible(token, caller, access))
    .map((token) => present(token, caller, access));
};

/** One's own; machines' for those who may make them; all for an administrator. */
const isVisible = (token: Token, caller: Caller, { role }: Access): boolean =>
  token.personId === caller.person.id ||
  role === 'administrator' ||
  (token.kind === 'machine' && hasRole(role, 'engineer'));

const mayRevoke = (token: Token, caller: Caller, { role }: Access): boolean =>
  token.personId === caller.person.id || role === 'administrator';

const present = (token: Token, caller: Caller, access: Access): TokenAnswer => ({
  id: token.id,
  kind: token.kind,
  label: token.label,
  owner: token.person!.name,
  scope: token.scope,
  createdAt: token.createdAt.toISOString(),
  expiresAt: token.expiresAt.toISOString(),
  lastUsedAt: token.lastUsedAt?.toISOString() ?? null,
  revokedAt: token.revokedAt?.toISOString() ?? null,
  mayRevoke: token.revokedAt === null && mayRevoke(token, caller, access),
});

const createToken: Handler<'createToken'> = async ({ caller, access, body, address, deps }) => {
  const secret = `steelyard_${newSecret()}`;
  const token = await inTransaction(deps.sequelize, async (transaction) => {
    const made = await Token.create(
      {
        projectId: access.project.id,
        personId: caller.person.id,
        kind: body.kind,
        label: body.label,
        scope: body.scope,
        secretHash: hashSecret(secret),
        expiresAt: new Date(Date.now() + body.days * DAY),
      },
      { transaction },
    );
    const entry = { who: nameOf(caller), action: 'token.made', project: access.project.slug, address };
    const what = `made the token ${body.label} (${body.kind}, ${body.scope}, ${body.days} days)`;
    await audit({ ...entry, what }, transaction);
    return made;
  });
  token.person = caller.person;
  return { token: present(token, caller, access), secret };
};

const revokeToken: Handler<'revokeToken'> = async ({ caller, access, places, address, deps }) => {
  const token = await Token.findOne({
    where: { id: smallNumber(places.token), projectId: access.project.id },
  });
  if (!token || !mayRevoke(token, caller, access)) throw notFound('a token that you may revoke');
  await inTransaction(deps.sequelize, async (transaction) => {
    const [ended] = await Token.update(
      { revokedAt: new Date() },
      { where: { id: token.id, revokedAt: null }, transaction },
    );
    if (ended === 0) return;
    const entry = { who: nameOf(caller), action: 'token.revoked', project: access.project.slug, address };
    await audit({ ...entry, what: `revoked the token ${token.label}` }, transaction);
  });
  return null;
};

export const tokenRoutes = { listTokens, createToken, revokeToken };
