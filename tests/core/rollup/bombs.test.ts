import { describe, expect, it } from 'vitest';
import { faultsOf, placesOf, recordOfText } from '../../helpers/roll-up-text.ts';

describe('input larger than any machine', () => {
  it('is a chain of ten thousand parameters, which is followed to its end', () => {
    const links = Array.from({ length: 10_000 }, (_, i) => `  p${i + 1}: p${i} + 1 g`);
    const yaml = [
      'assembly: chain',
      'parameters:',
      ...links.reverse(),
      '  p0: 0 g',
      'parts: [ { name: p, solid: particle, mass: p10000 } ]',
    ].join('\n');
    expect(recordOfText(yaml).basic.mass).toBeCloseTo(10, 9);
  });

  it('is a circle of ten thousand parameters, told as a circle', () => {
    const links = Array.from({ length: 10_000 }, (_, i) => `  p${i}: p${(i + 1) % 10_000} + 1 g`);
    const yaml = [
      'assembly: circle',
      'parameters:',
      ...links,
      'parts: [ { name: p, solid: particle, mass: p0 } ]',
    ].join('\n');
    expect(faultsOf(yaml).map((f) => f.code)).toContain('PARAMETER_CIRCLE');
  });

  it('is repeats inside repeats, refused by count before they are laid out', () => {
    const yaml = `
      assembly: nest
      parts:
        - name: outer
          repeat: [ { line: { count: 1000, step: [ 1, 0, 0 ] } } ]
          parts:
            - name: inner
              solid: particle
              mass: 1
              repeat: [ { line: { count: 1000, step: [ 0, 1, 0 ] } } ]
    `;
    const faults = faultsOf(yaml);
    expect(placesOf(faults)).toEqual(['ASSEMBLY_TOO_LARGE 3:5']);
    expect(faults[0]!.message).toContain('found 1000000');
  });

  it('is files that include the next one twice, refused at the level that goes too far', () => {
    const level = (i: number) => `
      assembly: level ${i}
      parts: [ { name: a, include: ${i + 1}.yaml }, { name: b, include: ${i + 1}.yaml } ]
    `;
    const files: Record<string, string> = {
      '30.yaml': 'assembly: end\nparts: [ { name: p, solid: particle, mass: 1 } ]',
    };
    for (let i = 1; i < 30; i++) files[`${i}.yaml`] = level(i);
    expect(faultsOf(level(0), { files }).map((f) => f.code)).toEqual(['ASSEMBLY_TOO_LARGE']);
  });
});
