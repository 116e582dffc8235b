import { Op } from 'sequelize';
import type { Invitation as InvitationAnswer } from '#core/api/people.ts';
import { inTransaction } from '../../database.ts';
import { post } from '../../mail/outbox.ts';
import { nameOf } from '../../middleware/caller.ts';
import { Invitation, Membership, Person } from '../../models/index.ts';
import { badRequest, conflict, notFound, ProblemError } from '../../problem.ts';
import { audit } from '../../services/audit.ts';
import { checkPassword, hashPassword } from '../../services/passwords.ts';
import { hashSecret, newSecret } from '../../services/secrets.ts';
import { openSession, presentSession } from '../../services/sessions.ts';
import { smallNumber } from '../numbers.ts';
import type { Handler } from '../route.ts';

const DAYS = 7;
const DAY = 86_400_000;

const listInvitations: Handler<'listInvitations'> = async ({ access }) => {
  const found = await Invitation.findAll({
    where: { projectId: access.project.id, usedAt: null },
    include: 'inviter',
    order: [['createdAt', 'DESC']],
  });
  return found.map(present);
};

const present = (invitation: Invitation): InvitationAnswer => ({
  id: invitation.id,
  email: invitation.email,
  role: invitation.role,
  invitedBy: invitation.inviter?.name ?? '',
  at: invitation.createdAt.toISOString(),
  expiresAt: invitation.expiresAt.toISOString(),
  state: invitation.expiresAt.getTime() > Date.now() ? 'open' : 'expired',
});

const invite: Handler<'invite'> = async ({ caller, access, body, address, deps }) => {
  const email = body.email.toLowerCase();
  const { project } = access;
  const person = await Person.findOne({ where: { email } });
  if (person && (await Membership.findOne({ where: { projectId: project.id, personId: person.id } })))
    throw conflict(
      'MEMBER_ALREADY',
      `expected someone new, found that ${person.name} works in ${project.name}`,
      'change the role in the list',
    );
  const link = newSecret();
  return inTransaction(deps.sequelize, async (transaction) => {
    // A second invitation takes the first one's place.
    await Invitation.destroy({ where: { projectId: project.id, email, usedAt: null }, transaction });
    const invitation = await Invitation.create(
      {
        projectId: project.id,
        email,
        role: body.role,
        invitedBy: caller.person.id,
        linkHash: hashSecret(link),
        expiresAt: new Date(Date.now() + DAYS * DAY),
      },
      { transaction },
    );
    const letter = {
      to: email,
      subject: `${caller.person.name} invites you to ${project.name} on Steelyard`,
      text: [
        `${caller.person.name} invites you to the project ${project.name} as ${body.role}.`,
        `To accept, open this link within ${DAYS} days; it works once:\n${deps.config.PUBLIC_URL}/invitation/${link}`,
        'If you do not know what this is about, do nothing.',
      ],
    };
    await post(letter, deps, transaction);
    const entry = { who: nameOf(caller), action: 'invitation.made', project: project.slug, address };
    await audit({ ...entry, what: `invited ${email} as ${body.role}` }, transaction);
    invitation.inviter = caller.person;
    return present(invitation);
  });
};

const withdrawInvitation: Handler<'withdrawInvitation'> = async ({
  caller,
  access,
  places,
  address,
  deps,
}) => {
  await inTransaction(deps.sequelize, async (transaction) => {
    const where = { id: smallNumber(places.invitation), projectId: access.project.id, usedAt: null };
    const invitation = await Invitation.findOne({ where, transaction });
    if (!invitation) throw notFound('an open invitation');
    await invitation.destroy({ transaction });
    const entry = {
      who: nameOf(caller),
      action: 'invitation.withdrawn',
      project: access.project.slug,
      address,
    };
    await audit({ ...entry, what: `withdrew the invitation of ${invitation.email}` }, transaction);
  });
  return null;
};

async function openInvitation(link: string): Promise<{ invitation: Invitation; person: Person | null }> {
  const where = { linkHash: hashSecret(link), usedAt: null, expiresAt: { [Op.gt]: new Date() } };
  const invitation = await Invitation.findOne({ where, include: 'project' });
  if (!invitation)
    throw new ProblemError(
      404,
      'LINK_USED_UP',
      'expected a link that still works, found one used, expired, withdrawn or never made',
      {
        hint: 'ask an administrator to invite you again',
      },
    );
  return { invitation, person: await Person.findOne({ where: { email: invitation.email } }) };
}

const showInvitation: Handler<'showInvitation'> = async ({ places }) => {
  const { invitation, person } = await openInvitation(places.link!);
  return {
    email: invitation.email,
    project: invitation.project!.name,
    role: invitation.role,
    hasAccount: Boolean(person?.passwordHash),
  };
};

/** Whoever has the link has the mailbox. Someone with an account takes the role; their password stays as it is. */
const acceptInvitation: Handler<'acceptInvitation'> = async ({
  places,
  body,
  address,
  request,
  response,
  deps,
}) => {
  const { invitation, person: known } = await openInvitation(places.link!);
  const hasAccount = Boolean(known?.passwordHash);
  if (known && !known.active) throw notFound('an account that is open');
  let passwordHash: string | null = null;
  if (!hasAccount) {
    if (!body.name || !body.password)
      throw badRequest('INVITATION_INCOMPLETE', 'expected a name and a password', 'fill in both');
    checkPassword(body.password, invitation.email, body.name);
    passwordHash = await hashPassword(body.password, deps.config.PASSWORD_COST);
  }
  const person = await inTransaction(deps.sequelize, async (transaction) => {
    const [taken] = await Invitation.update(
      { usedAt: new Date() },
      { where: { id: invitation.id, usedAt: null }, transaction },
    );
    if (taken !== 1) throw notFound('an open invitation');
    const someone =
      known ??
      (await Person.create({ email: invitation.email, name: body.name!, passwordHash }, { transaction }));
    if (known && !hasAccount) await known.update({ name: body.name!, passwordHash }, { transaction });
    await Membership.upsert(
      { projectId: invitation.projectId, personId: someone.id, role: invitation.role },
      { transaction },
    );
    const entry = {
      who: someone.name,
      action: 'invitation.accepted',
      project: invitation.project!.slug,
      address,
    };
    await audit({ ...entry, what: `joined as ${invitation.role}` }, transaction);
    return someone;
  });
  // With an account already there, the link alone does not sign in: the password does.
  if (hasAccount) return presentSession(null, deps.config);
  await openSession(person, request, response, deps.config);
  return presentSession(person, deps.config);
};

export const invitationRoutes = {
  listInvitations,
  invite,
  withdrawInvitation,
  showInvitation,
  acceptInvitation,
};
