import type { Command } from 'commander';
import type { Context } from './context.ts';

export function addSchema(program: Command, context: Context): void {
  program
    .command('schema')
    .description('print the JSON Schema of the assembly format, for editors')
    .addHelpText(
      'after',
      `
An editor that speaks JSON Schema for YAML then completes keys and marks faults:
  steelyard schema > steelyard.schema.json
and at the head of an assembly file
  # yaml-language-server: $schema=steelyard.schema.json`,
    )
    .action(async () => {
      const { assemblyJsonSchema } = await import('#core/document/json-schema.ts');
      context.io.out(`${JSON.stringify(assemblyJsonSchema(), null, 2)}\n`);
    });
}
