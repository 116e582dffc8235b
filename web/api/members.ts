import { useQuery } from '@tanstack/react-query';
import { queryOf } from './client.ts';

export const membersQuery = (project: string) => queryOf('listMembers', { places: { project } });
export const useMembers = (project: string) => useQuery(membersQuery(project));

export const invitationsQuery = (project: string) => queryOf('listInvitations', { places: { project } });
export const useInvitations = (project: string) => useQuery(invitationsQuery(project));
