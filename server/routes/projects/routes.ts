import { QueryTypes } from 'sequelize';
import type { Role } from '#core/api/people.ts';
import type { Project as ProjectAnswer } from '#core/api/projects.ts';
import { inTransaction } from '../../database.ts';
import type { Deps } from '../../deps.ts';
import { nameOf } from '../../middleware/caller.ts';
import { Membership, Project } from '../../models/index.ts';
import { badRequest, conflict } from '../../problem.ts';
import { audit } from '../../services/audit.ts';
import type { Handler } from '../route.ts';

const listProjects: Handler<'listProjects'> = async ({ caller, deps }) => {
  const { person } = caller;
  if (person.administrator) {
    const all = await Project.findAll({ order: ['name'] });
    return present(
      all.map((project) => ({ project, role: 'administrator' as const })),
      deps,
    );
  }
  const own = await Membership.findAll({ where: { personId: person.id }, include: 'project' });
  const found = own.map(({ project, role }) => ({ project: project!, role }));
  return present(
    found.sort((a, b) => (a.project.name < b.project.name ? -1 : 1)),
    deps,
  );
};

const showProject: Handler<'showProject'> = async ({ access, deps }) => (await present([access], deps))[0]!;

async function present(
  found: readonly { project: Project; role: Role }[],
  { sequelize }: Deps,
): Promise<ProjectAnswer[]> {
  if (found.length === 0) return [];
  // How many runs: exact where few, for nobody counts a million rows to show a number.
  const rows = await sequelize.query<{ id: number; runs: number; latest: Date | null }>(
    `SELECT p.id,
       (SELECT count(*)::int FROM (SELECT 1 FROM runs WHERE project_id = p.id LIMIT 10001) few) AS runs,
       (SELECT at FROM runs WHERE project_id = p.id ORDER BY at DESC, id DESC LIMIT 1) AS latest
     FROM projects p WHERE p.id = ANY($1)`,
    { bind: [found.map((f) => f.project.id)], type: QueryTypes.SELECT },
  );
  const byId = new Map(rows.map((row) => [row.id, row]));
  return found.map(({ project, role }) => ({
    slug: project.slug,
    name: project.name,
    role,
    runs: byId.get(project.id)?.runs ?? 0,
    latest: byId.get(project.id)?.latest?.toISOString() ?? null,
    watchedBranches: project.watchedBranches,
  }));
}

const createProject: Handler<'createProject'> = async ({ caller, body, address, deps }) => {
  const project = await inTransaction(deps.sequelize, async (transaction) => {
    if (await Project.findOne({ where: { slug: body.slug }, transaction }))
      throw conflict(
        'PROJECT_EXISTS',
        `expected a new address, found that '${body.slug}' is a project already`,
        'choose another',
      );
    const made = await Project.create({ slug: body.slug, name: body.name }, { transaction });
    const entry = { who: nameOf(caller), action: 'project.made', project: made.slug, address };
    await audit({ ...entry, what: `started the project ${made.name}` }, transaction);
    return made;
  });
  return (await present([{ project, role: 'administrator' }], deps))[0]!;
};

const changeProject: Handler<'changeProject'> = async ({ caller, access, body, address, deps }) => {
  const { project } = access;
  await inTransaction(deps.sequelize, async (transaction) => {
    await project.update({ ...body }, { transaction });
    const entry = { who: nameOf(caller), action: 'project.changed', project: project.slug, address };
    await audit({ ...entry, what: `changed ${Object.keys(body).join(' and ')}` }, transaction);
  });
  return (await present([access], deps))[0]!;
};

const removeProject: Handler<'removeProject'> = async ({ caller, access, body, address, deps }) => {
  const { project } = access;
  if (body.slug !== project.slug)
    throw badRequest(
      'REMOVAL_NOT_MEANT',
      `expected '${project.slug}' typed by hand, found '${body.slug}'`,
      'a project goes with all its runs and cannot be brought back but from a backup',
    );
  await inTransaction(deps.sequelize, async (transaction) => {
    await project.destroy({ transaction });
    const entry = { who: nameOf(caller), action: 'project.removed', project: project.slug, address };
    await audit({ ...entry, what: `removed the project ${project.name} with all its runs` }, transaction);
  });
  return null;
};

export const projectRoutes = { listProjects, showProject, createProject, changeProject, removeProject };
