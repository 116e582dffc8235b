import type { Fault } from '../../core/errors.ts';
import { plainText } from '../../core/figures/index.ts';
import { toAscii } from './glyphs.ts';
import { createInk } from './ink.ts';
import type { TerminalOptions } from './run-report.ts';
import { excerptOf } from './source-excerpt.ts';
import { wrap } from './text-width.ts';

/** One line of a text by file and number, without its line end; undefined where there is none. */
export type SourceLine = (file: string, line: number) => string | undefined;

/** Faults for the terminal: code and message, place, the line with carets under what is wrong, how to mend it. */
export function printFaults(
  faults: readonly Fault[],
  sourceLine: SourceLine,
  options: TerminalOptions = {},
): string {
  return faults.map((fault) => printFault(fault, sourceLine, options)).join('\n');
}

function printFault(fault: Fault, sourceLine: SourceLine, options: TerminalOptions): string {
  const ink = createInk({ colour: options.colour ?? false, unicode: options.unicode ?? true });
  const width = Math.max(40, options.width ?? 80);
  const plain = (text: string) => (ink.unicode ? plainText(text) : toAscii(plainText(text)));
  const code = plain(fault.code);
  const head = wrap(plain(`error ${fault.code}: ${fault.message}`), width - 2, width);
  const painted = head[0]!.replace(`error ${code}:`, () => `${ink.outside(`error ${code}`)}:`);
  const lines = [painted, ...head.slice(1).map((line) => `  ${line}`)];
  if (fault.at) {
    lines.push(
      ...wrap(plain(`${fault.at.file}:${fault.at.line}:${fault.at.column}`), width - 2).map(
        (line) => `  ${ink.soft(line)}`,
      ),
    );
    const text = sourceLine(fault.at.file, fault.at.line);
    if (text !== undefined) {
      const gutter = String(fault.at.line);
      const excerpt = excerptOf(
        text,
        fault.at.column,
        fault.length ?? 1,
        width - gutter.length - 6,
        plain,
        ink.unicode ? '…' : '...',
      );
      lines.push(`  ${ink.soft(`${gutter} |`)} ${excerpt.text}`.trimEnd());
      lines.push(
        `  ${ink.soft(`${' '.repeat(gutter.length)} |`)} ${' '.repeat(excerpt.indent)}${ink.outside('^'.repeat(excerpt.carets))}`,
      );
    }
  }
  if (fault.hint !== undefined)
    lines.push(
      ...wrap(plain(`hint: ${fault.hint}`), width - 2, width).map((line, i) =>
        i === 0 ? line : `  ${line}`,
      ),
    );
  return `${lines.map((line) => line.trimEnd()).join('\n')}\n`;
}
