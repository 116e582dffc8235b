import { decimalsFor, printAddingColumn } from '#core/figures/index.ts';
import type { PartRecord } from '#core/record/record.ts';

export const SHARES = ['mass', 'xx', 'yy', 'zz'] as const;
export type Share = (typeof SHARES)[number];

/** A part, or a group of parts under one path; what it weighs is what its leaves weigh together. */
export interface PartNode {
  /** Unique: the path, with `/` after it for a part's own solid beside its children. */
  readonly key: string;
  /** The last piece of the path; what a part is by itself beside its children is its own solid. */
  readonly name: string;
  readonly depth: number;
  /** The part that stands here, if any: a group has none. */
  readonly part: PartRecord | null;
  readonly children: PartNode[];
  /** [kg] on the side that was asked for. */
  readonly mass: number;
  /** Of the predicted total. */
  readonly share: Record<Share, number>;
}

interface Branch {
  name: string;
  path: string;
  part: PartRecord | null;
  children: Map<string, Branch>;
}

/** Paths as a tree in the order of the file; a part with children has its own solid as their first sibling. */
export function partsTree(parts: readonly PartRecord[], on: 'basic' | 'predicted'): PartNode[] {
  const root: Branch = { name: '', path: '', part: null, children: new Map() };
  for (const part of parts) {
    let at = root;
    for (const name of part.path.split('/')) {
      let next = at.children.get(name);
      if (!next) {
        next = { name, path: at.path === '' ? name : `${at.path}/${name}`, part: null, children: new Map() };
        at.children.set(name, next);
      }
      at = next;
    }
    at.part = part;
  }
  return [...root.children.values()].map((branch) => nodeOf(branch, 0, on));
}

function nodeOf(branch: Branch, depth: number, on: 'basic' | 'predicted'): PartNode {
  const { part, name, path } = branch;
  if (branch.children.size === 0) return leaf(part!, path, name, depth, on);
  const children = [...branch.children.values()].map((child) => nodeOf(child, depth + 1, on));
  if (part) children.unshift(leaf(part, `${path}/`, 'its own solid', depth + 1, on));
  const sum = (pick: (node: PartNode) => number) => children.reduce((total, node) => total + pick(node), 0);
  return {
    key: path,
    name,
    depth,
    part: null,
    children,
    mass: sum((n) => n.mass),
    share: {
      mass: sum((n) => n.share.mass),
      xx: sum((n) => n.share.xx),
      yy: sum((n) => n.share.yy),
      zz: sum((n) => n.share.zz),
    },
  };
}

const leaf = (
  part: PartRecord,
  key: string,
  name: string,
  depth: number,
  on: 'basic' | 'predicted',
): PartNode => ({ key, name, depth, part, children: [], mass: part[on].mass, share: part.share });

/** `file` keeps the order of the file; the others put the largest first, cut-outs by what they take away. */
export type PartsSort = 'file' | Share;

export function sortTree(nodes: readonly PartNode[], sort: PartsSort): PartNode[] {
  const sorted = nodes.map((node) => ({ ...node, children: sortTree(node.children, sort) }));
  if (sort === 'file') return sorted;
  return sorted.sort((a, b) => Math.abs(b.share[sort]) - Math.abs(a.share[sort]));
}

/** The rows that are seen: a closed node hides what is under it. */
export function openRows(nodes: readonly PartNode[], isOpen: (node: PartNode) => boolean): PartNode[] {
  return nodes.flatMap((node) =>
    node.children.length > 0 && isOpen(node) ? [node, ...openRows(node.children, isOpen)] : [node],
  );
}

/** Every group and part that has something under it. */
export const groupKeys = (nodes: readonly PartNode[]): string[] =>
  nodes.flatMap((node) => (node.children.length > 0 ? [node.key, ...groupKeys(node.children)] : []));

/** A printed column by node, with its total. */
export interface TreeColumn {
  readonly figures: ReadonlyMap<string, string>;
  readonly total: string;
  readonly notes: readonly string[];
}

/**
 * Prints a column so that at every level the figures under a node add up to the node's own, and those at the top to
 * the total. From the top down: each printed figure is the total of the column under it.
 *
 * @param pick the value of a node in the printed unit
 */
export function printTreeColumn(
  nodes: readonly PartNode[],
  pick: (node: PartNode) => number,
  total: number,
  decimals = decimalsFor([total]),
): TreeColumn {
  const figures = new Map<string, string>();
  const notes = new Set<string>();
  const print = (level: readonly PartNode[], sum: number): string => {
    const column = printAddingColumn(level.map(pick), sum, decimals);
    if (column.note) notes.add(column.note);
    level.forEach((node, i) => {
      figures.set(node.key, column.figures[i]!);
      if (node.children.length > 0) print(node.children, Number(column.figures[i]!.replace('−', '-')));
    });
    return column.total;
  };
  return { total: print(nodes, total), figures, notes: [...notes] };
}
