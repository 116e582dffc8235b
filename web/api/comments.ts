import { useMutation, useQueryClient } from '@tanstack/react-query';
import { request } from './client.ts';
import { runQuery } from './run.ts';

/** Adds a comment to a run; the run is read anew. */
export function useAddComment(project: string, run: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (text: string) => request('addComment', { places: { project, run }, body: { text } }),
    onSuccess: () => client.invalidateQueries(runQuery(project, run)),
  });
}

/** Removes a comment of one's own. */
export function useRemoveComment(project: string, run: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (comment: number) =>
      request('removeComment', { places: { project, run, comment: String(comment) } }),
    onSuccess: () => client.invalidateQueries(runQuery(project, run)),
  });
}
