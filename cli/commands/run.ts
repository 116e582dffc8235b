import type { Command } from 'commander';
import type { Context } from './context.ts';
import { addRunOptions, type RunOptions } from './run-options.ts';

export function addRun(program: Command, context: Context): void {
  addRunOptions(
    program.command('run').description('roll assemblies up: mass, centre, inertia, principal axes, limits'),
  ).action(async (files: string[], options: RunOptions) => {
    const { runFiles } = await import('./run-files.ts');
    await runFiles(files, options, context, 'run');
  });
}
