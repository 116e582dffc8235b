import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { queryOf } from './client.ts';

/** One page of the trail, newest first; `cursor` is the `next` of the page before. */
export const useAudit = (cursor: string | undefined) =>
  useQuery({ ...queryOf('listAudit', { query: { cursor } }), placeholderData: keepPreviousData });
