import { describe, expect, it } from 'vitest';
import { compileExpression } from '../../../core/expressions/index.ts';
import {
  ANGLE,
  dimension,
  FREQUENCY,
  getUnit,
  INERTIA,
  LENGTH,
  PLAIN,
  parseUnit,
} from '../../../core/units/index.ts';
import { FILE, faultAt, LOOKUP, MM } from './small-machine.ts';

const dimensionOf = (text: string) => compileExpression(text, null, LOOKUP, FILE).dimension;

describe('dimensions', () => {
  it.each([
    ['boom * wall', dimension(2, 0, 0, 0)],
    ['boom / wall', PLAIN],
    ['load * boom^2', INERTIA],
    ['boom^-2', dimension(-2, 0, 0, 0)],
    ['sqrt(boom * wall)', LENGTH],
    ['(boom^3)^(1/3)', LENGTH],
    ['(boom * wall)^0.5', LENGTH],
    ['(boom^49)^(1/49)', LENGTH],
    ['boom^(4 - 2)', dimension(2, 0, 0, 0)],
    ['sweep / 1 rad', PLAIN],
    ['atan2(boom, wall)', ANGLE],
    ['asin(0.5)', ANGLE],
    ['sin(sweep)', PLAIN],
    ['3 rpm / 1 rad', FREQUENCY],
    ['boom + 0', LENGTH],
    ['0 - boom', LENGTH],
    ['if(0 < boom, 0, wall)', LENGTH],
    ['abs(load) / load', PLAIN],
    ['2^n', PLAIN],
  ])('of %s', (text, expected) => {
    expect(dimensionOf(text)).toBe(expected);
  });

  it.each([
    ['boom + 3', '3'],
    ['3 + boom', '3'],
    ['boom + load', 'load'],
    ['boom - 0 g', '0 g'],
    ['boom + (1 - 1)', '(1 - 1)'],
    ['sin(30)', '30'],
    ['sin(boom)', 'boom'],
    ['asin(sweep)', 'sweep'],
    ['boom^n', 'n'],
    ['boom^0.5', 'boom^0.5'],
    ['2^boom', 'boom'],
    ['boom^1000', 'boom^1000'],
    ['sqrt(boom)', 'sqrt(boom)'],
    ['floor(boom)', 'boom'],
    ['round(sweep)', 'sweep'],
    ['min(boom, load)', 'load'],
    ['max(boom, wall, 3)', '3'],
    ['hypot(boom, load)', 'load'],
    ['atan2(boom, 1)', '1'],
    ['if(boom > 3, 1, 2)', '3'],
    ['if(boom > 3 mm, 1 mm, 2)', '2'],
    ['if(boom, 1, 2)', 'boom'],
    ['boom > wall', 'boom > wall'],
    ['1 + (boom > wall)', '(boom > wall)'],
    ['10 Hz + 3 rpm', '3 rpm'],
    ['sin(n * pi)', 'n * pi'],
    ['boom %', 'boom %'],
    ['5 mm %', '5 mm %'],
    ['boom^60 * boom^60', 'boom^60 * boom^60'],
  ])('of %s do not fit, at "%s"', (text, part) => {
    expect(faultAt(text)).toEqual(['EXPRESSION_WRONG_DIMENSION', part]);
  });

  it.each([
    ['boom * wall', MM],
    ['3 deg', MM],
    ['boom', parseUnit('g')],
    ['10 Hz', getUnit('rpm')],
    ['boom', parseUnit('mm/mm')],
  ] as const)('of %s are refused by a field of another kind', (text, field) => {
    expect(faultAt(text, field)).toEqual(['EXPRESSION_WRONG_DIMENSION', text]);
  });
});
