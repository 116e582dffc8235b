import { type Command, InvalidArgumentError, Option } from 'commander';
import { InputError } from '#core/errors.ts';

/** Options that several commands share, declared once. */

export interface RollUpOptions {
  state: string[];
  set: Record<string, string>;
}

const gather = (value: string, before: string[]): string[] => [
  ...before,
  ...value
    .split(',')
    .map((s) => s.trim())
    .filter((s) => s !== ''),
];

export function addRollUpOptions(command: Command): Command {
  return command
    .addOption(
      new Option('-s, --state <name>', 'a state, or several with commas; all where left out')
        .argParser(gather)
        .default([], 'all'),
    )
    .addOption(
      new Option('--set <name=value>', 'a parameter of the top file, for this run; may be repeated')
        .argParser(gatherSet)
        .default({}, 'none'),
    );
}

function gatherSet(value: string, before: Record<string, string>): Record<string, string> {
  const at = value.indexOf('=');
  if (at <= 0) throw new InvalidArgumentError('expected NAME=VALUE, such as boom=300mm');
  return { ...before, [value.slice(0, at).trim()]: value.slice(at + 1).trim() };
}

export interface OutputOptions {
  format?: string;
  out: string[];
}

export function addOutputOptions(command: Command, formats: readonly string[]): Command {
  return command
    .addOption(new Option('-f, --format <format>', 'table on a terminal, else json').choices(formats))
    .addOption(
      new Option(
        '-o, --out <file>',
        'write there instead of stdout; repeat it for several formats, told by the ending',
      )
        .argParser((value: string, before: string[]) => [...before, value])
        .default([], 'stdout'),
    );
}

const ENDINGS: Readonly<Record<string, string>> = {
  json: 'json',
  ndjson: 'ndjson',
  jsonl: 'ndjson',
  csv: 'csv',
  md: 'markdown',
  markdown: 'markdown',
  xml: 'junit',
  txt: 'table',
};

/** The format of an output file: what was asked for where there is one file, else by its ending. */
export function formatOfFile(file: string, options: OutputOptions, formats: readonly string[]): string {
  if (options.format && options.out.length === 1) return options.format;
  const ending = /\.([^./\\]+)$/.exec(file)?.[1]?.toLowerCase() ?? '';
  const format = ENDINGS[ending];
  if (format && formats.includes(format)) return format;
  throw new InputError([
    {
      code: 'CALL_OUTPUT_FORMAT',
      message: `expected a file ending that says the format, found ${file}`,
      hint: `use .json, .ndjson, .csv, .md, .xml (JUnit) or .txt, or give --format with one --out`,
    },
  ]);
}

/** YYYY-MM-DD of today where the machine stands, or the day given. */
export function dayOf(given: string | undefined): string {
  if (given === undefined) {
    const now = new Date();
    const two = (n: number) => String(n).padStart(2, '0');
    return `${now.getFullYear()}-${two(now.getMonth() + 1)}-${two(now.getDate())}`;
  }
  if (/^\d{4}-\d{2}-\d{2}$/.test(given) && !Number.isNaN(Date.parse(given))) return given;
  throw new InputError([
    {
      code: 'CALL_DAY',
      message: `expected a day as YYYY-MM-DD, found '${given}'`,
      hint: 'for instance --as-of 2027-03-31',
    },
  ]);
}
