import { describe, expect, it } from 'vitest';
import { isParameterName, isReservedName } from '../../../core/expressions/index.ts';

describe('names', () => {
  it.each(['mm', 'in', 't', 'rpm', 'sqrt', 'atan2', 'if', 'pi', 'mass', 'centre', 'tilt', 'predicted'])(
    'of parameters leave out %s',
    (name) => {
      expect(isReservedName(name)).toBe(true);
    },
  );

  it.each(['boom', 'x', 'MM', 'masses', 'constructor', 'min_wall', 'PI'])(
    'of parameters may be %s',
    (name) => {
      expect(isReservedName(name)).toBe(false);
    },
  );

  it('are letters of any script, digits and underscores, a digit not first', () => {
    for (const name of ['a', '_', '_1', 'länge', 'ρ', '長さ', 'a1']) expect(isParameterName(name)).toBe(true);
    for (const name of ['', '1a', 'a-b', 'a b', 'a.b', 'a²', 'a%']) expect(isParameterName(name)).toBe(false);
  });
});
