import type { RunDetail } from '#core/api/runs.ts';
import { runName } from '#web/components/history/run-name.ts';
import { ReleasedMark } from '#web/components/released-mark.tsx';
import { Time } from '#web/components/time.tsx';
import type { RunView } from './run-view.ts';
import { unitsInWords } from './run-view.ts';

/** Whose figures these are and how they are to be read, in one line under the title. */
export function ConventionsLine({ detail: { run, record }, view }: { detail: RunDetail; view: RunView }) {
  const { frame } = record.conventions;
  return (
    <p>
      {run.release === 'released' && <ReleasedMark />}
      {run.release === 'withdrawn' && <ReleasedMark withdrawn />}
      Run of <span className="code">{runName(run)}</span>
      {run.branch && (
        <>
          {' '}
          on <span className="code break-all">{run.branch}</span>
        </>
      )}
      {run.dirty && <b>, not as committed</b>}, <Time at={run.at} />. <Recomputation run={run} />{' '}
      {view.about === 'centre' ? <b>About the centre of mass</b> : <b>About the origin</b>}, body axes{' '}
      {frame ? (
        <>
          <b>
            x {frame.x}, y {frame.y}, z {frame.z}
          </b>
          , origin at {frame.origin}
        </>
      ) : (
        'and origin as in the file, which names no frame'
      )}
      , products <b>{view.products}</b> (<ProductsMeaning products={view.products} />
      ), <b>{record.conventions.growth ? view.on : 'basic'}</b> masses, units {unitsInWords(view.units)}.
    </p>
  );
}

export const ProductsMeaning = ({ products }: { products: RunView['products'] }) => (
  <span className="whitespace-nowrap">
    {products === 'negative' ? 'I' : 'P'}
    <sub>xy</sub> = {products === 'negative' ? '−' : '+'}∫xy dm
  </span>
);

function Recomputation({ run: { recomputation } }: { run: RunDetail['run'] }) {
  const { status, detail } = recomputation;
  if (status === 'recomputed') return 'Recomputed here to the same bits.';
  if (status === 'waiting') return 'Waiting to be recomputed here.';
  return (
    <b className="outside">
      {status === 'differs' ? 'Recomputed here with another result' : 'Cannot be recomputed here'}
      {detail ? `: ${detail}` : ''}.
    </b>
  );
}
