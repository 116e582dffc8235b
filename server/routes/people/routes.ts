import { Op } from 'sequelize';
import { inTransaction } from '../../database.ts';
import { nameOf } from '../../middleware/caller.ts';
import { Membership, Person, Token } from '../../models/index.ts';
import { conflict, notFound } from '../../problem.ts';
import { audit } from '../../services/audit.ts';
import { revokeSessions } from '../../services/sessions.ts';
import { smallNumber } from '../numbers.ts';
import type { Handler } from '../route.ts';

const listPeople: Handler<'listPeople'> = async () => {
  const [people, memberships] = await Promise.all([
    Person.findAll({ order: ['name'] }),
    Membership.findAll({ include: 'project' }),
  ]);
  return people.map((person) => ({
    id: person.id,
    name: person.name,
    email: person.email,
    administrator: person.administrator,
    active: person.active,
    lastSeen: person.lastSeenAt?.toISOString() ?? null,
    projects: memberships
      .filter((m) => m.personId === person.id)
      .map(({ project, role }) => ({ project: project!.slug, role })),
  }));
};

/** The server keeps at least one administrator whose account is open. */
const changePerson: Handler<'changePerson'> = async ({ caller, places, body, address, deps }) => {
  await inTransaction(deps.sequelize, async (transaction) => {
    // Locked, so that two administrators cannot remove one another at once.
    const administrators = await Person.findAll({
      where: { administrator: true, active: true },
      order: ['id'],
      lock: transaction.LOCK.UPDATE,
      transaction,
    });
    const person = await Person.findByPk(smallNumber(places.person), { transaction });
    if (!person) throw notFound('such a person');
    const stays = (body.administrator ?? person.administrator) && (body.active ?? person.active);
    if (!stays && administrators.every((a) => a.id === person.id) && administrators.length > 0)
      throw conflict(
        'LAST_ADMINISTRATOR',
        `expected another administrator, found that ${person.name} is the last one`,
        'make someone else administrator first',
      );
    const changes: [string, string][] = [];
    if (body.administrator !== undefined && body.administrator !== person.administrator)
      changes.push(
        body.administrator
          ? ['administrator.made', `made ${person.name} administrator`]
          : ['administrator.removed', `${person.name} is no more administrator`],
      );
    if (body.active !== undefined && body.active !== person.active)
      changes.push(
        body.active
          ? ['account.opened', `opened ${person.name}'s account`]
          : ['account.shut', await shutSentence(person)],
      );
    if (changes.length === 0) return;
    await person.update({ ...body }, { transaction });
    await revokeSessions(person.id, transaction);
    if (body.active === false)
      await Token.update(
        { revokedAt: new Date() },
        { where: { personId: person.id, kind: 'person', revokedAt: null }, transaction },
      );
    for (const [action, what] of changes)
      await audit({ who: nameOf(caller), action, project: null, what, address }, transaction);
  });
  return null;
};

/** Machines go on when someone leaves: which do so by a token that this person made is said, so that it can be looked at. */
async function shutSentence({ id, name }: Person): Promise<string> {
  const where = { personId: id, kind: 'machine', revokedAt: null, expiresAt: { [Op.gt]: new Date() } };
  const left = (await Token.findAll({ where })).map((token) => token.label);
  const ended = `shut ${name}'s account; their sessions and their own tokens ended`;
  return left.length === 0
    ? ended
    : `${ended}; machines go on with tokens that they made: ${left.join(', ')}`;
}

export const peopleRoutes = { listPeople, changePerson };
