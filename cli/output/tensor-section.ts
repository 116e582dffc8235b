import { inUnit, printTensor, scaleFor, TENSOR_ROOM, tensorRows } from '../../core/figures/index.ts';
import { fromRows } from '../../core/linalg/symmetric3.ts';
import type { Rows3 } from '../../core/record/record.ts';
import type { ReportContext } from './report-context.ts';
import { padEnd, padStart, textWidth, wrap } from './text-width.ts';

/** A tensor and what it is about: `about the centre of mass`, in axes `body axes`. */
export interface LabelledTensor {
  readonly about: string;
  readonly axes: string;
  /** [kg·m²], products negative. */
  readonly rows: Rows3;
}

/** Tensors side by side where they fit, each with its point, axes, unit and sign of the products. */
export function writeTensors(
  context: ReportContext,
  title: string,
  tensors: readonly LabelledTensor[],
): void {
  const { sheet, on, record } = context;
  sheet.head(title, record.conventions.growth ? on : 'basic');
  if (tensors.length === 0) {
    sheet.say('no mass remains: there is no tensor', { paint: sheet.ink.soft });
    return;
  }
  const gap = 4;
  const half = Math.floor((sheet.width - gap) / 2);
  const blocks = tensors.map((t) => tensorBlock(context, t, half));
  for (let i = 0; i < blocks.length; i++) {
    const left = blocks[i]!;
    const right = blocks[i + 1];
    if (right && left.width <= half && right.width <= half) {
      const lines = Math.max(left.lines.length, right.lines.length);
      for (let k = 0; k < lines; k++) {
        const [a, b] = [left.lines[k], right.lines[k]];
        const head = a ? a.paint(padEnd(a.text, half)) : ' '.repeat(half);
        sheet.raw(b ? `${head}${' '.repeat(gap)}${b.paint(b.text)}` : head);
      }
      i++;
    } else
      for (const line of left.lines)
        for (const piece of wrapLine(line.text, sheet.width)) sheet.raw(line.paint(piece));
  }
  for (const note of new Set(blocks.flatMap((b) => b.notes))) sheet.say(note, { paint: sheet.ink.soft });
}

const wrapLine = (text: string, width: number) => (textWidth(text) <= width ? [text] : wrap(text, width));

interface Block {
  width: number;
  lines: { text: string; paint: (text: string) => string }[];
  notes: string[];
}

function tensorBlock(
  { sheet, units, products, digits }: ReportContext,
  tensor: LabelledTensor,
  half: number,
): Block {
  const six = fromRows(tensor.rows);
  const scale = scaleFor(units.inertia, six, TENSOR_ROOM);
  const printed = printTensor(inUnit(six, scale), digits);
  const rows = tensorRows(printed, products);
  const plain = (text: string) => sheet.plain(text);
  const widths = [0, 1, 2].map((k) => Math.max(...rows.map((row) => textWidth(plain(row[k]!)))));
  const [left, right] = [
    ['┌', '│', '└'],
    ['┐', '│', '┘'],
  ].map((side) => side.map(plain));
  const matrix = rows.map((row, i) => {
    const figures = row.map((text, k) => padStart(plain(text), widths[k]!)).join('  ');
    return `${left![i]} ${figures} ${right![i]}`;
  });
  const soft = sheet.ink.soft;
  const unit = plain(`${scale.head}, products ${products}`);
  const same = (text: string) => text;
  const labels = [plain(tensor.about), plain(tensor.axes), unit].flatMap((text) => wrap(text, half));
  const lines = [
    ...labels.map((text, i) => ({ text, paint: i === 0 ? same : soft })),
    ...matrix.map((text) => ({ text, paint: same })),
  ];
  return {
    width: Math.max(...lines.map((l) => textWidth(l.text))),
    lines,
    notes: printed.note ? [`${tensor.about}: ${printed.note}`] : [],
  };
}
