import type { ProjectSource } from '#core/model/source.ts';
import type { ExitStatus } from '../exit-status.ts';
import { EXIT } from '../exit-status.ts';
import type { Io } from '../io.ts';

/** What a command is given besides its own options. */
export interface Context {
  readonly io: Io;
  /** Where the text of a fault is found, for the line that is shown with it. */
  source: ProjectSource | null;
  /** The exit status when the command has done; commands raise it. */
  status: ExitStatus;
  quiet: boolean;
  progress: boolean;
  colour: boolean;
  unicode: boolean;
}

export function createContext(io: Io): Context {
  const { env } = io;
  return {
    io,
    source: null,
    status: EXIT.fine,
    quiet: false,
    progress: io.errIsTerminal,
    colour: !env.NO_COLOR && env.TERM !== 'dumb' && (io.outIsTerminal || Boolean(env.FORCE_COLOR)),
    unicode: speaksUtf8(env),
  };
}

/** A terminal whose locale is set and is not UTF-8 gets plain characters. */
function speaksUtf8(env: NodeJS.ProcessEnv): boolean {
  const locale = env.LC_ALL || env.LC_CTYPE || env.LANG;
  return !locale || locale === 'C' || locale === 'POSIX' ? !locale : /utf-?8/i.test(locale);
}

/** A line about long work, on stderr, where someone is there to read it. */
export function tell(context: Context, text: string): void {
  if (context.progress && !context.quiet) context.io.err(`${text}\n`);
}
