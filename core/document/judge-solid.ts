import type { YamlMapping, YamlValue } from '../yaml/value.ts';
import { blameKey, blameValue, isMapping, type Judge } from './judge.ts';
import { judgeUncertain } from './judge-uncertainty.ts';

/** Judges that a part's solid has one name. Which keys that solid needs is judged where solids are made. */
export function judgeSolid(judge: Judge, solid: YamlValue | undefined): void {
  if (!isMapping(solid)) return;
  const names = Object.keys(solid);
  if (names.length !== 1) blameSolidCount(judge, solid, names);
  else judgeKeys(judge, names[0]!, solid[names[0]!]!);
}

function blameSolidCount(judge: Judge, solid: YamlMapping, names: readonly string[]): void {
  const hint = 'make each solid a part of its own, in a group';
  if (names.length === 0) {
    blameValue(
      judge,
      {
        code: 'MODEL_MISSING_KEY',
        message: "'solid' needs the name of a solid",
        hint: 'such as solid: { box: { size: [ 20, 10, 5 ] } }',
      },
      solid,
    );
  } else {
    const message = `'solid' has both '${names[0]}' and '${names[1]}'; a part has one solid`;
    blameKey(judge, { code: 'MODEL_KEYS_CLASH', message, hint }, solid, names[1]!);
  }
}

/** What `checkNames` of the solids cannot know of a mesh. */
function judgeMesh(judge: Judge, keys: YamlMapping): void {
  if (keys.fill === 'shell' || !('thickness' in keys)) return;
  const message = "a mesh has 'thickness' only with 'fill: shell'";
  const hint = "add 'fill: shell' or delete 'thickness'";
  blameKey(judge, { code: 'MODEL_KEYS_CLASH', message, hint }, keys, 'thickness');
}

function judgeKeys(judge: Judge, name: string, keys: YamlValue): void {
  if (!isMapping(keys)) return;
  if (name === 'mesh') judgeMesh(judge, keys);
  for (const key in keys) judgeUncertain(judge, keys[key], `'${key}'`);
}
