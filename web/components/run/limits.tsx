import { printLimit, unitOfLimit } from '#core/figures/index.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { SectionHead } from '#web/components/section-head.tsx';
import { LimitRow } from './limit-row.tsx';
import type { RunView } from './run-view.ts';

/** Every limit as a beam with its verdict and its margin; on a narrow screen the beam stands under the name. */
export function LimitsSection({
  record,
  view,
  baseline,
}: {
  record: RollUpRecord;
  view: RunView;
  /** Released values by name [SI], where one-sided beams have their fulcrum. */
  baseline: Readonly<Record<string, number>>;
}) {
  const { limits } = record;
  const judged = [...new Set(limits.map((l) => l.on))];
  const printed = limits.map((limit) => printLimit(limit, unitOfLimit(limit, view.units)));
  const longest = (labels: (string | null)[]) => Math.max(0, ...labels.map((text) => text?.length ?? 0));
  const room = { low: longest(printed.map((p) => p.min)), high: longest(printed.map((p) => p.max)) };
  return (
    <section aria-labelledby="limits">
      <SectionHead title="Limits" id="limits">
        {limits.length === 0
          ? 'none stated in the file'
          : judged.length === 1
            ? `judged on ${judged[0]}`
            : 'judged as each says'}
      </SectionHead>
      {limits.length === 0 ? (
        <p className="soft">Nothing is limited in this state, so nothing was judged.</p>
      ) : (
        // biome-ignore lint/a11y/noRedundantRoles: reflow sets display, which removes a table's own roles.
        <table role="table" className="max-md:block">
          <caption className="sr-only">Limits: value, beam, verdict and margin of each</caption>
          {/* biome-ignore lint/a11y/noRedundantRoles: reflow sets display. */}
          <thead role="rowgroup" className="max-md:sr-only">
            <tr>
              <th scope="col">limit</th>
              <th scope="col" className="n">
                value
              </th>
              <th scope="col">beam</th>
              <th scope="col">verdict</th>
              <th scope="col">margin</th>
            </tr>
          </thead>
          {/* biome-ignore lint/a11y/noRedundantRoles: reflow sets display. */}
          <tbody role="rowgroup" className="max-md:block">
            {limits.map((limit, i) => (
              <LimitRow
                key={`${limit.id} ${limit.name} ${limit.at.file} ${limit.at.line}`}
                limit={limit}
                printed={printed[i]!}
                room={room}
                view={view}
                baseline={baseline[limit.name] ?? null}
                sayOn={judged.length > 1}
              />
            ))}
          </tbody>
        </table>
      )}
    </section>
  );
}
