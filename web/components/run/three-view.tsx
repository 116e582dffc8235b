import type { RunDetail } from '#core/api/runs.ts';
import { decimalsFor, formatFixed, formatSignificant, PLAIN_ROOM, scaleFor } from '#core/figures/index.ts';
import { drawingAddress } from '#web/api/run.ts';
import { SectionHead } from '#web/components/section-head.tsx';
import type { RunView } from './run-view.ts';

/** Front, side and top with the centre of mass and the principal axes; the figures also stand in the text alternative. */
export function ThreeViewSection({
  detail: { run, record, hasDrawing },
  project,
  view,
}: {
  detail: RunDetail;
  project: string;
  view: RunView;
}) {
  return (
    <section aria-labelledby="views">
      <SectionHead title="Three views" id="views">
        third-angle projection
      </SectionHead>
      {hasDrawing ? (
        <a href={drawingAddress(project, run.id)} title="Open the drawing by itself" className="block">
          <img
            src={drawingAddress(project, run.id)}
            alt={inWords(record, view)}
            loading="lazy"
            className="w-full border border-rule bg-[#fff]"
          />
        </a>
      ) : (
        <p className="soft">No drawing: the server has not got what this run was computed from.</p>
      )}
    </section>
  );
}

function inWords(record: RunDetail['record'], { on, units }: RunView): string {
  const { mass, centre } = record[on];
  const scale = scaleFor(units.length, centre ?? [], PLAIN_ROOM);
  const shown = (centre ?? []).map((x) => x / scale.factor);
  const decimals = decimalsFor(shown);
  const at = shown.map((x, k) => `${'xyz'[k]} ${formatFixed(x, decimals)}`).join(', ');
  return `Front, side and top view of ${record.assembly}, state ${record.state}, with its centre of mass at ${at} ${scale.head} and its principal axes; mass ${formatSignificant(mass / units.mass.factor)} ${units.mass.text}`;
}
