import {
  decimalsFor,
  formatFixed,
  formatShort,
  formatSignificant,
  plainText,
  unitText,
} from '../figures/index.ts';
import type { Vector3 } from '../linalg/vector3.ts';
import { boxEdges, equivalentHalfLengths } from './equivalent-box.ts';
import { type Box, boxAround, VIEWS, type View } from './view-axes.ts';

/** What a drawing shows; lengths in m, body axes. */
export interface DrawingInput {
  readonly title: string;
  readonly state: string;
  readonly stamp: string;
  readonly on: 'basic' | 'predicted';
  readonly frame: {
    readonly x: string;
    readonly y: string;
    readonly z: string;
    readonly origin: string;
  } | null;
  readonly parts: readonly DrawnPart[];
  /** How many parts were left out of the picture, the lightest. */
  readonly omitted: number;
  readonly mass: number;
  readonly centre: Vector3;
  readonly principal: { readonly moments: readonly number[]; readonly axes: readonly (readonly number[])[] };
  /** Limits on the centre in body axes. */
  readonly limits: readonly {
    readonly axis: 0 | 1 | 2;
    readonly min: number | null;
    readonly max: number | null;
  }[];
  readonly units: { readonly length: Shown; readonly mass: Shown };
}

interface Shown {
  readonly text: string;
  readonly factor: number;
}

export interface DrawnPart {
  readonly path: string;
  readonly cut: boolean;
  /** Outlines; a part of one point is a mark. */
  readonly lines: readonly (readonly Vector3[])[];
}

const SHEET = { width: 1180, margin: 44, gap: 84, drawingWidth: 1000, drawingHeight: 640 };
/** Mean width of a letter of the small text. */
const LETTER = 6.6;
const INK = {
  ink: '#10201f',
  soft: '#51605e',
  rule: '#cbd5d2',
  brass: '#7a5708',
  within: '#0b6159',
  paper: '#ffffff',
};

/**
 * Front, side and top of an assembly in third-angle projection as one standalone SVG that prints: part outlines,
 * centre of mass, principal axes, the equivalent uniform box, and the limits on the centre. The figures stand in its
 * text alternative and below the drawing.
 */
export function threeView(input: DrawingInput): string {
  const half = equivalentHalfLengths(input.mass, input.principal.moments);
  const box = drawnBox(input, half);
  const layout = layOut(box);
  const views = Object.values(VIEWS).map((view) => drawView(view, input, half, layout));
  const height = layout.height + 150;
  const figures = figureLines(input);
  return `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 ${SHEET.width} ${round(height)}" width="${SHEET.width}" height="${round(height)}" role="img" aria-labelledby="t d" font-family="'Sofia Sans', 'Segoe UI', 'Helvetica Neue', Arial, sans-serif">
<title id="t">${markup(`${input.title}, ${input.state}: front, side and top`)}</title>
<desc id="d">${markup(figures.join('. '))}</desc>
<style>@page{size:landscape;margin:12mm}svg{background:${INK.paper}}text{fill:${INK.ink};font-size:14px}.soft{fill:${INK.soft};font-size:13px}.part{fill:none;stroke:${INK.ink};stroke-width:.9;stroke-linejoin:round}.cut{stroke:${INK.soft};stroke-dasharray:4 3}.box{fill:none;stroke:${INK.brass};stroke-width:.9;stroke-dasharray:7 4}.axis{stroke:${INK.brass};stroke-width:1.6}.allowed{fill:${INK.within};fill-opacity:.1;stroke:${INK.within};stroke-width:1.2}.frame{stroke:${INK.rule};stroke-width:1}</style>
<rect width="100%" height="100%" fill="${INK.paper}"/>
<text x="${SHEET.margin}" y="34" style="font-size:22px;font-weight:700">${markup(clip(`${input.title}, ${input.state}`, 90))}</text>
<text x="${SHEET.margin}" y="56" class="soft">${markup(conventionLine(input))}</text>
<path d="M${SHEET.margin} 66H${SHEET.width - SHEET.margin}" stroke="${INK.ink}"/>
${views.join('\n')}
${scaleBar(input, layout)}
${legend(input, layout, figures)}
</svg>
`;
}

interface Layout {
  /** Sheet units in a metre. */
  readonly scale: number;
  /** Where a view's box begins on the sheet: left, top. */
  readonly at: Record<View['name'], readonly [number, number]>;
  readonly box: Box;
  readonly height: number;
}

