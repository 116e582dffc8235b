import {
  existsSync,
  linkSync,
  readdirSync,
  readFileSync,
  renameSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs';
import { join } from 'node:path';
import { InputError } from '#core/errors.ts';
import { whyNotWritten } from '../io.ts';
import { claimText, isClaimed } from './claim.ts';
import { Kept } from './kept.ts';
import { type About, byTurn } from './outgoing.ts';
import type { Packed } from './pack.ts';
import { makePrivateFolder } from './user-folders.ts';

export type Where = 'waiting' | 'refused';

const KEY = /^[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;
/** What a process that died left half made or half removed is cleared away after this [ms]. */
const LEFTOVERS_LAST = 60 * 60_000;

/**
 * The folder where records wait that could not be sent. An entry is made under another name and renamed when it is
 * whole, so that whatever happens there is all of it or nothing. Inputs are shared between entries by hard links: each
 * is on the disk once, and goes with the last entry that needs it.
 */
export class Tray {
  readonly root: string;

  constructor(root: string) {
    this.root = root;
  }

  /** Puts records in, claimed by this process. All of them, or it throws the error of the file system and keeps none. */
  put(parcels: readonly { about: About; packed: Packed }[]): Kept[] {
    const entries: Kept[] = [];
    try {
      for (const { about, packed } of parcels) entries.push(this.#putOne(about, packed));
      return entries;
    } catch (error) {
      for (const entry of entries) entry.done();
      throw error;
    }
  }

  /** By the time they came. Entries that cannot be read are left alone. */
  list(where: Where): Kept[] {
    return this.#folders(where)
      .flatMap((folder) => {
        const about = readAbout(folder);
        return about ? [new Kept(folder, about)] : [];
      })
      .sort((a, b) => byTurn(a.about, b.about));
  }

  isBeingSent({ folder }: Kept): boolean {
    return isClaimed(folder);
  }

  /** Clears away what dead processes left half made. */
  tidy(): void {
    for (const where of ['waiting', 'refused'])
      for (const name of namesIn(join(this.root, where))) {
        const path = join(this.root, where, name);
        if (/\.(part|gone)$/.test(name) && isOld(path)) rmSync(path, { recursive: true, force: true });
      }
  }

  #folders(where: Where): string[] {
    return namesIn(join(this.root, where))
      .filter((name) => KEY.test(name))
      .map((name) => join(this.root, where, name));
  }

  #putOne(about: About, packed: Packed): Kept {
    const folder = join(this.root, 'waiting', about.key);
    const part = `${folder}.part`;
    try {
      makePrivateFolder(join(part, 'inputs'));
      for (const { sha256, bytes } of packed.inputs) if (bytes) this.#putInput(part, sha256, bytes);
      writeFileSync(join(part, 'record.json'), packed.json);
      writeFileSync(join(part, 'about.json'), `${JSON.stringify(about, null, 2)}\n`);
      writeFileSync(join(part, 'claim'), claimText());
      renameSync(part, folder);
    } catch (error) {
      rmSync(part, { recursive: true, force: true });
      throw error;
    }
    return new Kept(folder, about);
  }

  #putInput(part: string, sha256: string, bytes: Uint8Array): void {
    const path = join(part, 'inputs', sha256);
    if (existsSync(path)) return;
    for (const folder of this.#folders('waiting')) {
      const there = join(folder, 'inputs', sha256);
      if (!existsSync(there)) continue;
      try {
        linkSync(there, path);
        return;
      } catch {
        // Sent and removed meanwhile, or a file system without links.
        break;
      }
    }
    writeFileSync(path, bytes);
  }
}

function readAbout(folder: string): About | null {
  try {
    const about = JSON.parse(readFileSync(join(folder, 'about.json'), 'utf8')) as About;
    return about.schema === 'steelyard-tray/1' ? about : null;
  } catch {
    return null;
  }
}

function namesIn(folder: string): string[] {
  try {
    return readdirSync(folder);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return [];
    throw new InputError([
      {
        code: 'TRAY_UNREADABLE',
        message: `expected a folder that can be read, found that ${folder} cannot: ${whyNotWritten(error)}`,
        hint: 'mend that, or set STEELYARD_TRAY to another folder',
      },
    ]);
  }
}

const isOld = (path: string): boolean => {
  const stat = statSync(path, { throwIfNoEntry: false });
  return stat !== undefined && Date.now() - stat.mtimeMs > LEFTOVERS_LAST;
};
