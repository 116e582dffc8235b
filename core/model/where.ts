/** The way from a document's root to a node, as a chain: cheap to extend, turned into a place only for a fault. */
export interface Where {
  readonly parent: Where | null;
  readonly key: string | number;
}

export const within = (parent: Where | null, key: string | number): Where => ({ parent, key });

/** Keys from the root to the node. */
export function pathOf(where: Where | null): (string | number)[] {
  const path: (string | number)[] = [];
  for (let w = where; w; w = w.parent) path.unshift(w.key);
  return path;
}
