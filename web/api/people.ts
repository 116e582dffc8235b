import { useQuery } from '@tanstack/react-query';
import { queryOf } from './client.ts';

export const peopleQuery = queryOf('listPeople');
export const usePeople = () => useQuery(peopleQuery);
