import { netBody, netMass, sumMoments } from '../inertia/balance-sum.ts';
import type { Body } from '../inertia/body.ts';
import type { Both, Leaf } from '../rollup/tree.ts';
import { bodyRecord } from './build-record.ts';
import type { BodyRecord, GroupTotals } from './record.ts';

interface LeafBodies {
  readonly leaf: Leaf;
  readonly basic: Body;
  readonly predicted: Body;
}

/** Totals of the leaves that share a category or a basis, in the order of first appearance, nameless last. */
export function groupTotals(
  leaves: readonly LeafBodies[],
  nameOf: (leaf: Leaf) => string | null,
  total: Both<Body>,
): GroupTotals[] {
  const groups = new Map<string | null, LeafBodies[]>();
  for (const bodies of leaves) {
    const name = nameOf(bodies.leaf);
    const group = groups.get(name);
    if (group) group.push(bodies);
    else groups.set(name, [bodies]);
  }
  const named = [...groups].sort(([a], [b]) => Number(a === null) - Number(b === null));
  return named.map(([name, group]) => {
    const basic = sideTotals(group, 'basic');
    const predicted = sideTotals(group, 'predicted');
    return {
      name,
      basic,
      predicted,
      share: {
        basic: basic.mass / total.basic.mass,
        predicted: predicted.mass / total.predicted.mass,
      },
    };
  });
}

function sideTotals(group: readonly LeafBodies[], on: 'basic' | 'predicted'): BodyRecord {
  const moments = sumMoments(
    group.map((g) => (g.leaf.sign > 0 ? { material: g[on], cut: null } : { material: null, cut: g[on] })),
  );
  const net = netBody(moments);
  return net ? bodyRecord(net) : { mass: netMass(moments), centre: null, inertia: null };
}
