import { existsSync } from 'node:fs';
import type { Command } from 'commander';
import { InputError } from '#core/errors.ts';
import { writeWhole } from '../io.ts';
import type { Context } from './context.ts';
import { STARTER } from './starter.ts';

export function addNew(program: Command, context: Context): void {
  program
    .command('new')
    .description('a starter assembly, to a file or to stdout')
    .argument('[file]', 'the file to write; an existing one is left alone')
    .action((file: string | undefined) => {
      if (file === undefined) {
        context.io.out(STARTER);
        return;
      }
      if (existsSync(file))
        throw new InputError([
          {
            code: 'FILE_EXISTS',
            message: `expected a name that is free, found the file ${file}`,
            hint: 'choose another name, or print the starter with `steelyard new`',
          },
        ]);
      writeWhole(file, STARTER);
      if (!context.quiet) context.io.err(`${file} is written; roll it up with\n  steelyard run ${file}\n`);
    });
}
