import type { Command } from 'commander';
import type { Context } from './context.ts';
import { addRunOptions, type RunOptions } from './run-options.ts';

export function addCheck(program: Command, context: Context): void {
  addRunOptions(
    program
      .command('check')
      .description('the same as run, and the limits decide the exit status: 1 when one is broken'),
  ).action(async (files: string[], options: RunOptions) => {
    const { runFiles } = await import('./run-files.ts');
    await runFiles(files, options, context, 'check');
  });
}
