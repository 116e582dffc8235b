import { formatSignificant } from '../../core/figures/index.ts';
import type { Explanations } from '../../core/why/sentence.ts';
import { createInk } from './ink.ts';
import type { TerminalOptions } from './run-report.ts';
import { Sheet } from './sheet.ts';

/** The readings under which one tensor is another, best first, for the terminal. */
export function renderExplanations(
  a: string,
  b: string,
  found: Explanations,
  options: TerminalOptions = {},
): string {
  const ink = createInk({ colour: options.colour ?? false, unicode: options.unicode ?? true });
  const sheet = new Sheet(ink, Math.max(40, options.width ?? 80));
  sheet.say(found.summary, { paint: ink.strong });
  sheet.say(`A ${a}`, { hang: 2, paint: ink.soft });
  sheet.say(`B ${b}`, { hang: 2, paint: ink.soft });
  if (!found.agree) {
    sheet.head(found.explained ? 'Readings that make them one' : 'Nearest readings', 'fewest slips first');
    found.explanations.forEach((e, i) => {
      const notes = [
        e.withinDigits ? 'within the digits given' : `${formatSignificant(100 * e.residual, 2)} % left`,
        e.possible ? '' : 'no body can have it',
        e.centresAgree === null ? '' : e.centresAgree ? 'the centres agree' : 'the centres do not agree',
      ].filter((note) => note !== '');
      sheet.say(`${i + 1}. ${e.sentence} (${notes.join('; ')})`, { hang: 3 });
    });
    sheet.head('As declared', 'kg·m², about the centre, products negative');
    sheet.table(
      [
        { head: '', align: 'left' },
        { head: 'A', align: 'right' },
        { head: 'B', align: 'right' },
        { head: 'B − A', align: 'right' },
      ],
      found.differences.map((d) => [
        { text: `I${d.element}` },
        { text: formatSignificant(d.a) },
        { text: formatSignificant(d.b) },
        { text: formatSignificant(d.difference) },
      ]),
    );
  }
  sheet.say('A convention that fits is not yet the one that was meant: ask who issued the numbers.', {
    paint: ink.soft,
  });
  return sheet.text();
}
