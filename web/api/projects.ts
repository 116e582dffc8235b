import { useQuery } from '@tanstack/react-query';
import { queryOf } from './client.ts';

export const projectsQuery = { ...queryOf('listProjects'), staleTime: 60_000 };
export const useProjects = (enabled = true) => useQuery({ ...projectsQuery, enabled });

export const projectQuery = (project: string) => queryOf('showProject', { places: { project } });
