import type { Role } from '#core/api/people.ts';
import type { Route } from '#core/api/routes.ts';
import { Membership, Project } from '../models/index.ts';
import { notAllowed, notFound, notSignedIn, ProblemError } from '../problem.ts';
import { type Access, type Caller, hasRole } from './caller.ts';

/**
 * Whether the caller may use a route, and the project that it names.
 *
 * @returns the project and the caller's role in it; null where the route names none
 * @throws ProblemError 401, 403, or 404 where the project is none of the caller's
 */
export async function authorize(
  route: Route,
  slug: string | undefined,
  caller: Caller | null,
  demo: boolean,
): Promise<Access | null> {
  if (route.who === 'demo') {
    if (!demo) throw notFound('a page of this server');
    return null;
  }
  if (route.who === 'anyone') return null;
  if (!caller) throw notSignedIn();
  if (caller.token) checkScope(route, caller.token.scope);
  const access = slug === undefined ? null : await accessTo(slug, caller);
  if (route.who === 'person') return access;
  if (route.who === 'administrator') {
    if (!caller.person.administrator || caller.token) throw notAllowed('an administrator');
    return access;
  }
  if (!access || !hasRole(access.role, route.who))
    throw notAllowed(`the role of ${article(route.who)} in this project`);
  return access;
}

const article = (role: string): string => (/^[aeiou]/.test(role) ? `an ${role}` : `a ${role}`);

function checkScope(route: Route, scope: 'read' | 'push'): void {
  if (route.token === undefined)
    throw new ProblemError(403, 'TOKEN_NOT_ENOUGH', 'expected a signed-in person, found a token', {
      hint: 'this is done in the browser',
    });
  if (route.token === 'push' && scope !== 'push')
    throw new ProblemError(403, 'TOKEN_SCOPE', 'expected a token with the scope push, found one that reads', {
      hint: 'make a token with the scope push on the page Tokens',
    });
}

async function accessTo(slug: string, caller: Caller): Promise<Access> {
  const { token } = caller;
  // A token brings its project; there is no other that it could mean.
  const project = token ? token.project! : await Project.findOne({ where: { slug } });
  if (!project || project.slug !== slug) throw notFound(`the project '${slug}'`);
  const role = await roleIn(project, caller);
  if (!role) throw notFound(`the project '${slug}'`);
  return { project, role };
}

async function roleIn(project: Project, { person, token }: Caller): Promise<Role | null> {
  if (token?.kind === 'machine') return token.scope === 'push' ? 'engineer' : 'viewer';
  if (person.administrator) return 'administrator';
  const membership = await Membership.findOne({ where: { projectId: project.id, personId: person.id } });
  return membership?.role ?? null;
}
