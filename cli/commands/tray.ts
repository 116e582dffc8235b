import { type Command, Option } from 'commander';
import type { TrayOptions } from '../push/list-tray.ts';
import type { Context } from './context.ts';

const gather = (value: string, before: string[]): string[] => [...before, value];

export function addTray(program: Command, context: Context): void {
  program
    .command('tray')
    .description('the records that wait to be sent, and those that the server refused')
    .addOption(
      new Option('-f, --format <format>', 'table on a terminal, else json').choices(['table', 'json']),
    )
    .addOption(
      new Option('--drop <id>', 'remove a refused record; may be repeated')
        .argParser(gather)
        .default([], 'none'),
    )
    .addOption(
      new Option('--again <id>', 'let a refused record wait again').argParser(gather).default([], 'none'),
    )
    .option('--even-waiting', 'with --drop: also one that waits; it is lost')
    .action(async (options: TrayOptions) => {
      const { showTray } = await import('../push/list-tray.ts');
      showTray(options, context);
    });
}
