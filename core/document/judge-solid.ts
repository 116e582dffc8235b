import type { YamlMapping, YamlValue } from '../yaml/value.ts';
import { blameKey, blameValue, isMapping, type Judge, needOne } from './judge.ts';
import { SOLIDS, type SolidKeys, type SolidName, writtenKey } from './solid-keys.ts';

/**
 * Judges a part's solid: one name, and of each group of keys exactly one.
 *
 * @returns the solid's name, if it has one
 */
export function judgeSolid(judge: Judge, solid: YamlValue | undefined): SolidName | 'particle' | undefined {
  if (!isMapping(solid)) return solid === 'particle' ? solid : undefined;
  const names = Object.keys(solid);
  if (names.length !== 1) {
    blameSolidCount(judge, solid, names);
    return undefined;
  }
  const name = names[0]!;
  if (!Object.hasOwn(SOLIDS, name)) return undefined;
  judgeKeys(judge, solid[name]!, name as SolidName);
  return name as SolidName;
}

/** Whether a solid has no volume that a density could fill. */
export function needsMass(name: SolidName | 'particle'): boolean {
  return name === 'particle' || (SOLIDS[name] as SolidKeys).needsMass === true;
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

function judgeKeys(judge: Judge, keys: YamlValue, name: SolidName): void {
  if (!isMapping(keys)) return;
  for (const group of (SOLIDS[name] as SolidKeys).needs)
    needOne(judge, keys, group.map(writtenKey), `solid '${name}'`);
  if (name === 'mesh') judgeMesh(judge, keys);
}

function judgeMesh(judge: Judge, keys: YamlMapping): void {
  if (keys.fill === 'shell' && !('thickness' in keys)) {
    blameKey(
      judge,
      { code: 'MODEL_MISSING_KEY', message: "a mesh filled as a shell needs 'thickness'" },
      keys,
      'fill',
    );
  }
  if (keys.fill !== 'shell' && 'thickness' in keys) {
    const words = {
      code: 'MODEL_KEYS_CLASH',
      message: "a mesh has 'thickness' only with 'fill: shell'",
      hint: "add 'fill: shell' or delete 'thickness'",
    };
    blameKey(judge, words, keys, 'thickness');
  }
}
