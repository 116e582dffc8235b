import { Op } from 'sequelize';
import { inTransaction } from '../../database.ts';
import { Reset, Session } from '../../models/index.ts';
import { ProblemError } from '../../problem.ts';
import { audit } from '../../services/audit.ts';
import { checkPassword, hashPassword, isPassword } from '../../services/passwords.ts';
import { openSession, revokeSessions } from '../../services/sessions.ts';
import { forgiveAccount, noteAttempt } from '../../services/throttle.ts';
import type { Handler } from '../route.ts';

const showAccount: Handler<'showAccount'> = async ({ caller }) => {
  const { person, session } = caller;
  const sessions = await Session.findAll({
    where: { personId: person.id, revokedAt: null, expiresAt: { [Op.gt]: new Date() } },
    order: [['seenAt', 'DESC']],
    limit: 50,
  });
  return {
    name: person.name,
    email: person.email,
    mail: { limits: person.mailLimits, releases: person.mailReleases },
    sessions: sessions.map((s) => ({
      since: s.createdAt.toISOString(),
      lastSeen: s.seenAt.toISOString(),
      agent: s.agent,
      here: s.id === session?.id,
    })),
  };
};

const changeAccount: Handler<'changeAccount'> = async ({ caller, body, address, deps }) => {
  const { name, mail } = body;
  const { person } = caller;
  const before = person.name;
  await inTransaction(deps.sequelize, async (transaction) => {
    const changes = {
      ...(name !== undefined && { name }),
      ...(mail && { mailLimits: mail.limits, mailReleases: mail.releases }),
    };
    await person.update(changes, { transaction });
    if (name === undefined || name === before) return;
    const entry = { who: before, action: 'account.renamed', project: null, address };
    await audit({ ...entry, what: `is called ${name} from now on` }, transaction);
  });
  return null;
};

/** All other sessions end: whoever had the old password is out. */
const changePassword: Handler<'changePassword'> = async ({
  caller,
  body,
  address,
  request,
  response,
  deps,
}) => {
  const { person } = caller;
  const { config } = deps;
  await noteAttempt(person.email, address);
  if (!(await isPassword(body.current, person.passwordHash, config.PASSWORD_COST)))
    throw new ProblemError(400, 'PASSWORD_WRONG', 'expected your password of now, found another', {
      hint: 'if you forgot it, sign out and ask for a new one by mail',
    });
  await forgiveAccount(person.email, address);
  checkPassword(body.password, person.email, person.name);
  const passwordHash = await hashPassword(body.password, config.PASSWORD_COST);
  await inTransaction(deps.sequelize, async (transaction) => {
    await person.update({ passwordHash }, { transaction });
    await revokeSessions(person.id, transaction);
    await Reset.update({ usedAt: new Date() }, { where: { personId: person.id, usedAt: null }, transaction });
    const entry = { who: person.name, action: 'password.changed', project: null, address };
    await audit({ ...entry, what: 'changed their password; other sessions ended' }, transaction);
    await openSession(person, request, response, config, transaction);
  });
  return null;
};

export const accountRoutes = { showAccount, changeAccount, changePassword };
