import { useQuery } from '@tanstack/react-query';
import { queryOf } from './client.ts';

/** Mail that the demo kept, looked for anew every few seconds. */
export const useDemoMail = () =>
  useQuery({ ...queryOf('listDemoMail'), refetchInterval: 5000, staleTime: 0 });
