/** Disjoint sets of the numbers 0 to n − 1 (union–find with path halving; the lower root stays). */
export class JoinedSets {
  private readonly parent: Int32Array;

  constructor(count: number) {
    this.parent = new Int32Array(count);
    for (let i = 0; i < count; i++) this.parent[i] = i;
  }

  find(i: number): number {
    const { parent } = this;
    let at = i;
    while (parent[at] !== at) {
      parent[at] = parent[parent[at]!]!;
      at = parent[at]!;
    }
    return at;
  }

  join(i: number, j: number): void {
    const a = this.find(i);
    const b = this.find(j);
    if (a < b) this.parent[b] = a;
    else this.parent[a] = b;
  }

  /** The set of each number, sets counted from 0 in the order of their first member. */
  labels(): { readonly of: Uint32Array; readonly count: number } {
    const of = new Uint32Array(this.parent.length);
    let count = 0;
    for (let i = 0; i < of.length; i++) {
      const root = this.find(i);
      of[i] = root === i ? count++ : of[root]!;
    }
    return { of, count };
  }
}
