import type { Command } from 'commander';
import type { PushOptions } from '../push/settings.ts';
import type { Context } from './context.ts';
import { addPushOptions } from './push-options.ts';

export function addSignIn(program: Command, context: Context): void {
  addPushOptions(
    program.command('sign-in').description('keep a token of the team server for this user of this machine'),
  )
    .option('--forget', 'remove what is kept')
    .addHelpText(
      'after',
      `
The token is asked for at a terminal, or read from standard input:
  steelyard sign-in --server https://team.example.org --project heron < token`,
    )
    .action(async (options: PushOptions & { forget?: boolean }) => {
      const { signIn } = await import('../push/sign-in.ts');
      await signIn(options, context);
    });
}
