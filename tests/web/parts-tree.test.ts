import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readFigure } from '#core/figures/index.ts';
import type { PartRecord } from '#core/record/record.ts';
import {
  groupKeys,
  openRows,
  type PartNode,
  partsTree,
  printTreeColumn,
  sortTree,
} from '#web/components/run/parts-tree.ts';

const body = (mass: number) => ({
  mass,
  centre: [0, 0, 0],
  inertia: [[], [], []] as [number[], number[], number[]],
});
const part = (path: string, mass: number): PartRecord => ({
  path,
  at: { file: 'a.yaml', line: 1 },
  kind: 'box',
  cut: mass < 0,
  own: false,
  maturity: null,
  category: null,
  basis: null,
  growth: 0,
  basic: body(mass),
  predicted: body(mass * 1.1),
  share: { mass: mass / 10, xx: 0, yy: 0, zz: 0 },
  note: null,
  source: null,
});

const PARTS = [
  part('boom', 4),
  part('boom/hole', -1),
  part('tail/fin[1]', 3),
  part('tail/fin[2]', 2),
  part('loom', 2),
];
const names = (nodes: readonly PartNode[]) => nodes.map((n) => n.name);

describe('parts as a tree', () => {
  const tree = partsTree(PARTS, 'basic');
  it('groups by path; a part with children has its own solid beside them', () => {
    expect(names(tree)).toEqual(['boom', 'tail', 'loom']);
    expect(names(tree[0]!.children)).toEqual(['its own solid', 'hole']);
    expect(tree[0]!.mass).toBe(3);
    expect(tree[1]!.mass).toBe(5);
    expect(groupKeys(tree)).toEqual(['boom', 'tail']);
  });
  it('weighs on the side that is asked for', () => {
    expect(partsTree(PARTS, 'predicted')[1]!.mass).toBeCloseTo(5.5);
  });
  it('sorts every level by size, and leaves the order of the file alone where that is asked for', () => {
    expect(names(sortTree(tree, 'mass'))).toEqual(['tail', 'boom', 'loom']);
    expect(names(sortTree(tree, 'file'))).toEqual(['boom', 'tail', 'loom']);
  });
  it('hides what is under a closed node', () => {
    expect(names(openRows(tree, () => false))).toEqual(['boom', 'tail', 'loom']);
    expect(names(openRows(tree, (n) => n.key === 'tail'))).toEqual([
      'boom',
      'tail',
      'fin[1]',
      'fin[2]',
      'loom',
    ]);
  });
});

it('prints a column that adds up at every level, however the masses fall', () => {
  const mass = fc.double({ min: -50, max: 500, noNaN: true });
  fc.assert(
    fc.property(
      fc.array(fc.tuple(fc.constantFrom('a', 'b', 'a/c', 'd/e/f'), mass), { minLength: 1, maxLength: 30 }),
      (rows) => {
        const tree = partsTree(
          rows.map(([group, m], i) => part(`${group}/p${i}`, m)),
          'basic',
        );
        const total = tree.reduce((sum, n) => sum + n.mass, 0);
        const column = printTreeColumn(tree, (n) => n.mass, total, 1);
        const units = (text: string) => Math.round(readFigure(text) * 10);
        const check = (nodes: readonly PartNode[], sum: string) => {
          expect(nodes.reduce((n, node) => n + units(column.figures.get(node.key)!), 0)).toBe(units(sum));
          for (const node of nodes) {
            expect(Math.abs(readFigure(column.figures.get(node.key)!) - node.mass)).toBeLessThan(0.1000001);
            if (node.children.length > 0) check(node.children, column.figures.get(node.key)!);
          }
        };
        expect(column.notes).toEqual([]);
        check(tree, column.total);
      },
    ),
  );
});
