import type { Difference } from '#core/difference/index.ts';
import { Notice } from '#web/components/notice.tsx';

/** What the two sides do not say alike, before any figure: first what makes the figures mean something else. */
export function ConventionsDiffer({ conventions }: Pick<Difference, 'conventions'>) {
  const figures = conventions.filter((c) => c.bearing === 'figures');
  const display = conventions.filter((c) => c.bearing === 'display');
  if (conventions.length === 0) return null;
  return (
    <Notice
      kind={figures.length > 0 ? 'bad' : 'plain'}
      title={
        figures.length > 0
          ? 'The two sides do not say the same about themselves: the figures may not mean the same'
          : 'The two files are written in different units'
      }
    >
      <ul className="list-disc pl-5">
        {[...figures, ...display].map((c) => (
          <li key={c.what}>
            {c.sentence}
            {figures.length > 0 && c.bearing === 'display' && (
              <span className="soft"> Only how figures are written.</span>
            )}
          </li>
        ))}
      </ul>
    </Notice>
  );
}
