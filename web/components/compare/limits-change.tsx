import type { Difference, LimitChange, LimitSide } from '#core/difference/index.ts';
import { type DisplayUnits, printLimit, unitOfLimit } from '#core/figures/index.ts';
import { SectionHead } from '#web/components/section-head.tsx';
import { VerdictMark } from '#web/components/verdict-mark.tsx';
import { WideTable } from '#web/components/wide-table.tsx';

const ORDER: LimitChange['verdict'][] = ['now outside', 'now within', 'added', 'removed', 'same'];

/** The limits of both sides, those that were crossed first. */
export function LimitsChangeSection({ difference, units }: { difference: Difference; units: DisplayUnits }) {
  const limits = difference.limits
    .filter((l) => l.verdict !== 'same' || (l.valueChange ?? 0) !== 0)
    .sort((p, q) => ORDER.indexOf(p.verdict) - ORDER.indexOf(q.verdict));
  const crossed = limits.filter((l) => l.verdict === 'now outside' || l.verdict === 'now within').length;
  const still = difference.limits.length - limits.length;
  if (difference.limits.length === 0) return null;
  return (
    <section aria-labelledby="limits">
      <SectionHead title="Limits" id="limits">
        {crossed === 0 ? 'none crossed' : crossed === 1 ? 'one crossed' : `${crossed} crossed`}
        {still > 0 && ` · ${still} did not move`}
      </SectionHead>
      {limits.length > 0 && (
        <WideTable label="Limits">
          <table>
            <caption className="sr-only">Limits: value and verdict in A and in B</caption>
            <thead>
              <tr>
                <th scope="col">limit</th>
                <th scope="col">allowed in B</th>
                <th scope="col" className="n">
                  A
                </th>
                <th scope="col" className="n">
                  B
                </th>
                <th scope="col">verdict in A</th>
                <th scope="col">verdict in B</th>
                <th scope="col">what happened</th>
              </tr>
            </thead>
            <tbody>
              {limits.map((limit) => (
                <LimitRow key={`${limit.id} ${limit.name} ${limit.quantity}`} limit={limit} units={units} />
              ))}
            </tbody>
          </table>
        </WideTable>
      )}
    </section>
  );
}

function LimitRow({ limit, units }: { limit: LimitChange; units: DisplayUnits }) {
  const a = limit.a && printSide(limit.a, units);
  const b = limit.b && printSide(limit.b, units);
  const shown = (b ?? a)!;
  return (
    <tr>
      <th scope="row">
        {limit.name} <span className="u">{shown.unit}</span>
        {limit.id && <span className="soft ml-1.5 text-sm">{limit.id}</span>}
      </th>
      <td className="code">{spanText(shown)}</td>
      <td className="n">{a?.value ?? '—'}</td>
      <td className="n">{b?.value ?? '—'}</td>
      <td>{limit.a ? <VerdictMark verdict={limit.a.verdict} /> : '—'}</td>
      <td>{limit.b ? <VerdictMark verdict={limit.b.verdict} /> : '—'}</td>
      <td className={limit.verdict === 'now outside' ? 'outside' : ''}>
        {limit.verdict === 'same' ? '' : limit.verdict}
        {limit.a && limit.b && stopsMoved(limit.a, limit.b) && (
          <span className="soft"> the limit itself moved</span>
        )}
      </td>
    </tr>
  );
}

/** Only the value and the stops are shown here. */
const printSide = (side: LimitSide, units: DisplayUnits) =>
  printLimit({ ...side, marginOfLimit: null, nearest: 'max' }, unitOfLimit(side, units));

const spanText = ({ min, max }: { min: string | null; max: string | null }): string =>
  min !== null && max !== null ? `${min} … ${max}` : min !== null ? `≥ ${min}` : `≤ ${max}`;

const stopsMoved = (a: LimitSide, b: LimitSide): boolean => a.min !== b.min || a.max !== b.max;
