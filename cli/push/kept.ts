import { readFileSync, renameSync, rmSync } from 'node:fs';
import { basename, dirname, join } from 'node:path';
import type { Fault } from '#core/errors.ts';
import { writeWhole } from '../io.ts';
import { claim, release } from './claim.ts';
import type { About, Outgoing } from './outgoing.ts';
import { makePrivateFolder } from './user-folders.ts';

/** A record in the tray: a folder with `about.json`, `record.json`, `inputs/SHA-256`, and a `claim` while it is sent. */
export class Kept implements Outgoing {
  readonly kept = true;
  readonly about: About;
  readonly folder: string;

  constructor(folder: string, about: About) {
    this.folder = folder;
    this.about = about;
  }

  claim(): boolean {
    return claim(this.folder);
  }

  release(): void {
    release(this.folder);
  }

  json(): string | null {
    try {
      return readFileSync(join(this.folder, 'record.json'), 'utf8');
    } catch (error) {
      return orNull(error);
    }
  }

  input(sha256: string): Uint8Array | null {
    try {
      return readFileSync(join(this.folder, 'inputs', sha256));
    } catch (error) {
      return orNull(error);
    }
  }

  done(): void {
    removeEntry(this.folder);
  }

  refuse(why: Fault): void {
    this.#note(why);
    move(this.folder, 'refused');
  }

  postpone(why: Fault): void {
    this.#note(why);
    this.release();
  }

  /** A refused one back among those that wait. */
  waitAgain(): void {
    move(this.folder, 'waiting');
  }

  #note(why: Fault): void {
    try {
      writeWhole(join(this.folder, 'about.json'), `${JSON.stringify({ ...this.about, why }, null, 2)}\n`);
    } catch {
      // Sent and removed by another process meanwhile, or no room left for the reason; the record itself is safe.
    }
  }
}

/** By a new name first, so that what a crash leaves is never taken for a whole entry. */
function removeEntry(folder: string): void {
  const gone = `${folder}.gone`;
  try {
    renameSync(folder, gone);
    rmSync(gone, { recursive: true, force: true });
  } catch {
    // Gone already, or the disk may not be written to: then it is sent once more some day, under the same key.
  }
}

/** From one of the tray's two folders to the other. */
function move(folder: string, to: 'waiting' | 'refused'): void {
  const root = dirname(dirname(folder));
  release(folder);
  try {
    makePrivateFolder(join(root, to));
    renameSync(folder, join(root, to, basename(folder)));
  } catch {
    // Gone already, or the disk may not be written to: then it stays where it is.
  }
}

/** What is gone was sent by another process; anything else is worth knowing. */
function orNull(error: unknown): null {
  if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
  throw error;
}
