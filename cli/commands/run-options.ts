import { type Command, Option } from 'commander';
import type { PushOptions } from '../push/settings.ts';
import { addOutputOptions, addRollUpOptions, type OutputOptions, type RollUpOptions } from './options.ts';
import { addPushOptions } from './push-options.ts';

export const RUN_FORMATS = ['table', 'json', 'ndjson', 'csv', 'markdown', 'junit'] as const;

export interface RunOptions extends RollUpOptions, OutputOptions, PushOptions {
  push?: boolean;
  of?: string;
  frame?: string;
  about: string;
  products: 'negative' | 'positive';
  units?: string;
  parts: string;
  threeView?: string;
  asOf?: string;
}

/** What `run` and `check` take alike. */
export function addRunOptions(command: Command): Command {
  addRollUpOptions(command.argument('<file...>', 'assembly files'));
  command
    .option('--of <path>', "one part's or group's own ten numbers, such as boom/rib[2]")
    .option('--frame <name>', 'figures in a frame of the file as well')
    .option(
      '--about <point>',
      "centre, origin, or x,y,z in the file's unit: the point of the tensor shown",
      'both',
    )
    .addOption(
      new Option('--products <sign>', 'sign of products of inertia in tables')
        .choices(['negative', 'positive'])
        .default('negative'),
    )
    .option('--units <units>', 'file, si, or names such as mm,g,deg; of tables')
    .option('--parts <which>', 'all, or how many of the heaviest, in tables', '8')
    .option('--three-view <file.svg>', 'draw front, side and top with centre and principal axes')
    .option('--as-of <day>', 'the day on which waivers are judged, YYYY-MM-DD', undefined);
  addOutputOptions(command, RUN_FORMATS).option('--push', 'send the records to the team server as well');
  return addPushOptions(command);
}
