import { type Command, InvalidArgumentError, Option } from 'commander';

/** Where a push goes and how long it tries; a token is never an option, for a command line is seen by others. */
export function addPushOptions(command: Command): Command {
  return addServerOptions(command).addOption(
    new Option('--retries <n>', 'attempts after a failed one').argParser(retries).default(4),
  );
}

export function addServerOptions(command: Command): Command {
  return command
    .option('--server <url>', 'address of the team server (or STEELYARD_SERVER)')
    .option('--project <name>', 'its short name (or STEELYARD_PROJECT)')
    .option('--insecure', 'accept http:// to another machine');
}

function retries(value: string): number {
  const count = Number(value);
  if (/^\d+$/.test(value) && count <= 20) return count;
  throw new InvalidArgumentError('expected a whole number from 0 to 20');
}
