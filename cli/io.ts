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

/** A pipe that its reader closes (`… | head`) ends the command quietly. */
export function endQuietlyOnClosedPipe(): void {
  for (const stream of [process.stdout, process.stderr])
    stream.on('error', (error: NodeJS.ErrnoException) => {
      if (error.code !== 'EPIPE') throw error;
      process.exit(process.exitCode ?? EXIT.fine);
    });
}

/**
 * Writes a file beside its place and renames it there, so that Ctrl-C or a full disk leaves the old file or the new one
 * whole.
 *
 * @throws InputError FILE_NOT_WRITTEN
 */
export function writeWhole(path: string, text: string): void {
  const beside = `${path}.${process.pid}.part`;
  let interrupted = false;
  const note = () => {
    interrupted = true;
  };
  // While the two calls run a signal waits; it is obeyed when the file stands.
  process.once('SIGINT', note);
  try {
    writeFileSync(beside, text);
    renameSync(beside, path);
  } catch (error) {
    rmSync(beside, { force: true });
    const { code } = error as NodeJS.ErrnoException;
    const why =
      code === 'ENOSPC'
        ? 'the disk is full'
        : code === 'ENOENT'
          ? 'its folder does not exist'
          : code === 'EACCES'
            ? 'permission is denied'
            : code;
    throw new InputError([
      {
        code: 'FILE_NOT_WRITTEN',
        message: `expected to write ${path}, found that ${why}`,
        hint: 'name another file, or mend that',
      },
    ]);
  } finally {
    setImmediate(() => {
      process.removeListener('SIGINT', note);
      if (interrupted) process.exit(EXIT.interrupted);
    });
  }
}
