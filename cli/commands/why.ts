import type { Command } from 'commander';
import type { Context } from './context.ts';
import { addOutputOptions, addRollUpOptions, type OutputOptions, type RollUpOptions } from './options.ts';

export const WHY_FORMATS = ['table', 'json'] as const;

export interface WhyOptions extends RollUpOptions, OutputOptions {}

export function addWhy(program: Command, context: Context): void {
  const command = program
    .command('why')
    .description('which convention makes two tensors disagree: sign, point, axes, unit, order')
    .argument(
      '<a>',
      'what is taken as right: a record, an assembly, one part of either, or a body written out',
    )
    .argument('<b>', 'what is to be explained');
  addRollUpOptions(command);
  addOutputOptions(command, WHY_FORMATS);
  command
    .addHelpText(
      'after',
      `
A side is
  run.json, run.json#receiver           a record, or one part of it
  drone.yaml, drone.yaml#receiver       an assembly, or a body as its file says
  "{ mass: 38.5 g, centre: [ 12 mm, 0, 0 ], inertia: { xx: …, about: origin } }"
                                        a body written out, as in a file
Tried: sign of products, reference point, 24 axis turns and their mirror images,
a rotation transposed or left out, units, order of the elements.`,
    )
    .action(async (a: string, b: string, options: WhyOptions) => {
      const { explainSides } = await import('./explain-sides.ts');
      await explainSides(a, b, options, context);
    });
}
