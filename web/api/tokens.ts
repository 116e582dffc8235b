import { useQuery } from '@tanstack/react-query';
import { queryOf } from './client.ts';

export const tokensQuery = (project: string) => queryOf('listTokens', { places: { project } });
export const useTokens = (project: string) => useQuery(tokensQuery(project));
