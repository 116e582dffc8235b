import { useOutletContext } from 'react-router-dom';
import type { Project } from '#core/api/projects.ts';

/** The project whose page this is, with your role in it; for pages under /projects/:project. */
export function useProject(): Project {
  return useOutletContext<Project>();
}
