import {
  decimalsFor,
  formatFixed,
  PLAIN_ROOM,
  printMoments,
  scaleFor,
  TENSOR_ROOM,
} from '../../core/figures/index.ts';
import type { Totals } from '../../core/record/record.ts';
import type { ReportContext } from './report-context.ts';

const BODY_AXES = ['x', 'y', 'z'] as const;
const DIRECTION_DECIMALS = 4;

/** Principal moments about the centre, named by the nearest body axis, with their directions as rows. */
export function writePrincipal({ sheet, units, digits }: ReportContext, totals: Totals): void {
  const { principal, mass } = totals;
  if (!principal) return;
  sheet.head('Principal moments', 'about the centre; axes as rows in body axes');
  const scale = scaleFor(units.inertia, principal.moments, TENSOR_ROOM);
  const moments = printMoments(
    principal.moments.map((m) => m / scale.factor),
    digits,
  );
  const radii = principal.moments.map((m) => (mass > 0 ? Math.sqrt(Math.max(0, m) / mass) : Number.NaN));
  const length = scaleFor(units.length, radii, PLAIN_ROOM);
  const radiusDecimals = decimalsFor(
    radii.map((r) => r / length.factor),
    digits,
  );
  const tilts = principal.nearest.map(
    (name) => principal.tilt[BODY_AXES.indexOf(name)]! / units.angle.factor,
  );
  const tiltDecimals = Math.max(2, decimalsFor(tilts, 3));
  sheet.table(
    [
      { head: 'axis', align: 'left' },
      { head: `moment\n${scale.head}`, align: 'right' },
      { head: `gyration\n${length.head}`, align: 'right' },
      ...BODY_AXES.map((head) => ({ head, align: 'right' as const })),
      { head: `tilt\n${units.angle.text}`, align: 'right' },
    ],
    principal.moments.map((_, i) => [
      { text: `near ${principal.nearest[i]}` },
      { text: moments.texts[i]! },
      { text: formatFixed(radii[i]! / length.factor, radiusDecimals) },
      ...principal.axes[i]!.map((c) => ({ text: formatFixed(c, DIRECTION_DECIMALS) })),
      { text: principal.free.includes(i) ? 'free' : formatFixed(tilts[i], tiltDecimals) },
    ]),
  );
  if (principal.free.length === 3)
    sheet.say('the three moments are one: every axis through the centre is principal', {
      paint: sheet.ink.soft,
    });
  else if (principal.free.length > 0) {
    const names = principal.free.map((i) => principal.nearest[i]).join(' and ');
    sheet.say(`the moments near ${names} are one: their axes are free to turn in that plane`, {
      paint: sheet.ink.soft,
    });
  }
  if (moments.note) sheet.say(moments.note, { paint: sheet.ink.soft });
}