/** Everything that is drawn must fit, the equivalent box included. */
function drawnBox(input: DrawingInput, half: Vector3): Box {
  const points: Vector3[] = [
    ...boxEdges(input.centre, input.principal.axes, half).flat(),
    ...axisLines(input, half).flat(),
  ];
  for (const part of input.parts) for (const line of part.lines) points.push(...line);
  const box = boxAround(points)!;
  const size = Math.max(...[0, 1, 2].map((k) => box.max[k]! - box.min[k]!), 1e-9);
  // A flat machine still has a strip to be seen in.
  const grow = (k: 0 | 1 | 2) => Math.max(0.03 * size, (0.08 * size - (box.max[k] - box.min[k])) / 2);
  return {
    min: [box.min[0] - grow(0), box.min[1] - grow(1), box.min[2] - grow(2)],
    max: [box.max[0] + grow(0), box.max[1] + grow(1), box.max[2] + grow(2)],
  };
}

/** The principal axes through the centre, a little longer than the equivalent box. */
function axisLines({ centre, principal }: DrawingInput, half: Vector3): Vector3[][] {
  return principal.axes.map((axis, i) => {
    const reach = Math.max(half[i]!, 0.04 * Math.max(...half)) * 1.15;
    const end = (s: number): Vector3 => [
      centre[0] + s * reach * axis[0]!,
      centre[1] + s * reach * axis[1]!,
      centre[2] + s * reach * axis[2]!,
    ];
    return [end(-1), end(1)];
  });
}

function layOut(box: Box): Layout {
  const [x, y, z] = [0, 1, 2].map((k) => box.max[k]! - box.min[k]!) as [number, number, number];
  const scale = Math.min(SHEET.drawingWidth / (x + y), SHEET.drawingHeight / (y + z));
  const left = SHEET.margin;
  const top = 122;
  const below = top + y * scale + SHEET.gap;
  const beside = left + Math.max(x * scale, 150) + SHEET.gap;
  return {
    scale,
    box,
    at: { top: [left, top], side: [left, below], front: [beside, below] },
    height: below + z * scale,
  };
}

function drawView(view: View, input: DrawingInput, half: Vector3, layout: Layout): string {
  const { right, up } = view;
  const [left, top] = layout.at[view.name];
  const { scale, box } = layout;
  const width = (box.max[right] - box.min[right]) * scale;
  const height = (box.max[up] - box.min[up]) * scale;
  const at = (p: Vector3): [number, number] => [
    left + (p[right] - box.min[right]) * scale,
    top + (box.max[up] - p[up]) * scale,
  ];
  const path = (line: readonly Vector3[]) =>
    line.map((p, i) => `${i === 0 ? 'M' : 'L'}${at(p).map(round).join(' ')}`).join('');
  const parts = input.parts.map((part) => drawPart(part, at, path)).join('');
  const equivalent = boxEdges(input.centre, input.principal.axes, half).map(path).join('');
  const axes = axisLines(input, half).map(path).join('');
  const words = input.frame ? [input.frame.x, input.frame.y, input.frame.z] : ['', '', ''];
  // What is left of the sheet to the right of the view's name, by the width of a letter.
  const room = Math.max(8, Math.floor((SHEET.width - SHEET.margin - left - 190) / 2 / LETTER));
  const arrow = (k: 0 | 1 | 2) => clip(words[k] ? `${'xyz'[k]} ${words[k]}` : 'xyz'[k]!, room);
  return `<g aria-label="${view.name}">
<text x="${round(left)}" y="${round(top - 24)}" style="font-weight:700">${view.name}<tspan class="soft" style="font-weight:400" dx="8">${markup(`${view.from}; ${arrow(right)} →, ${arrow(up)} ↑`)}</tspan></text>
<path class="frame" fill="none" d="M${round(left)} ${round(top - 12)}H${round(left + width)}"/>
${allowed(view, input, layout, [left, top, width, height])}<g>${parts}</g>
<path class="box" d="${equivalent}"/><path class="axis" d="${axes}"/>
${centreMark(at(input.centre))}
</g>`;
}

function drawPart(
  part: DrawnPart,
  at: (p: Vector3) => [number, number],
  path: (line: readonly Vector3[]) => string,
): string {
  const drawn = part.lines
    .map((line) => {
      if (line.length !== 1) return path(line);
      const [x, y] = at(line[0]!).map(round) as [number, number];
      return `M${x - 3} ${y}h6M${x} ${y - 3}v6`;
    })
    .join('');
  if (drawn === '') return '';
  return `<path class="part${part.cut ? ' cut' : ''}" d="${drawn}"><title>${markup(part.path)}</title></path>`;
}

/** The quartered circle of engineering drawings. */
function centreMark([cx, cy]: readonly [number, number]): string {
  const [x, y] = [round(cx), round(cy)];
  const r = 9;
  return `<g role="presentation"><circle cx="${x}" cy="${y}" r="${r}" fill="${INK.paper}" stroke="${INK.ink}" stroke-width="1.4"/><path d="M${x} ${y}V${round(y - r)}A${r} ${r} 0 0 1 ${round(x + r)} ${y}ZM${x} ${y}V${round(y + r)}A${r} ${r} 0 0 1 ${round(x - r)} ${y}Z" fill="${INK.ink}"/></g>`;
}

