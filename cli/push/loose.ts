import type { About, Outgoing } from './outgoing.ts';
import type { Packed } from './pack.ts';

/** A record that could not be kept: it is sent from memory, and gone when that fails. */
export class Loose implements Outgoing {
  readonly kept = false;
  readonly about: About;
  readonly #packed: Packed;

  constructor(about: About, packed: Packed) {
    this.about = about;
    this.#packed = packed;
  }

  claim(): boolean {
    return true;
  }
  json(): string {
    return this.#packed.json;
  }
  input(sha256: string): Uint8Array | null {
    return this.#packed.inputs.find((input) => input.sha256 === sha256)?.bytes ?? null;
  }
  release(): void {}
  done(): void {}
  refuse(): void {}
  postpone(): void {}
}
