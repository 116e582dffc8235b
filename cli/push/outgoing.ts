import type { Fault } from '#core/errors.ts';

/** What is known of a record on its way, without opening it. */
export interface About {
  readonly schema: 'steelyard-tray/1';
  /** Of this push of this record; under it a second sending is the same run. */
  readonly key: string;
  readonly server: string;
  readonly project: string;
  /** When it was put on its way, and its turn among those of that moment. */
  readonly at: string;
  readonly turn: number;
  readonly assembly: string;
  readonly state: string;
  readonly commit: string | null;
  /** SHA-256 of the record as it is sent: the same file pushed again while it waits is found by it. */
  readonly same: string;
  readonly inputs: readonly { path: string; sha256: string; isText: boolean; found: boolean }[];
  /** Why it still waits, or why it was refused; null where it has not been tried. */
  readonly why: Fault | null;
}

/** A record that is to be sent, kept in the tray or not. */
export interface Outgoing {
  readonly about: About;
  readonly kept: boolean;
  /** Takes it for this process; false where another one is sending it. */
  claim(): boolean;
  release(): void;
  /** The record's JSON without texts; null where another process has sent it meanwhile. */
  json(): string | null;
  /** Null where the input was not found when it was packed. */
  input(sha256: string): Uint8Array | null;
  /** The server has it. */
  done(): void;
  /** The server will never take it. */
  refuse(why: Fault): void;
  /** It stays for another time. */
  postpone(why: Fault): void;
}

export const byTurn = (a: About, b: About): number =>
  a.at < b.at ? -1 : a.at > b.at ? 1 : a.turn - b.turn || (a.key < b.key ? -1 : 1);

/** `Heron, flight` */
export const nameOf = ({ assembly, state }: About): string => `${assembly}, ${state}`;

/** What people type: enough of the key to tell it from the others. */
export const shortId = ({ key }: About): string => key.slice(0, 8);
