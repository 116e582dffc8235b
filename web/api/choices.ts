import { queryOf } from './client.ts';

/** What the history can be filtered by. */
export const choicesQuery = (project: string) => queryOf('listChoices', { places: { project } });
