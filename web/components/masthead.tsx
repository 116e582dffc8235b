import { Link, useLocation, useParams } from 'react-router-dom';
import type { Session } from '#core/api/people.ts';
import { useProjects } from '#web/api/projects.ts';
import { lastProject } from '#web/lib/last-project.ts';
import { linkTo, PATHS } from '#web/paths.ts';
import { AccountMenu } from './account-menu.tsx';
import { Arm } from './arm.tsx';
import { ProjectChooser } from './project-chooser.tsx';

/** The name, where one can go, who is signed in; all standing on the arm of a steelyard. */
export function Masthead({ session }: { session: Session | undefined }) {
  const { pathname } = useLocation();
  const person = session?.person ?? null;
  const projects = useProjects(person !== null).data ?? [];
  const wanted = useParams().project ?? lastProject();
  const project = projects.find(({ slug }) => slug === wanted) ?? projects[0];
  const places = person ? placesOf(project?.slug, person.administrator) : [];
  const here = places.find(({ is }) => is(pathname))?.name;
  return (
    <header className="masthead">
      <Link to={PATHS.projects} className="name">
        Steelyard
      </Link>
      <nav aria-label="Pages">
        <ul className="places">
          {places.map(({ name, to }) => (
            <li key={name}>
              <Link
                to={to}
                data-text={name}
                aria-current={name === here ? 'page' : undefined}
                data-here={name === here ? '' : undefined}
              >
                {name}
              </Link>
            </li>
          ))}
        </ul>
      </nav>
      <div className="who">
        {project && (
          <div data-here={person && here === undefined && !OF_PERSON.includes(pathname) ? 'end' : undefined}>
            <ProjectChooser projects={projects} current={project} />
          </div>
        )}
        {session && (
          <div data-here={person && OF_PERSON.includes(pathname) ? 'end' : undefined}>
            <AccountMenu session={session} />
          </div>
        )}
      </div>
      <Arm here={`${here} ${pathname} ${person?.id} ${project?.slug}`} />
    </header>
  );
}

/** Pages that belong to whoever is signed in: the poise hangs under their name. */
const OF_PERSON: readonly string[] = [PATHS.account, PATHS.mail];

interface Place {
  readonly name: string;
  readonly to: string;
  readonly is: (pathname: string) => boolean;
}

function placesOf(project: string | undefined, administrator: boolean): Place[] {
  const places: Place[] = [];
  if (project !== undefined) {
    const under = linkTo.history(project);
    places.push(
      {
        name: 'History',
        to: under,
        is: (path) => path === under || path.startsWith(`${under}/runs`) || path === `${under}/compare`,
      },
      { name: 'Upload', to: linkTo.upload(project), is: (path) => path === linkTo.upload(project) },
      {
        name: 'People',
        to: linkTo.members(project),
        is: (path) => path === linkTo.members(project) || path === PATHS.people,
      },
      { name: 'Tokens', to: linkTo.tokens(project), is: (path) => path === linkTo.tokens(project) },
    );
  } else if (administrator) {
    places.push({ name: 'People', to: PATHS.people, is: (path) => path === PATHS.people });
  }
  if (administrator) places.push({ name: 'Audit', to: PATHS.audit, is: (path) => path === PATHS.audit });
  return places;
}
