import { refuseTooLarge } from './mesh-error.ts';
import { Welder } from './welder.ts';

/** Vertices and triangles as a file gives them, coordinates in its own unit. */
export interface RawMesh {
  readonly vertices: Float64Array;
  readonly triangles: Uint32Array;
  /** Triangles left out because two of their corners are one point. */
  readonly dropped: number;
}

/** Takes triangles corner by corner, welds equal corners and leaves collapsed triangles out. */
export class TriangleSink {
  private readonly welder: Welder;
  private triangles: Uint32Array;
  private used = 0;
  private dropped = 0;

  /** @param expected number of triangles, a guess */
  constructor(expected: number) {
    this.welder = new Welder(Math.ceil(expected * 0.51) + 8);
    this.triangles = new Uint32Array(3 * Math.max(16, expected));
  }

  corner(x: number, y: number, z: number): number {
    return this.welder.add(x, y, z);
  }

  add(a: number, b: number, c: number): void {
    if (a === b || b === c || a === c) {
      this.dropped++;
      return;
    }
    if (this.used === this.triangles.length) {
      refuseTooLarge(this.used / 3 + 1);
      const grown = new Uint32Array(2 * this.triangles.length);
      grown.set(this.triangles);
      this.triangles = grown;
    }
    this.triangles[this.used++] = a;
    this.triangles[this.used++] = b;
    this.triangles[this.used++] = c;
  }

  finish(): RawMesh {
    const full = this.used === this.triangles.length;
    return {
      vertices: this.welder.vertices(),
      triangles: full ? this.triangles : this.triangles.slice(0, this.used),
      dropped: this.dropped,
    };
  }
}
