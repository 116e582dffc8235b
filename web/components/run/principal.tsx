import {
  decimalsFor,
  formatFixed,
  PLAIN_ROOM,
  printMoments,
  scaleFor,
  TENSOR_ROOM,
} from '#core/figures/index.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { SectionHead } from '#web/components/section-head.tsx';
import { WideTable } from '#web/components/wide-table.tsx';
import type { RunView } from './run-view.ts';
import { TENSOR_DIGITS } from './tensor.tsx';

const BODY_AXES = ['x', 'y', 'z'] as const;

/** Principal moments about the centre, ascending, named by the nearest body axis, with radius of gyration and tilt. */
export function PrincipalSection({ record, view }: { record: RollUpRecord; view: RunView }) {
  const { principal, mass } = record[view.on];
  if (!principal) return null;
  const { units } = view;
  const scale = scaleFor(units.inertia, principal.moments, TENSOR_ROOM);
  const moments = printMoments(
    principal.moments.map((m) => m / scale.factor),
    TENSOR_DIGITS,
  );
  const radii = principal.moments.map((m) => (mass > 0 ? Math.sqrt(Math.max(0, m) / mass) : Number.NaN));
  const length = scaleFor(units.length, radii, PLAIN_ROOM);
  const radiusDecimals = decimalsFor(radii.map((r) => r / length.factor));
  const tilts = principal.nearest.map(
    (name) => principal.tilt[BODY_AXES.indexOf(name)]! / units.angle.factor,
  );
  const tiltDecimals = Math.max(2, decimalsFor(tilts, 3));
  return (
    <section aria-labelledby="principal">
      <SectionHead title="Principal moments" id="principal">
        about the centre; axes named by the nearest body axis
      </SectionHead>
      <WideTable label="Principal moments">
        <table>
          <caption className="sr-only">
            Principal moments about the centre, ascending; direction of each axis in body axes
          </caption>
          <thead>
            <tr>
              <th scope="col">axis</th>
              <th scope="col" className="n">
                moment <i>{scale.head}</i>
              </th>
              <th scope="col" className="n">
                radius of gyration <i>{length.head}</i>
              </th>
              <th scope="col" className="n">
                tilt <i>{units.angle.text}</i>
              </th>
            </tr>
          </thead>
          <tbody>
            {principal.moments.map((_, i) => (
              <tr key={principal.nearest[i]}>
                <th scope="row">near {principal.nearest[i]}</th>
                <td className="n">{moments.texts[i]}</td>
                <td className="n">{formatFixed(radii[i]! / length.factor, radiusDecimals)}</td>
                <td className="n">
                  {principal.free.includes(i) ? 'free to turn' : formatFixed(tilts[i], tiltDecimals)}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </WideTable>
      {principal.free.length > 0 && <p className="soft mt-2 text-sm">{freeText(principal)}</p>}
      {moments.note && <p className="soft mt-2 text-sm">{moments.note}</p>}
    </section>
  );
}

/** Which axes have no direction of their own. */
export function freeText({ free, nearest }: { free: readonly number[]; nearest: readonly string[] }): string {
  if (free.length === 3) return 'The three moments are one: every axis through the centre is principal.';
  const names = free.map((i) => nearest[i]).join(' and ');
  return `The moments near ${names} are one: their axes are free to turn in that plane.`;
}
