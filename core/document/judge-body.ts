import type { YamlValue } from '../yaml/value.ts';
import { clash, isMapping, type Judge, needOne } from './judge.ts';
import { judgeUncertain } from './judge-uncertainty.ts';

const ELEMENTS = ['xx', 'yy', 'zz', 'xy', 'xz', 'yz'] as const;

/** Judges a body: all six elements or a matrix, and uncertainties given in one way. */
export function judgeBody(judge: Judge, body: YamlValue | undefined): void {
  if (!isMapping(body)) return;
  judgeUncertain(judge, body.mass, "'mass'");
  judgeUncertain(judge, body.centre, "an item of 'centre'");
  const { inertia } = body;
  if (!isMapping(inertia)) return;
  if ('matrix' in inertia) {
    const element = ELEMENTS.find((key) => key in inertia);
    if (element !== undefined) clash(judge, inertia, 'matrix', element, "'inertia'");
    return;
  }
  const missing = ELEMENTS.filter((key) => !(key in inertia));
  if (missing.length === ELEMENTS.length) needOne(judge, inertia, ['xx', 'matrix'], "'inertia'");
  else
    for (const key of missing)
      needOne(judge, inertia, [key], "'inertia'", `write '${key}: 0' when it is zero`);
  for (const key of ELEMENTS) judgeUncertain(judge, inertia[key], `'${key}'`);
}
