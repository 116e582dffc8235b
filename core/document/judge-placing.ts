import type { YamlMapping, YamlValue } from '../yaml/value.ts';
import { clash, isMapping, itemsOf, type Judge, needOne } from './judge.ts';
import { judgeUncertain } from './judge-uncertainty.ts';

const TURNS = ['x', 'y', 'z', 'axis', 'quaternion', 'matrix'] as const;
const ROTATION_HINT =
  'write { z: 30 deg }, { axis: [1, 1, 0], angle: 20 deg }, { quaternion: [w, x, y, z] } or { matrix: … }';

/** Judges where a part or a frame stands: its place's uncertainties and each rotation's form. */
export function judgePlacing(judge: Judge, owner: YamlMapping): void {
  if (owner.at !== undefined) judgeUncertain(judge, owner.at, "an item of 'at'");
  if (owner.rotate !== undefined)
    for (const rotation of itemsOf(owner.rotate)) judgeRotation(judge, rotation);
}

function judgeRotation(judge: Judge, rotation: YamlValue): void {
  if (!isMapping(rotation)) return;
  if ('angle' in rotation && !('axis' in rotation)) {
    const other = TURNS.find((turn) => turn in rotation);
    if (other !== undefined) {
      clash(judge, rotation, other, 'angle', 'a rotation', "'angle' goes with 'axis'");
      return;
    }
    needOne(judge, rotation, ['axis'], "a rotation with 'angle'", ROTATION_HINT);
    return;
  }
  const turn = needOne(judge, rotation, TURNS, 'a rotation', ROTATION_HINT);
  if (turn === 'axis') needOne(judge, rotation, ['angle'], "a rotation with 'axis'", ROTATION_HINT);
}

/** Judges that each repeat has one form. */
export function judgeRepeat(judge: Judge, repeat: YamlValue | undefined): void {
  if (repeat === undefined) return;
  for (const one of Array.isArray(repeat) ? repeat : [repeat]) {
    if (isMapping(one))
      needOne(
        judge,
        one,
        ['line', 'ring', 'mirror'],
        'a repeat',
        'several ways of copying go in a list, in order',
      );
  }
}
