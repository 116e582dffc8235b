import { decimalsFor, formatFixed, PLAIN_ROOM, scaleFor } from '#core/figures/index.ts';
import type { FrameTotals, RollUpRecord } from '#core/record/record.ts';
import { Matrix } from '#web/components/matrix.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import type { RunView } from './run-view.ts';
import { printRows } from './tensor.tsx';

/** Centre and tensor in every frame that the file names, in that frame's own axes. */
export function FramesSection({ record, view }: { record: RollUpRecord; view: RunView }) {
  const frames = Object.entries(record.frames);
  if (frames.length === 0) return null;
  return (
    <section aria-labelledby="frames">
      <SectionHead title="In named frames" id="frames">
        {record.conventions.growth ? view.on : 'basic'}, in the axes of each frame, products {view.products}
      </SectionHead>
      <div className="grid gap-x-14 gap-y-8 md:grid-cols-2">
        {frames.map(([name, frame]) => (
          <Frame key={name} name={name} frame={frame} view={view} />
        ))}
      </div>
    </section>
  );
}

function Frame({ name, frame, view }: { name: string; frame: FrameTotals; view: RunView }) {
  const { centre, inertia } = frame[view.on];
  const tensor = inertia && (view.about === 'centre' ? inertia.aboutCentre : inertia.aboutOrigin);
  const printed = tensor && printRows(tensor, view);
  const about = view.about === 'centre' ? 'about the centre of mass' : 'about the origin of the frame';
  return (
    <div className="min-w-0">
      <h3 className="font-semibold">{name}</h3>
      <p className="soft mb-2 text-sm">
        {frame.note ? `${frame.note}; ` : ''}origin at {vector(frame.at, view)} in body axes
      </p>
      {printed && (
        <>
          <p className="mb-2 text-sm">
            Centre {vector(centre!, view)}; tensor {about}, {printed.head}:
          </p>
          <Matrix rows={printed.rows} label={`Inertia tensor in frame ${name}, ${about}, ${printed.head}`} />
          {printed.note && <p className="soft mt-2 text-sm">{printed.note}</p>}
        </>
      )}
    </div>
  );
}

/** `[12.0, 0.0, −3.5] mm`. */
function vector(metres: readonly number[], { units }: RunView) {
  const scale = scaleFor(units.length, metres, PLAIN_ROOM);
  const shown = metres.map((x) => x / scale.factor);
  const decimals = Math.min(decimalsFor(shown), 6);
  return (
    <span className="whitespace-nowrap">
      <span className="code">[{shown.map((x) => formatFixed(x, decimals)).join(', ')}]</span> {scale.head}
    </span>
  );
}
