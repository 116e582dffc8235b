import { useMutation, useQueryClient } from '@tanstack/react-query';
import { request } from './client.ts';

export type ReleaseAct =
  | { act: 'ask' }
  | { act: 'check' }
  | { act: 'release'; reason?: string }
  | { act: 'withdraw'; reason: string };

/** Asks for a release, marks as checked, releases or withdraws; every view of the project's runs is read anew. */
export function useReleaseAct(project: string, run: string) {
  const client = useQueryClient();
  const places = { project, run };
  return useMutation({
    mutationFn: (what: ReleaseAct) => {
      if (what.act === 'ask') return request('askForRelease', { places });
      if (what.act === 'check') return request('markAsChecked', { places });
      if (what.act === 'release')
        return request('releaseRun', { places, body: what.reason ? { reason: what.reason } : {} });
      return request('withdrawRelease', { places, body: { reason: what.reason } });
    },
    onSuccess: () =>
      Promise.all(
        (['showRun', 'listRuns', 'showTrend', 'compareRuns'] as const).map((name) =>
          client.invalidateQueries({ queryKey: [name] }),
        ),
      ),
  });
}
