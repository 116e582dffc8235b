import { type Command, InvalidArgumentError, Option } from 'commander';
import { isDay } from '#core/document/is-day.ts';
import { InputError } from '#core/errors.ts';
import { displayUnits } from '#core/figures/index.ts';
import { TextError } from '#core/units/index.ts';

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
  if (isDay(given)) return given;
  throw new InputError([
    {
      code: 'CALL_DAY',
      message: `expected a day of the calendar as YYYY-MM-DD, found '${given}'`,
      hint: 'for instance --as-of 2027-03-31',
    },
  ]);
}

/** `--parts`: all, or how many. */
export function partsOf(text: string): 'all' | number {
  if (text === 'all') return 'all';
  if (/^\d+$/.test(text)) return Number(text);
  throw new InputError([
    {
      code: 'CALL_PARTS',
      message: `expected all or a number of parts, found '${text}'`,
      hint: 'for instance --parts all',
    },
  ]);
}

const SI_NAMES = { length: 'm', mass: 'kg', angle: 'rad', density: 'kg/m^3', inertia: 'kg*m^2' };

/**
 * `--units`, before there is anything to show in them.
 *
 * @throws InputError UNITS_…, of a unit that is not known or not shown
 */
export function checkUnits(units: string | undefined): void {
  try {
    displayUnits({ conventions: { fileUnits: SI_NAMES } }, units);
  } catch (error) {
    if (!(error instanceof TextError)) throw error;
    throw new InputError([
      {
        code: error.code,
        message: `--units ${units}: ${error.message}`,
        ...(error.hint ? { hint: error.hint } : {}),
      },
    ]);
  }
}
