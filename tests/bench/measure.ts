import { type ChildProcess, spawn } from 'node:child_process';
import { readFileSync } from 'node:fs';

/** One whole process: how long it took and the most memory it held. */
export interface Sample {
  readonly milliseconds: number;
  /** Peak resident memory [MiB]; NaN where the system does not tell. */
  readonly peak: number;
  readonly status: number | null;
}

const POLL = 4;

/** Runs `node …args` with its output thrown away. */
export function measure(args: readonly string[], cwd: string): Promise<Sample> {
  return new Promise((resolve, reject) => {
    const began = process.hrtime.bigint();
    const child = spawn(process.execPath, args, { cwd, stdio: 'ignore' });
    let peak = Number.NaN;
    const poll = setInterval(() => {
      peak = peakOf(child) ?? peak;
    }, POLL);
    child.on('error', reject);
    child.on('exit', (status) => {
      clearInterval(poll);
      resolve({ milliseconds: Number(process.hrtime.bigint() - began) / 1e6, peak, status });
    });
  });
}

/** High-water mark of resident memory, which only grows, so the last reading is near the end's. */
function peakOf(child: ChildProcess): number | null {
  try {
    const kib = /VmHWM:\s+(\d+)/.exec(readFileSync(`/proc/${child.pid}/status`, 'utf8'))?.[1];
    return kib === undefined ? null : Number(kib) / 1024;
  } catch {
    return null;
  }
}

export const median = (values: readonly number[]): number => {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  return sorted.length % 2 ? sorted[middle]! : (sorted[middle - 1]! + sorted[middle]!) / 2;
};