/** The window in which the centre may lie, from edge to edge where a side has no stop. */
function allowed(
  view: View,
  input: DrawingInput,
  { scale, box }: Layout,
  [left, top, width, height]: readonly [number, number, number, number],
): string {
  const stops = (axis: number) => {
    const limits = input.limits.filter((l) => l.axis === axis);
    if (limits.length === 0) return null;
    return {
      min: Math.max(...limits.map((l) => l.min ?? -Infinity)),
      max: Math.min(...limits.map((l) => l.max ?? Infinity)),
    };
  };
  const across = stops(view.right);
  const along = stops(view.up);
  if (!across && !along) return '';
  const clampX = (v: number) =>
    Math.min(left + width, Math.max(left, left + (v - box.min[view.right]) * scale));
  const clampY = (v: number) => Math.min(top + height, Math.max(top, top + (box.max[view.up] - v) * scale));
  const x0 = across ? clampX(across.min) : left;
  const x1 = across ? clampX(across.max) : left + width;
  const y0 = along ? clampY(along.max) : top;
  const y1 = along ? clampY(along.min) : top + height;
  return `<rect class="allowed" x="${round(x0)}" y="${round(y0)}" width="${round(Math.max(0, x1 - x0))}" height="${round(Math.max(0, y1 - y0))}"/>
`;
}

function scaleBar(input: DrawingInput, { scale, height }: Layout): string {
  const { length } = input.units;
  const wanted = 170 / scale / length.factor;
  const power = 10 ** Math.floor(Math.log10(wanted));
  const step = [5, 2, 1].find((k) => k * power <= wanted)! * power;
  const width = round(step * length.factor * scale);
  const y = round(height + 40);
  const x = SHEET.margin;
  return `<path d="M${x} ${y - 5}v10M${x} ${y}h${width}M${round(x + width)} ${y - 5}v10" stroke="${INK.ink}" fill="none"/>
<text x="${round(x + width + 10)}" y="${y + 5}">${markup(`${formatShort(step)} ${unitText(length.text)}`)}</text>`;
}

function legend(input: DrawingInput, { height }: Layout, figures: readonly string[]): string {
  const lines = [
    figures.slice(1, 3).join(' · '),
    `quartered circle: centre of mass; brass: principal axes and, dashed, the equivalent uniform box${input.limits.length > 0 ? '; green: where the centre may lie' : ''}${input.parts.some((p) => p.cut) ? '; dashed grey: cut away' : ''}`,
    input.omitted > 0 ? `${input.omitted} lighter parts are not drawn` : '',
  ].filter((line) => line !== '');
  return lines
    .map(
      (line, i) =>
        `<text class="soft" x="${SHEET.margin}" y="${round(height + 74 + 20 * i)}">${markup(clip(line, 170))}</text>`,
    )
    .join('\n');
}

/** The text alternative: what the drawing says, in figures. */
function figureLines(input: DrawingInput): string[] {
  const { length, mass } = input.units;
  const say = (metres: number) => formatSignificant(metres / length.factor);
  const shown = input.centre.map((c) => c / length.factor);
  const decimals = decimalsFor(shown);
  const centre = shown.map((c, k) => `${'xyz'[k]} ${formatFixed(c, decimals)}`).join(', ');
  const axes = input.principal.axes
    .map((axis, i) => `${i + 1} along [${axis.map((a) => formatFixed(a, 4)).join(', ')}]`)
    .join('; ');
  const limits = input.limits.map((l) => {
    const stop = (v: number | null, word: string) => (v === null ? '' : ` ${word} ${say(v)}`);
    return `centre ${'xyz'[l.axis]}${stop(l.min, 'from')}${stop(l.max, 'to')} ${length.text}`;
  });
  return [
    `Three views of ${input.title}, state ${input.state}, stamp ${input.stamp.slice(0, 12)}`,
    `${input.on} mass ${formatSignificant(input.mass / mass.factor)} ${mass.text}`,
    `centre of mass ${centre} ${length.text}`,
    `principal axes ${axes}`,
    ...(limits.length > 0 ? [`allowed: ${limits.join('; ')}`] : []),
    `${input.parts.length} parts drawn`,
  ];
}

function conventionLine(input: DrawingInput): string {
  const origin = input.frame ? `; origin at ${input.frame.origin}` : '';
  return clip(
    `third-angle projection, body axes${origin} · ${input.on} masses · stamp ${input.stamp.slice(0, 12)}`,
    150,
  );
}

const clip = (text: string, most: number): string => {
  const points = [...plainText(text)];
  return points.length <= most ? points.join('') : `${points.slice(0, most - 1).join('')}…`;
};

const round = (x: number): number => Math.round(x * 100) / 100 + 0;

const markup = (text: string): string =>
  plainText(text)
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;');
