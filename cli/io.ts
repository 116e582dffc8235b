import { renameSync, rmSync, writeFileSync } from 'node:fs';
import { InputError } from '#core/errors.ts';
import { EXIT } from './exit-status.ts';

/** Where a command writes; the process's own streams, or a test's. */
export interface Io {
  /** Data, and nothing else. */
  out(text: string): void;
  /** Progress, warnings, errors. */
  err(text: string): void;
  readonly env: NodeJS.ProcessEnv;
  readonly outIsTerminal: boolean;
  readonly errIsTerminal: boolean;
  readonly columns: number | undefined;
}

export const processIo = (): Io => ({
  out: (text) => process.stdout.write(text),
  err: (text) => process.stderr.write(text),
  env: process.env,
  outIsTerminal: process.stdout.isTTY === true,
  errIsTerminal: process.stderr.isTTY === true,
  columns: process.stdout.columns,
});

/**
 * A pipe that its reader closes (`… | head`) ends the command quietly; a stream that cannot be written for another reason
 * (a full disk) ends it with what is wrong.
 */
export function endOnFailedStream(): void {
  for (const stream of [process.stdout, process.stderr])
    stream.on('error', (error: NodeJS.ErrnoException) => {
      if (error.code === 'EPIPE') process.exit(process.exitCode ?? EXIT.fine);
      if (stream === process.stdout)
        process.stderr.write(
          `error FILE_NOT_WRITTEN: expected to write to standard output, found that ${whyNotWritten(error)}\nhint: send it to another place, or mend that\n`,
        );
      process.exit(EXIT.wrong);
    });
}

/**
 * Writes a file beside its place and renames it there, so that Ctrl-C or a full disk leaves the old file or the new one
 * whole.
 *
 * @param mode permissions of a file that only its owner may read, such as 0o600
 * @throws InputError FILE_NOT_WRITTEN
 */
export function writeWhole(path: string, text: string, mode?: number): void {
  const beside = `${path}.${process.pid}.part`;
  const release = holdInterrupt();
  try {
    writeFileSync(beside, text, mode === undefined ? {} : { mode });
    renameSync(beside, path);
  } catch (error) {
    rmSync(beside, { force: true });
    const why = whyNotWritten(error);
    throw new InputError([
      {
        code: 'FILE_NOT_WRITTEN',
        message: `expected to write ${path}, found that ${why}`,
        hint: 'name another file, or mend that',
      },
    ]);
  } finally {
    release();
  }
}

let held = 0;
let interrupted = false;
const noteInterrupt = () => {
  interrupted = true;
};

/** While a file is written Ctrl-C waits; it is obeyed when the file stands. One listener serves however many files. */
function holdInterrupt(): () => void {
  if (held++ === 0) process.on('SIGINT', noteInterrupt);
  return () =>
    setImmediate(() => {
      if (--held > 0) return;
      process.removeListener('SIGINT', noteInterrupt);
      if (interrupted) process.exit(EXIT.interrupted);
    });
}

/** Why a file could not be written, in words that follow "found that". */
export function whyNotWritten(error: unknown): string {
  const { code, message } = error as NodeJS.ErrnoException;
  const why: Record<string, string> = {
    ENOSPC: 'the disk is full',
    EDQUOT: 'the quota of the disk is used up',
    ENOENT: 'its folder does not exist',
    ENOTDIR: 'a file stands where its folder should be',
    EACCES: 'permission is denied',
    EPERM: 'permission is denied',
    EROFS: 'the disk can only be read',
  };
  return code === undefined ? message : (why[code] ?? code);
}
