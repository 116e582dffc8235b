import { formatSignificant } from '#core/figures/index.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { SectionHead } from '#web/components/section-head.tsx';
import { FilePlace } from './file-place.tsx';
import type { RunView } from './run-view.ts';

/** What the roll-up warns of; each points at its line. */
export function WarningsSection({ record: { warnings } }: { record: RollUpRecord }) {
  if (warnings.length === 0) return null;
  return (
    <section aria-labelledby="warnings">
      <SectionHead title="Warnings" id="warnings">
        {warnings.length}
      </SectionHead>
      <ul>
        {warnings.map((w, i) => (
          // biome-ignore lint/suspicious/noArrayIndexKey: the list never changes
          <li key={i} className="border-b border-rule py-2">
            <span className="code">{w.code}</span>{' '}
            {w.at && (
              <>
                at <FilePlace at={w.at} />
              </>
            )}
            <p>{w.message}</p>
          </li>
        ))}
      </ul>
    </section>
  );
}

/** Masses that were set instead of computed, always listed where the totals are. */
export function OverridesSection({ record: { overrides }, view }: { record: RollUpRecord; view: RunView }) {
  if (overrides.length === 0) return null;
  const { mass } = view.units;
  const say = (kg: number) => formatSignificant(kg / mass.factor);
  return (
    <section aria-labelledby="overrides">
      <SectionHead title="Overrides" id="overrides">
        net basic mass as built → as stated, {mass.text}
      </SectionHead>
      <ul>
        {overrides.map((o) => (
          <li key={`${o.path} ${o.at.line}`} className="border-b border-rule py-2">
            {o.path}: <span className="code whitespace-nowrap">{`${say(o.from)} → ${say(o.to)}`}</span>,{' '}
            {o.reason} (
            <FilePlace at={o.at} />)
          </li>
        ))}
      </ul>
    </section>
  );
}
