import { Command, CommanderError } from 'commander';
import { type Fault, InputError } from '#core/errors.ts';
import { addCheck } from './commands/check.ts';
import { addCompletion } from './commands/completion.ts';
import { type Context, createContext } from './commands/context.ts';
import { addDiff } from './commands/diff.ts';
import { addNew } from './commands/new.ts';
import { addPush } from './commands/push.ts';
import { addRun } from './commands/run.ts';
import { addSchema } from './commands/schema.ts';
import { addSignIn } from './commands/sign-in.ts';
import { addSolids } from './commands/solids.ts';
import { addTray } from './commands/tray.ts';
import { addWhy } from './commands/why.ts';
import { EXIT, type ExitStatus } from './exit-status.ts';
import type { Io } from './io.ts';
import { printFaults } from './output/error-printer.ts';
import { version } from './version.ts';

/** Runs one command line and gives its exit status; nothing is thrown. */
export async function run(argv: readonly string[], io: Io): Promise<ExitStatus> {
  const context = createContext(io);
  try {
    await buildProgram(context).parseAsync(argv, { from: 'user' });
    return context.status;
  } catch (error) {
    return statusOf(error, context);
  }
}

export function buildProgram(context: Context): Command {
  const { io } = context;
  const program = new Command('steelyard');
  program
    .description(
      'Rolls up mass, centre of mass and inertia tensor of assemblies written in YAML,\nand judges them against limits.',
    )
    .version(version, '-V, --version', 'print the version')
    .showHelpAfterError('(steelyard COMMAND --help shows what a command takes)')
    .configureOutput({ writeOut: (text) => io.out(text), writeErr: (text) => io.err(text) })
    .exitOverride()
    .enablePositionalOptions()
    .addHelpText(
      'after',
      `
Exit status: 0 fine, 1 a limit is broken, 2 the input or the call is wrong,
3 nothing else is wrong but a record did not reach the team server,
70 a bug, 130 interrupted.

First steps:
  steelyard new drone.yaml        a starter assembly
  steelyard run drone.yaml        roll it up
  steelyard check drone.yaml      the same, and the limits decide the status`,
    )
    .hook('preAction', (_, action) => applySharedOptions(context, action));
  const commands = [addRun, addCheck, addDiff, addWhy, addPush, addTray, addSignIn, addSolids, addSchema];
  for (const add of [...commands, addNew, addCompletion]) add(program, context);
  addSharedOptions(program);
  for (const command of program.commands) addSharedOptions(command);
  return program;
}

/** They may stand before the command's name or after it. */
function addSharedOptions(command: Command): void {
  command
    .option('-q, --quiet', 'no progress and no warnings on stderr')
    .option('--no-progress', 'no progress on stderr')
    .option('--no-colour', 'no colour (as NO_COLOR does)')
    .option('--ascii', 'plain characters alone');
}

function applySharedOptions(context: Context, action: Command): void {
  for (let command: Command | null = action; command; command = command.parent) {
    const options = command.opts();
    if (options.quiet) context.quiet = true;
    if (options.progress === false) context.progress = false;
    if (options.colour === false) context.colour = false;
    if (options.ascii) context.unicode = false;
  }
}

/** The engine holds no text of more than half a gigabyte. */
const TOO_MUCH_OUTPUT: Fault = {
  code: 'OUTPUT_TOO_LARGE',
  message: 'expected output of at most half a gigabyte of text, found that these records need more',
  hint: 'ask for one state at a time with --state, or for one part with --of',
};

function statusOf(error: unknown, context: Context): ExitStatus {
  const { io } = context;
  if (error instanceof CommanderError) return error.exitCode === 0 ? EXIT.fine : EXIT.wrong;
  if (error instanceof InputError) {
    reportFaults(error.faults, context);
    return EXIT.wrong;
  }
  if (error instanceof RangeError && /string length/.test(error.message)) {
    reportFaults([TOO_MUCH_OUTPUT], context);
    return EXIT.wrong;
  }
  const message = error instanceof Error ? error.message : String(error);
  const more = io.env.STEELYARD_DEBUG && error instanceof Error ? `\n${error.stack}` : '';
  io.err(
    `steelyard: a bug: ${message}${more}\nThe input is not at fault. Please report it with the input and the command; STEELYARD_DEBUG=1 adds where it happened.\n`,
  );
  return EXIT.bug;
}

export function reportFaults(faults: readonly Fault[], context: Context): void {
  const { io, source } = context;
  io.err(
    printFaults(faults, (file, line) => lineOf(source, file, line), {
      colour: context.colour && io.errIsTerminal,
      unicode: context.unicode,
    }),
  );
}

function lineOf(source: Context['source'], file: string, line: number): string | undefined {
  try {
    return source?.readText(file).text.split('\n')[line - 1];
  } catch {
    return undefined;
  }
}
