import { XMLParser, XMLValidator } from 'fast-xml-parser';
import { describe, expect, it } from 'vitest';
import { boxEdges, equivalentHalfLengths } from '#core/drawing/equivalent-box.ts';
import { type DrawingInput, threeView } from '#core/drawing/three-view.ts';
import type { Vector3 } from '#core/linalg/vector3.ts';

const AXES = [
  [1, 0, 0],
  [0, 1, 0],
  [0, 0, 1],
];

/** A box of 0.4 × 0.2 × 0.1 m and 6 kg: J = m/12 (b² + c²), by hand. */
const MOMENTS = [(6 / 12) * (0.04 + 0.01), (6 / 12) * (0.16 + 0.01), (6 / 12) * (0.16 + 0.04)];

const drawing = (change: Partial<DrawingInput> = {}): DrawingInput => ({
  title: 'slab',
  state: 'nominal',
  stamp: 'ab'.repeat(32),
  on: 'basic',
  frame: { origin: 'middle', x: 'forward', y: 'left', z: 'up' },
  parts: [{ path: 'slab', cut: false, lines: boxEdges([0, 0, 0], AXES, [0.2, 0.1, 0.05]) }],
  omitted: 0,
  mass: 6,
  centre: [0, 0, 0],
  principal: { moments: MOMENTS, axes: AXES },
  limits: [],
  units: { length: { text: 'mm', factor: 0.001 }, mass: { text: 'kg', factor: 1 } },
  ...change,
});

interface Group {
  '@_aria-label': string;
  path: { '@_class'?: string; '@_d': string }[];
  rect?: { '@_class': string; '@_x': string; '@_y': string; '@_width': string; '@_height': string };
  g: { path?: { '@_d': string } | { '@_d': string }[]; circle?: { '@_cx': string; '@_cy': string } }[];
}

function views(svg: string): Map<string, Group> {
  const parsed = new XMLParser({ ignoreAttributes: false }).parse(svg) as { svg: { g: Group[] } };
  return new Map(parsed.svg.g.filter((g) => g['@_aria-label']).map((g) => [g['@_aria-label'], g]));
}

/** Width and height of what a path covers on the sheet. */
function spanOf(d: string): [number, number] {
  const points = [...d.matchAll(/[ML](-?[\d.]+) (-?[\d.]+)/g)].map(
    ([, x, y]) => [Number(x), Number(y)] as const,
  );
  const xs = points.map((p) => p[0]);
  const ys = points.map((p) => p[1]);
  return [Math.max(...xs) - Math.min(...xs), Math.max(...ys) - Math.min(...ys)];
}

const pathOf = (group: Group, name: string) => group.path.find((p) => p['@_class'] === name)!['@_d'];

describe('equivalentHalfLengths', () => {
  it('gives a uniform box back its own size', () => {
    const half = equivalentHalfLengths(6, MOMENTS);
    expect(half[0]).toBeCloseTo(0.2, 14);
    expect(half[1]).toBeCloseTo(0.1, 14);
    expect(half[2]).toBeCloseTo(0.05, 14);
  });
});

describe('threeView', () => {
  it('is well-formed, an image by role, with title and figures as its text alternative', () => {
    const svg = threeView(drawing({ title: 'a <b> & "c" \u0007' }));
    expect(XMLValidator.validate(svg)).toBe(true);
    expect(svg).toContain('role="img"');
    expect(svg).toContain('<title id="t">a &lt;b&gt; &amp; &quot;c&quot;');
    expect(/<desc id="d">([^<]*)/.exec(svg)![1]).toContain('basic mass 6.0000 kg');
  });

  it('draws all three views to one scale: 4 : 2 : 1 for a slab of that shape', () => {
    const shown = views(threeView(drawing()));
    const [topWidth, topHeight] = spanOf(pathOf(shown.get('top')!, 'box'));
    const [sideWidth, sideHeight] = spanOf(pathOf(shown.get('side')!, 'box'));
    const [frontWidth, frontHeight] = spanOf(pathOf(shown.get('front')!, 'box'));
    expect(topWidth / topHeight).toBeCloseTo(2, 3);
    expect(sideWidth / sideHeight).toBeCloseTo(4, 3);
    expect(frontWidth / frontHeight).toBeCloseTo(2, 3);
    expect(sideWidth).toBeCloseTo(topWidth, 1);
    expect(frontHeight).toBeCloseTo(sideHeight, 1);
  });

  it('puts +x to the right in top and side, +y up in the top, +z up in side and front, +y right in the front', () => {
    const point = (centre: Vector3) =>
      new Map(
        [
          ...views(threeView(drawing({ centre, principal: { moments: [0.001, 0.001, 0.001], axes: AXES } }))),
        ].map(([name, g]) => {
          const { circle } = g.g.find((inner) => inner.circle)!;
          return [name, [Number(circle!['@_cx']), Number(circle!['@_cy'])] as const];
        }),
      );
    const at = point([0, 0, 0]);
    const forward = point([0.05, 0, 0]);
    const left = point([0, 0.05, 0]);
    const up = point([0, 0, 0.02]);
    expect(forward.get('top')![0]).toBeGreaterThan(at.get('top')![0]);
    expect(forward.get('side')![0]).toBeGreaterThan(at.get('side')![0]);
    expect(forward.get('front')![0]).toBeCloseTo(at.get('front')![0], 6);
    expect(left.get('top')![1]).toBeLessThan(at.get('top')![1]);
    expect(left.get('front')![0]).toBeGreaterThan(at.get('front')![0]);
    expect(up.get('side')![1]).toBeLessThan(at.get('side')![1]);
    expect(up.get('front')![1]).toBeLessThan(at.get('front')![1]);
  });

  it('draws the allowed window of the centre to scale, around the centre when it is inside', () => {
    const svg = threeView(
      drawing({
        limits: [
          { axis: 0, min: -0.04, max: 0.02 },
          { axis: 1, min: -0.01, max: 0.01 },
        ],
      }),
    );
    const top = views(svg).get('top')!;
    const [width] = spanOf(pathOf(top, 'box'));
    // The box is 0.4 m wide, the window 0.06 m.
    expect(Number(top.rect!['@_width']) / width).toBeCloseTo(0.06 / 0.4, 3);
    const { circle } = top.g.find((inner) => inner.circle)!;
    const share = (Number(circle!['@_cx']) - Number(top.rect!['@_x'])) / Number(top.rect!['@_width']);
    expect(share).toBeCloseTo(0.04 / 0.06, 2);
    expect(svg).toContain('allowed: centre x from −40.000 to 20.000 mm');
  });

  it('keeps within the sheet, however long the words and odd the shape', () => {
    const long = 'x'.repeat(400);
    const svg = threeView(
      drawing({
        title: long,
        frame: { origin: long, x: long, y: long, z: long },
        parts: [
          {
            path: 'mast',
            cut: true,
            lines: [
              [
                [0, 0, -3],
                [0, 0, 3],
              ],
              [[0.1, 0, 0]],
            ],
          },
        ],
      }),
    );
    expect(XMLValidator.validate(svg)).toBe(true);
    const [, width, height] = /viewBox="0 0 ([\d.]+) ([\d.]+)"/.exec(svg)!;
    for (const [, x, y] of svg.matchAll(/[ML](-?[\d.]+) (-?[\d.]+)/g)) {
      expect(Number(x)).toBeGreaterThanOrEqual(0);
      expect(Number(x)).toBeLessThanOrEqual(Number(width));
      expect(Number(y)).toBeGreaterThanOrEqual(0);
      expect(Number(y)).toBeLessThanOrEqual(Number(height));
    }
  });
});
