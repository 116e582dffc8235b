import { useQuery } from '@tanstack/react-query';
import { queryOf } from './client.ts';

export const accountQuery = queryOf('showAccount');
export const useAccount = () => useQuery(accountQuery);
