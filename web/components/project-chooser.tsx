import { Link } from 'react-router-dom';
import type { Project } from '#core/api/projects.ts';
import { linkTo, PATHS } from '#web/paths.ts';
import { Disclosure } from './disclosure.tsx';

/** The project one is in, and the others. */
export function ProjectChooser({ projects, current }: { projects: readonly Project[]; current: Project }) {
  return (
    <Disclosure label={current.name} name={`Project ${current.name}: choose another`}>
      {(close) => (
        <ul>
          {projects.map(({ slug, name }) => (
            <li key={slug}>
              <Link
                to={linkTo.history(slug)}
                onClick={close}
                aria-current={slug === current.slug ? 'true' : undefined}
              >
                {name}
              </Link>
            </li>
          ))}
          <li>
            <hr />
            <Link to={`${PATHS.projects}?all`} onClick={close}>
              All projects
            </Link>
          </li>
          {current.role === 'administrator' && (
            <li>
              <Link to={linkTo.settings(current.slug)} onClick={close}>
                Settings of {current.name}
              </Link>
            </li>
          )}
        </ul>
      )}
    </Disclosure>
  );
}
