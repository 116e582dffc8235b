import type { Command } from 'commander';
import { InputError } from '#core/errors.ts';
import type { Context } from './context.ts';

export function addCompletion(program: Command, context: Context): void {
  program
    .command('completion')
    .description('print shell completion for bash, zsh or fish')
    .argument('<shell>', 'bash, zsh or fish')
    .addHelpText(
      'after',
      `
  bash:  steelyard completion bash > /etc/bash_completion.d/steelyard
  zsh:   steelyard completion zsh > "\${fpath[1]}/_steelyard"
  fish:  steelyard completion fish > ~/.config/fish/completions/steelyard.fish`,
    )
    .action(async (shell: string) => {
      const { completionScript, SHELLS } = await import('./completion-scripts.ts');
      if (!SHELLS.includes(shell))
        throw new InputError([
          {
            code: 'CALL_SHELL',
            message: `expected bash, zsh or fish, found '${shell}'`,
            hint: 'for instance: steelyard completion bash',
          },
        ]);
      context.io.out(completionScript(shell, program));
    });
}
