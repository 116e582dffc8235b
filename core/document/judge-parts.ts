import type { YamlMapping, YamlValue } from '../yaml/value.ts';
import { blameKey, blameValue, clash, isMapping, isMeant, itemsOf, type Judge } from './judge.ts';
import { judgeBody } from './judge-body.ts';
import { judgeName, judgeNamesDiffer } from './judge-name.ts';
import { judgePlacing, judgeRepeat } from './judge-placing.ts';
import { judgeSolid } from './judge-solid.ts';
import { judgeUncertain } from './judge-uncertainty.ts';

const WHAT = ['solid', 'body', 'include'] as const;
const OF_A_SOLID = ['mass', 'material', 'density', 'cut'] as const;
const OF_AN_INCLUDE = ['with', 'state'] as const;
const NOT_OF_A_CUT = ['parts', 'override'] as const;

/** Judges a list of parts and all parts in them: what the schema cannot say about keys that go together. */
export function judgeParts(judge: Judge, parts: YamlValue | undefined): void {
  const list = itemsOf(parts);
  if (list.length > 1) judgeNamesDiffer(judge, list, 'parts');
  for (const part of list) {
    if (!isMapping(part)) continue;
    judgePart(judge, part);
    if (part.parts !== undefined) judgeParts(judge, part.parts);
  }
}

function judgePart(judge: Judge, part: YamlMapping): void {
  judgeName(judge, part);
  const [what, second] = WHAT.filter((key) => key in part);
  if (what === undefined) judgeGroup(judge, part);
  else if (second !== undefined)
    clash(judge, part, what, second, 'a part', 'make a part of each, in a group');
  if (what !== 'solid') refuse(judge, part, OF_A_SOLID, 'solid', HINTS[what ?? 'group']);
  if (!('include' in part)) refuse(judge, part, OF_AN_INCLUDE, 'include');
  if ('anchor' in part && what !== 'solid' && what !== 'body') refuse(judge, part, ['anchor'], 'solid');
  judgeSolid(judge, part.solid);
  if (part.cut === 'true') refuseInCut(judge, part);
  judgeMass(judge, part);
  judgeBody(judge, part.body);
  judgePlacing(judge, part);
  judgeRepeat(judge, part.repeat);
  if (isMapping(part.override)) judgeUncertain(judge, part.override.mass, "'mass'");
}

const HINTS = {
  body: "a body's mass stands in 'body'",
  include: "an included assembly's mass is its parts'; to replace it use 'override'",
  group: "for a mass at a point write 'solid: particle'; to replace a group's mass use 'override'",
  solid: undefined,
};

function judgeGroup(judge: Judge, part: YamlMapping): void {
  if ('parts' in part || isMeant(judge, part, [...WHAT, 'parts'])) return;
  blameValue(
    judge,
    {
      code: 'MODEL_MISSING_KEY',
      message: "a part needs 'solid', 'body', 'include' or 'parts'",
      hint: "for a mass at a point write 'solid: particle'",
    },
    part,
  );
}

function refuse(judge: Judge, part: YamlMapping, keys: readonly string[], only: string, hint?: string): void {
  for (const key of keys) {
    if (!(key in part)) continue;
    const message = `'${key}' goes with '${only}', which this part has not`;
    blameKey(
      judge,
      {
        code:
          only === 'solid' && key !== 'cut' && key !== 'anchor' ? 'MODEL_MASS_MISPLACED' : 'MODEL_KEYS_CLASH',
        message,
        hint: hint ?? `add '${only}' or delete '${key}'`,
      },
      part,
      key,
    );
  }
}

function refuseInCut(judge: Judge, part: YamlMapping): void {
  for (const key of NOT_OF_A_CUT) {
    if (!(key in part)) continue;
    const message = `a cut cannot have '${key}'`;
    blameKey(
      judge,
      { code: 'MODEL_KEYS_CLASH', message, hint: `delete '${key}', or move it to the part that is cut` },
      part,
      key,
    );
  }
}

function judgeMass(judge: Judge, part: YamlMapping): void {
  judgeUncertain(judge, part.mass, "'mass'");
  judgeUncertain(judge, part.density, "'density'");
  if ('material' in part && 'density' in part) clash(judge, part, 'material', 'density', 'a part');
}
