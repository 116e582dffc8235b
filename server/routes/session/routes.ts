import { Op } from 'sequelize';
import { inTransaction } from '../../database.ts';
import { post } from '../../mail/outbox.ts';
import { personOfStopLink } from '../../mail/stop-link.ts';
import { Person, Reset, Session } from '../../models/index.ts';
import { notFound, ProblemError } from '../../problem.ts';
import { audit } from '../../services/audit.ts';
import { checkPassword, hashPassword, isPassword } from '../../services/passwords.ts';
import { hashSecret, newSecret } from '../../services/secrets.ts';
import { clearCookie, openSession, presentSession, revokeSessions } from '../../services/sessions.ts';
import { forgiveAccount, noteAttempt } from '../../services/throttle.ts';
import type { Handler } from '../route.ts';

const RESET_MINUTES = 60;
const MINUTE = 60_000;

const showSession: Handler<'showSession'> = async ({ caller, deps }) =>
  presentSession(caller?.session ? caller.person : null, deps.config);

const signIn: Handler<'signIn'> = async ({ body, address, request, response, deps }) => {
  const email = body.email.trim().toLowerCase();
  await noteAttempt(email, address);
  const person = await Person.findOne({ where: { email } });
  const usable = person?.active ? person.passwordHash : null;
  if (!(await isPassword(body.password, usable, deps.config.PASSWORD_COST))) {
    throw new ProblemError(
      401,
      'SIGN_IN_WRONG',
      'expected an account and its password, found that they do not match',
      {
        hint: 'check both; a new password can be set by mail',
      },
    );
  }
  await forgiveAccount(email, address);
  await openSession(person!, request, response, deps.config);
  await person!.update({ lastSeenAt: new Date() });
  return presentSession(person, deps.config);
};

const signOut: Handler<'signOut'> = async ({ caller, response, deps }) => {
  await Session.update({ revokedAt: new Date() }, { where: { id: caller.session!.id } });
  clearCookie(response, deps.config);
  return null;
};

const signOutEverywhere: Handler<'signOutEverywhere'> = async ({ caller, response, deps }) => {
  await revokeSessions(caller.person.id);
  clearCookie(response, deps.config);
  return null;
};

/** The answer is the same whether there is such an account or not. */
const askReset: Handler<'askReset'> = async ({ body, deps }) => {
  const person = await Person.findOne({ where: { email: body.email.trim().toLowerCase(), active: true } });
  if (!person) return null;
  const hour = new Date(Date.now() - 60 * MINUTE);
  if ((await Reset.count({ where: { personId: person.id, createdAt: { [Op.gt]: hour } } })) >= 3) return null;
  const link = newSecret();
  await inTransaction(deps.sequelize, async (transaction) => {
    await Reset.create(
      {
        personId: person.id,
        linkHash: hashSecret(link),
        expiresAt: new Date(Date.now() + RESET_MINUTES * MINUTE),
      },
      { transaction },
    );
    const letter = {
      to: person.email,
      subject: 'A new password for Steelyard',
      text: [
        `${person.name}, someone asked for a new password for your account, you we hope.`,
        `To set it, open this link within ${RESET_MINUTES} minutes; it works once:\n${deps.config.PUBLIC_URL}/reset/${link}`,
        'If it was not you, do nothing: your password stays as it is.',
      ],
    };
    await post(letter, deps, transaction);
  });
  return null;
};

const resetPassword: Handler<'resetPassword'> = async ({ places, body, deps, address }) => {
  const linkHash = hashSecret(places.link!);
  const open = { linkHash, usedAt: null, expiresAt: { [Op.gt]: new Date() } };
  const reset = await Reset.findOne({ where: open });
  const person = reset && (await Person.findByPk(reset.personId));
  if (!reset || !person?.active) throw usedUp();
  checkPassword(body.password, person.email, person.name);
  const passwordHash = await hashPassword(body.password, deps.config.PASSWORD_COST);
  await inTransaction(deps.sequelize, async (transaction) => {
    const [taken] = await Reset.update({ usedAt: new Date() }, { where: open, transaction });
    if (taken !== 1) throw usedUp();
    await person.update({ passwordHash }, { transaction });
    // Other links that lie in the mailbox end with it.
    await Reset.update({ usedAt: new Date() }, { where: { personId: person.id, usedAt: null }, transaction });
    await revokeSessions(person.id, transaction);
    const entry = { who: person.name, action: 'password.reset', project: null, address };
    await audit({ ...entry, what: `set a new password by a link; all sessions ended` }, transaction);
  });
  return null;
};

const usedUp = () =>
  new ProblemError(
    404,
    'LINK_USED_UP',
    'expected a link that still works, found one used, expired or never made',
    {
      hint: 'ask for a new one',
    },
  );

const stopMail: Handler<'stopMail'> = async ({ places, deps }) => {
  const id = personOfStopLink(places.link!, deps.config);
  if (id === null) throw notFound('a link that stops mail');
  await Person.update({ mailLimits: false, mailReleases: false }, { where: { id } });
  return null;
};

export const sessionRoutes = {
  showSession,
  signIn,
  signOut,
  signOutEverywhere,
  askReset,
  resetPassword,
  stopMail,
};
