import type { YamlMapping } from '../yaml/value.ts';
import { blameValue, entriesOf, isMapping, type Judge } from './judge.ts';
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
  judgeStates(judge, root);
  judgeParts(judge, root.parts);
  judgeLimits(judge, root.limits);
  judgeSweeps(judge, root.sweeps);
}

/** A file that declares states has one at least; else nothing of it would ever be rolled up. */
function judgeStates(judge: Judge, root: YamlMapping): void {
  if (!isMapping(root.states) || Object.keys(root.states).length > 0) return;
  const message = "'states' has no state in it; expected at least 1";
  const hint = "give at least one, such as states: { flight: {} }, or leave 'states' out";
  blameValue(judge, { code: 'MODEL_WRONG_SHAPE', message, hint }, root, 'states');
}
