import type { Command } from 'commander';
import type { PushOptions } from '../push/settings.ts';
import type { Context } from './context.ts';
import { addPushOptions } from './push-options.ts';

export function addPush(program: Command, context: Context): void {
  addPushOptions(
    program
      .command('push')
      .description('send records to the team server: those of files, and what waits in the tray')
      .argument('[record...]', 'files of records, as run --format json or ndjson prints them'),
  )
    .option('--redirect', 'send also what waits for another server or project')
    .addHelpText(
      'after',
      `
The token comes from STEELYARD_TOKEN or from steelyard sign-in.
What cannot be sent stays in the tray, and the exit status is 3.`,
    )
    .action(async (files: string[], options: PushOptions & { redirect?: boolean }) => {
      const { pushTray } = await import('../push/push-tray.ts');
      await pushTray(files, options, context);
    });
}
