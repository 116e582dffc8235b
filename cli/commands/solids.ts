import { type Command, Option } from 'commander';
import { InputError } from '#core/errors.ts';
import { nearestName } from '#core/nearest-name.ts';
import type { Context } from './context.ts';

export function addSolids(program: Command, context: Context): void {
  program
    .command('solids')
    .description('what each solid takes and where its origin is')
    .argument('[name]', 'one solid, with its keys')
    .addOption(new Option('--format <format>', 'how to print').choices(['table', 'json']).default('table'))
    .action(async (name: string | undefined, options: { format: string }) => {
      const { describeSolids } = await import('./describe-solids.ts');
      const { SOLID_HELP_NAMES } = await import('./describe-solids.ts');
      if (name !== undefined && !SOLID_HELP_NAMES.includes(name)) {
        const nearest = nearestName(name, SOLID_HELP_NAMES);
        throw new InputError([
          {
            code: 'SOLID_UNKNOWN',
            message: `expected the name of a solid, found '${name}'`,
            hint: nearest ? `did you mean '${nearest}'?` : '`steelyard solids` lists them',
          },
        ]);
      }
      context.io.out(describeSolids(name, options.format === 'json' ? 'json' : 'table', context));
    });
}
