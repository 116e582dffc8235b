import { readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { hostname } from 'node:os';
import { join } from 'node:path';

/** A claim older than this is nobody's, whoever made it [ms]. */
const CLAIM_LASTS = 60 * 60_000;

const claimPath = (folder: string): string => join(folder, 'claim');

/** What a claim of this process says. */
export const claimText = (): string => `${hostname()} ${process.pid}\n`;

/**
 * Marks a waiting record as being sent by this process. A claim only saves work: two processes that send one record
 * send it under one key, which is one run to the server. So a claim left by a process that died is taken over.
 */
export function claim(folder: string): boolean {
  for (let attempt = 0; attempt < 2; attempt++) {
    try {
      writeFileSync(claimPath(folder), claimText(), { flag: 'wx' });
      return true;
    } catch (error) {
      const { code } = error as NodeJS.ErrnoException;
      if (code === 'ENOENT') return false;
      // A tray that cannot be written to can still be sent.
      if (code !== 'EEXIST') return true;
      if (isMine(folder)) return true;
      if (isClaimed(folder)) return false;
      rmSync(claimPath(folder), { force: true });
    }
  }
  return false;
}

export const release = (folder: string): void => {
  if (isMine(folder)) rmSync(claimPath(folder), { force: true });
};

/** Whether a process that lives is sending the record. */
export function isClaimed(folder: string): boolean {
  try {
    const path = claimPath(folder);
    if (Date.now() - statSync(path).mtimeMs > CLAIM_LASTS) return false;
    const [host, pid] = readFileSync(path, 'utf8').trim().split(' ');
    return host !== hostname() || lives(Number(pid));
  } catch {
    return false;
  }
}

function isMine(folder: string): boolean {
  try {
    return readFileSync(claimPath(folder), 'utf8') === claimText();
  } catch {
    return false;
  }
}

function lives(pid: number): boolean {
  // A claim in the making is empty for a moment.
  if (!Number.isInteger(pid) || pid <= 0) return true;
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return (error as NodeJS.ErrnoException).code === 'EPERM';
  }
}
