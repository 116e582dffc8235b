import { DIGITS, displayUnits, type ProductsSign } from '../../core/figures/index.ts';
import { inertiaAboutPoint, secondMomentsFromInertia } from '../../core/inertia/body.ts';
import { fromRows, toRows } from '../../core/linalg/symmetric3.ts';
import type { BodyRecord, FrameTotals, RollUpRecord, Totals } from '../../core/record/record.ts';
import { writeGroups } from './groups-section.ts';
import { writeIdentification, writeWaivers } from './identification.ts';
import { createInk } from './ink.ts';
import { type Baseline, writeLimits } from './limits-section.ts';
import { writeMeshes } from './mesh-section.ts';
import { writeParts } from './parts-section.ts';
import { writePrincipal } from './principal-section.ts';
import { writeOverrides, writeWarnings } from './remarks-section.ts';
import type { ReportContext } from './report-context.ts';
import { Sheet } from './sheet.ts';
import { type LabelledTensor, writeTensors } from './tensor-section.ts';
import { writeTotals } from './totals-section.ts';

/** The point that a printed tensor is about; both where none is asked for. */
export type About = 'both' | 'centre' | 'origin' | { name: string; point: readonly [number, number, number] };

export interface TerminalOptions {
  /** Columns; 80 where left out. */
  width?: number;
  colour?: boolean;
  unicode?: boolean;
}

export interface RunReportOptions extends TerminalOptions {
  /** `file`, `si` or names such as `mm,g,deg`. */
  units?: string;
  products?: ProductsSign;
  about?: About;
  /** A named frame in whose axes figures are shown as well. */
  frame?: string;
  parts?: 'heaviest' | 'all' | number;
  digits?: number;
  /** YYYY-MM-DD, on which waivers are judged. */
  today: string;
  /** One part or group, whose figures stand in place of the totals. */
  of?: { path: string; basic: Totals; predicted: Totals };
  /** Values of the baseline by limit name [SI], where one-sided beams have their fulcrum. */
  baseline?: Baseline;
}

/**
 * A run as text for the terminal, no line wider than `width`.
 *
 * @throws TextError for units that are not known
 * @throws RangeError for a frame that the record does not have; the caller has checked
 */
export function renderRun(record: RollUpRecord, options: RunReportOptions): string {
  const context = contextOf(record, options);
  const { sheet } = context;
  writeIdentification(context);
  writeWaivers(context);
  if (options.of) writePart(context, options.of, options.about ?? 'both');
  else writeWhole(context, options);
  writeOverrides(context);
  writeWarnings(context);
  return sheet.text();
}

export function contextOf(record: RollUpRecord, options: RunReportOptions): ReportContext {
  const ink = createInk({ colour: options.colour ?? false, unicode: options.unicode ?? true });
  return {
    record,
    sheet: new Sheet(ink, Math.max(40, options.width ?? 80)),
    units: displayUnits(record, options.units),
    products: options.products ?? 'negative',
    digits: options.digits ?? DIGITS,
    on: record.conventions.growth ? 'predicted' : 'basic',
    today: options.today,
  };
}

function writeWhole(context: ReportContext, options: RunReportOptions): void {
  const { record, on } = context;
  writeTotals(context);
  writeTensors(context, 'Inertia tensor', tensorsOf(record[on], options.about ?? 'both', 'body axes'));
  writePrincipal(context, record[on]);
  if (options.frame !== undefined) writeFrame(context, options.frame, record.frames[options.frame]);
  writeLimits(context, options.baseline);
  writeParts(context, options.parts ?? 'heaviest');
  writeMeshes(context);
  writeGroups(context, 'By category', record.byCategory);
  writeGroups(context, 'By basis', record.byBasis);
}

function writePart(context: ReportContext, part: NonNullable<RunReportOptions['of']>, about: About): void {
  const totals = part[context.on];
  writeTotals(context, `Of ${part.path}`, {
    basic: part.basic,
    predicted: part.predicted,
    gyration: [part.basic.gyration, part.predicted.gyration],
  });
  writeTensors(context, 'Inertia tensor', tensorsOf(totals, about, 'body axes of the assembly'));
  writePrincipal(context, totals);
}

function writeFrame(context: ReportContext, name: string, frame: FrameTotals | undefined): void {
  if (!frame) throw new RangeError(`the record has no frame "${name}"`);
  writeTotals(context, `In frame ${name}`, frame);
  if (frame.note !== null) context.sheet.say(frame.note, { paint: context.sheet.ink.soft });
  writeTensors(
    context,
    `Inertia tensor in frame ${name}`,
    tensorsOf(frame[context.on], 'both', `axes of ${name}`, `the origin of ${name}`),
  );
}

function tensorsOf(body: BodyRecord, about: About, axes: string, origin = 'the origin'): LabelledTensor[] {
  if (!body.inertia) return [];
  const centre = { about: 'about the centre of mass', axes, rows: body.inertia.aboutCentre };
  if (typeof about === 'object') {
    const q = secondMomentsFromInertia(fromRows(body.inertia.aboutCentre));
    const [x = 0, y = 0, z = 0] = body.centre ?? [];
    const rows = toRows(
      inertiaAboutPoint({ mass: body.mass, centre: [x, y, z], secondMoments: q }, about.point),
    );
    return [{ about: `about ${about.name}`, axes, rows }, centre];
  }
  const fromOrigin = { about: `about ${origin}`, axes, rows: body.inertia.aboutOrigin };
  if (about === 'centre') return [centre];
  return about === 'origin' ? [fromOrigin] : [centre, fromOrigin];
}
