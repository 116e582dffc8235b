import { inTransaction } from '../../database.ts';
import { nameOf } from '../../middleware/caller.ts';
import { Membership, Person } from '../../models/index.ts';
import { notFound } from '../../problem.ts';
import { audit } from '../../services/audit.ts';
import { revokeSessions } from '../../services/sessions.ts';
import { smallNumber } from '../numbers.ts';
import type { Handler } from '../route.ts';

const listMembers: Handler<'listMembers'> = async ({ access }) => {
  const found = await Membership.findAll({ where: { projectId: access.project.id }, include: 'person' });
  return found
    .map(({ person, role }) => ({
      person: person!.id,
      name: person!.name,
      email: person!.email,
      role,
      active: person!.active,
    }))
    .sort((a, b) => (a.name < b.name ? -1 : 1));
};

const setMember: Handler<'setMember'> = async ({ caller, access, places, body, address, deps }) => {
  const person = await Person.findByPk(smallNumber(places.person));
  if (!person) throw notFound('such a person');
  const { project } = access;
  await inTransaction(deps.sequelize, async (transaction) => {
    await Membership.upsert({ projectId: project.id, personId: person.id, role: body.role }, { transaction });
    const entry = { who: nameOf(caller), action: 'member.role', project: project.slug, address };
    await audit({ ...entry, what: `made ${person.name} ${body.role}` }, transaction);
    // What someone sees was loaded under the old role.
    if (person.id !== caller.person.id) await revokeSessions(person.id, transaction);
  });
  return null;
};

const removeMember: Handler<'removeMember'> = async ({ caller, access, places, address, deps }) => {
  const { project } = access;
  const where = { projectId: project.id, personId: smallNumber(places.person) };
  const membership = await Membership.findOne({ where, include: 'person' });
  if (!membership) throw notFound('such a member');
  await inTransaction(deps.sequelize, async (transaction) => {
    await membership.destroy({ transaction });
    const entry = { who: nameOf(caller), action: 'member.removed', project: project.slug, address };
    await audit(
      { ...entry, what: `took ${membership.person!.name}'s role of ${membership.role} away` },
      transaction,
    );
    if (membership.personId !== caller.person.id) await revokeSessions(membership.personId, transaction);
  });
  return null;
};

export const memberRoutes = { listMembers, setMember, removeMember };
