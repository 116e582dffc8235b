import type { YamlMapping } from '../yaml/value.ts';
import { entriesOf, isMapping, type Judge } from './judge.ts';
import { judgeLimits } from './judge-limits.ts';
import { judgeParts } from './judge-parts.ts';
import { judgePlacing } from './judge-placing.ts';
import { judgeSweeps } from './judge-sweeps.ts';
import { judgeMaterial, judgeUncertain } from './judge-uncertainty.ts';

/**
 * Judges what the schema of single keys cannot: keys that go together or exclude one another, names that must
 * differ, dates. Values of a wrong shape are passed over; the schema reports them.
 */
export function judgeDocument(judge: Judge, root: YamlMapping): void {
  for (const [, parameter] of entriesOf(root.parameters)) judgeUncertain(judge, parameter, 'a parameter');
  for (const [, material] of entriesOf(root.materials)) judgeMaterial(judge, material);
  for (const [, frame] of entriesOf(root.frames)) if (isMapping(frame)) judgePlacing(judge, frame);
  judgeParts(judge, root.parts);
  judgeLimits(judge, root.limits);
  judgeSweeps(judge, root.sweeps);
}
