import { formatSignificant, type PrintedLimit, unitOfLimit } from '#core/figures/index.ts';
import type { LimitResult } from '#core/record/record.ts';
import { waiverState } from '#core/record/waiver-state.ts';
import { BeamPicture } from '#web/components/beam/beam.tsx';
import type { LabelRoom } from '#web/components/beam/beam-layout.ts';
import { VerdictMark } from '#web/components/verdict-mark.tsx';
import { FilePlace } from './file-place.tsx';
import type { RunView } from './run-view.ts';

/** Waivers count by the day, UTC. */
const todayText = (): string => new Date().toISOString().slice(0, 10);

/** How many parts are named for a broken limit. */
const HEAVIEST = 3;
const CELL = 'max-md:block max-md:border-0 max-md:p-0';

/** One limit: its name, its value, its beam, its verdict, its margin with what helps to mend it. */
export function LimitRow({
  limit,
  printed,
  room,
  view,
  baseline,
  sayOn,
}: {
  limit: LimitResult;
  printed: PrintedLimit;
  room: LabelRoom;
  view: RunView;
  baseline: number | null;
  sayOn: boolean;
}) {
  const waiver = waiverState(limit, todayText());
  return (
    // biome-ignore-start lint/a11y/noRedundantRoles: reflow sets display, which removes a table's own roles.
    // biome-ignore-start lint/a11y/useSemanticElements: the same.
    <tr
      role="row"
      className="align-middle max-md:grid max-md:grid-cols-[1fr_auto] max-md:gap-x-4 max-md:border-b max-md:border-rule max-md:py-3"
    >
      <th role="rowheader" scope="row" className={`md:w-[16%] align-middle ${CELL}`}>
        {limit.name} <span className="u">{printed.unit}</span>
        <span className="soft block whitespace-normal text-sm">{aimOf(limit, sayOn)}</span>
      </th>
      <td
        role="cell"
        className={`n md:w-[8%] align-middle ${limit.verdict === 'outside' ? 'outside' : ''} ${CELL}`}
      >
        {printed.value}
      </td>
      <td role="cell" className={`md:w-[40%] align-middle max-md:col-span-2 max-md:max-w-xl ${CELL}`}>
        <BeamPicture limit={limit} printed={printed} baseline={baseline} room={room} />
      </td>
      <td role="cell" className={`md:w-[8%] align-middle ${CELL}`}>
        <VerdictMark verdict={limit.verdict} />
      </td>
      <td role="cell" className={`align-middle max-md:col-span-2 ${CELL}`}>
        {printed.words}
        <span className="soft block text-sm">
          <Details limit={limit} view={view} />
        </span>
        {waiver !== 'none' && (
          <span className="block text-sm">
            {waiver === 'expired' ? 'waiver expired' : 'waived until'} {limit.waiver!.until} by{' '}
            {limit.waiver!.by}: {limit.waiver!.reason}
          </span>
        )}
        {limit.verdict === 'outside' && waiver === 'none' && <span className="block text-sm">no waiver</span>}
      </td>
    </tr>
    // biome-ignore-end lint/a11y/useSemanticElements: the same.
    // biome-ignore-end lint/a11y/noRedundantRoles: reflow sets display, which removes a table's own roles.
  );
}

/** What is limited, where the name alone does not say it. */
const aimOf = ({ id, name, quantity, of, frame, on }: LimitResult, sayOn: boolean): string =>
  [
    id ?? '',
    quantity === name ? '' : quantity,
    of === null ? '' : `of ${of}`,
    frame === null ? '' : `in frame ${frame}`,
    sayOn ? `on ${on}` : '',
  ]
    .filter(Boolean)
    .join(' · ');

function Details({ limit, view }: { limit: LimitResult; view: RunView }) {
  const unit = unitOfLimit(limit, view.units);
  const { basic, predicted } = limit.values;
  const grown = limit.on === 'predicted' && basic !== null && predicted !== null && basic !== predicted;
  const heaviest = limit.verdict === 'outside' ? limit.heaviest : [];
  return (
    <>
      {grown && `basic ${formatSignificant(basic! / unit.factor)} · `}
      {limit.owner && `owner ${limit.owner} · `}
      {limit.source && `${limit.source} · `}
      <FilePlace at={limit.at} />
      {heaviest.length > 0 && (
        <span className="block">
          weighs most:{' '}
          {heaviest.slice(0, HEAVIEST).map((part, i) => (
            <span key={part.path}>
              {i > 0 && ', '}
              <FilePlace at={part.at}>{part.path}</FilePlace> {formatSignificant(part.value / unit.factor, 4)}{' '}
              {unit.text}
            </span>
          ))}
        </span>
      )}
    </>
  );
}
