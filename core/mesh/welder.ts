const GOLDEN = 0x9e3779b1;

/** Gathers vertices, giving equal coordinates one number: open addressing on the bits of the three doubles. */
export class Welder {
  private coordinates: Float64Array;
  private count = 0;
  private table: Int32Array;
  private readonly key = new Float64Array(3);
  private readonly words = new Uint32Array(this.key.buffer);

  /** @param expected number of different vertices, a guess; it grows as needed */
  constructor(expected: number) {
    let slots = 64;
    while (slots < 2 * expected) slots *= 2;
    this.table = new Int32Array(slots).fill(-1);
    this.coordinates = new Float64Array(3 * Math.max(16, expected));
  }

  /** Number of the vertex at (x, y, z), which are finite; −0 is +0. */
  add(x: number, y: number, z: number): number {
    // −0 + 0 is +0; every other number stays.
    const px = x + 0;
    const py = y + 0;
    const pz = z + 0;
    const mask = this.table.length - 1;
    let slot = this.hash(px, py, pz) & mask;
    for (;;) {
      const found = this.table[slot]!;
      if (found < 0) break;
      const i = 3 * found;
      if (this.coordinates[i] === px && this.coordinates[i + 1] === py && this.coordinates[i + 2] === pz)
        return found;
      slot = (slot + 1) & mask;
    }
    return this.append(slot, px, py, pz);
  }

  /** The different vertices, three coordinates each, in the order of first appearance. */
  vertices(): Float64Array {
    return this.coordinates.slice(0, 3 * this.count);
  }

  private append(slot: number, x: number, y: number, z: number): number {
    const number = this.count++;
    if (3 * this.count > this.coordinates.length) {
      const grown = new Float64Array(Math.ceil(this.coordinates.length / 2) * 3);
      grown.set(this.coordinates);
      this.coordinates = grown;
    }
    this.coordinates[3 * number] = x;
    this.coordinates[3 * number + 1] = y;
    this.coordinates[3 * number + 2] = z;
    this.table[slot] = number;
    if (10 * this.count > 7 * this.table.length) this.rehash();
    return number;
  }

  private rehash(): void {
    const mask = 2 * this.table.length - 1;
    const table = new Int32Array(mask + 1).fill(-1);
    const at = this.coordinates;
    for (let i = 0; i < this.count; i++) {
      let slot = this.hash(at[3 * i]!, at[3 * i + 1]!, at[3 * i + 2]!) & mask;
      while (table[slot]! >= 0) slot = (slot + 1) & mask;
      table[slot] = i;
    }
    this.table = table;
  }

  /** Multiply and fold all six words, so that grids of round numbers spread too. */
  private hash(x: number, y: number, z: number): number {
    this.key[0] = x;
    this.key[1] = y;
    this.key[2] = z;
    const w = this.words;
    let h = Math.imul(w[0]! ^ Math.imul(w[1]!, 0x85ebca6b), GOLDEN);
    h = Math.imul(h ^ (h >>> 15) ^ w[2]! ^ Math.imul(w[3]!, 0xc2b2ae35), GOLDEN);
    h = Math.imul(h ^ (h >>> 15) ^ w[4]! ^ Math.imul(w[5]!, 0x27d4eb2f), GOLDEN);
    h = Math.imul(h ^ (h >>> 15), 0x85ebca6b);
    return (h ^ (h >>> 13)) >>> 0;
  }
}
