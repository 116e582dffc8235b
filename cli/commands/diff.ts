import { type Command, InvalidArgumentError, Option } from 'commander';
import type { Context } from './context.ts';
import { addOutputOptions, addRollUpOptions, type OutputOptions, type RollUpOptions } from './options.ts';

export const DIFF_FORMATS = ['table', 'json', 'ndjson', 'markdown'] as const;

export interface DiffOptions extends RollUpOptions, OutputOptions {
  on?: 'basic' | 'predicted';
  units?: string;
  parts: string;
  quantity: string;
  failOver: Record<string, string>;
}

export function addDiff(program: Command, context: Context): void {
  const command = program
    .command('diff')
    .description('what moved between two sides, and which part moved it')
    .argument('<a>', 'the earlier side: a record (.json), an assembly file, or REV:path in git')
    .argument('<b>', 'the later side');
  addRollUpOptions(command);
  command
    .addOption(
      new Option('--on <which>', 'basic or predicted; predicted where a side has growth').choices([
        'basic',
        'predicted',
      ]),
    )
    .option('--quantity <name>', 'whose change is attributed to parts, in tables', 'all')
    .option('--units <units>', 'file, si, or names such as mm,g,deg; of tables')
    .option('--parts <which>', 'all, or how many, in tables', '12')
    .addOption(
      new Option(
        '--fail-over <quantity=amount>',
        'exit status 1 where a change is larger, such as mass=5g or mass=2%; may be repeated',
      )
        .argParser(gatherAmount)
        .default({}, 'none'),
    );
  addOutputOptions(command, DIFF_FORMATS);
  command
    .addHelpText(
      'after',
      `
Examples:
  steelyard diff main:drone.yaml drone.yaml
  steelyard diff released.json drone.yaml --state flight --fail-over mass=5g
Contributions of parts sum to each change without remainder.`,
    )
    .action(async (a: string, b: string, options: DiffOptions) => {
      const { diffSides } = await import('./diff-sides.ts');
      await diffSides(a, b, options, context);
    });
}

function gatherAmount(value: string, before: Record<string, string>): Record<string, string> {
  const at = value.indexOf('=');
  if (at <= 0) throw new InvalidArgumentError('expected QUANTITY=AMOUNT, such as mass=5g');
  return { ...before, [value.slice(0, at).trim()]: value.slice(at + 1).trim() };
}
