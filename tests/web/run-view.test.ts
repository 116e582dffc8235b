import { describe, expect, it } from 'vitest';
import type { RollUpRecord } from '#core/record/record.ts';
import { lineAnchor, readLineAnchor } from '#web/components/run/line-anchor.ts';
import { readRunView } from '#web/components/run/run-view.ts';

const record = (growth: boolean) =>
  ({
    conventions: {
      growth,
      fileUnits: { length: 'mm', mass: 'g', angle: 'deg', density: 'g/mm^3', inertia: 'g*mm^2' },
    },
  }) as RollUpRecord;
const read = (query: string, growth = true) => readRunView(new URLSearchParams(query), record(growth));

describe('the address of a run', () => {
  it('begins with what limits are judged on, about the centre, products negative, in the units of the file', () => {
    expect(read('')).toMatchObject({
      on: 'predicted',
      about: 'centre',
      products: 'negative',
      unitsText: 'file',
    });
    expect(read('', false).on).toBe('basic');
  });
  it('says the point, the sign and the units', () => {
    const view = read('about=origin&products=positive&units=kg,m&on=basic');
    expect(view).toMatchObject({ on: 'basic', about: 'origin', products: 'positive' });
    expect(view.units.inertia).toEqual({ text: 'kg·m²', factor: 1 });
  });
  it('says what is wrong with units that are none, and shows the units of the file', () => {
    const view = read('units=furlong');
    expect(view.unitsFault).toContain('furlong');
    expect(view.units.mass.text).toBe('g');
  });
});

it('finds the line that an anchor names, whatever the path holds', () => {
  const place = { file: 'parts/half wing:2.yaml', line: 58 };
  expect(readLineAnchor(`#${encodeURI(lineAnchor(place))}`)).toEqual(place);
  expect(readLineAnchor('#limits')).toBeNull();
  expect(readLineAnchor('#line:%E0%A4%A:3')).toEqual({ file: '%E0%A4%A', line: 3 });
});
