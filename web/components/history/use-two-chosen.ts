import { useState } from 'react';
import type { RunRow } from '#core/api/runs.ts';
import { announce } from '#web/lib/announce.ts';
import { runName } from './run-name.ts';

/** Two runs of the list, kept over filters and pages; a third takes the place of the one chosen first. */
export function useTwoChosen() {
  const [chosen, setChosen] = useState<readonly RunRow[]>([]);
  const choose = (row: RunRow) => {
    const without = chosen.filter((c) => c.id !== row.id);
    const next = without.length < chosen.length ? without : [...chosen, row].slice(-2);
    setChosen(next);
    announce(next.length === 0 ? 'None chosen' : `Chosen: ${next.map(runName).join(' and ')}`);
  };
  return { chosen, choose };
}
