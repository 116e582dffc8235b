import type { Comparison } from '#core/api/runs.ts';
import { plainText } from '#core/figures/index.ts';
import { SectionHead } from '#web/components/section-head.tsx';
import { type PatchLine, patchLines } from './patch-lines.ts';

/** What changed in the text of the inputs: lines by sign and by colour. */
export function TextsChangeSection({ comparison: { texts, difference } }: { comparison: Comparison }) {
  const { inputs } = difference;
  const other = inputs.filter((i) => !texts.some((t) => t.path === i.path));
  return (
    <section aria-labelledby="texts">
      <SectionHead title="Text of the inputs" id="texts">
        {inputs.length === 0
          ? 'no file changed'
          : inputs.length === 1
            ? 'one file'
            : `${inputs.length} files`}
      </SectionHead>
      {texts.map(({ path, patch }) => (
        <OneText
          key={path}
          path={path}
          what={inputs.find((i) => i.path === path)?.change ?? 'changed'}
          lines={patchLines(patch)}
        />
      ))}
      {other.length > 0 && (
        <ul>
          {other.map((i) => (
            <li key={i.path} className="border-b border-rule py-1.5">
              <span className="code break-all">{i.path}</span>{' '}
              <span className="soft">{i.change}; no text, or one too long to be compared here</span>
            </li>
          ))}
        </ul>
      )}
    </section>
  );
}

function OneText({ path, what, lines }: { path: string; what: string; lines: readonly PatchLine[] }) {
  const count = (kind: PatchLine['kind']) => lines.filter((l) => l.kind === kind).length;
  return (
    <div className="mb-6">
      <h3 className="code mb-1 break-all">
        {path}{' '}
        <span className="soft">
          {what} · +{count('added')} −{count('removed')}
        </span>
      </h3>
      <section
        aria-label={`Changes in ${path}`}
        // biome-ignore lint/a11y/noNoninteractiveTabindex: what scrolls must be reachable by keyboard
        tabIndex={0}
        className="max-h-[75vh] overflow-auto print:max-h-none"
      >
        <pre className="w-max min-w-full">
          {lines.map((line, i) => (
            // biome-ignore lint/suspicious/noArrayIndexKey: the lines never move
            <Line key={i} line={line} />
          ))}
        </pre>
      </section>
    </div>
  );
}

const SIGN = { added: '+', removed: '−', same: ' ', head: ' ' } as const;
const TONE = {
  added: 'border-brass bg-paper-deep text-brass',
  removed: 'border-edge bg-paper-deep text-ink-soft',
  same: 'border-transparent',
  head: 'border-transparent text-ink-soft',
} as const;

function Line({ line }: { line: PatchLine }) {
  if (line.kind === 'head')
    return (
      <div className="mt-2 border-l-[3px] border-transparent py-1 font-text text-sm text-ink-soft">
        {line.text}
      </div>
    );
  return (
    <div className={`border-l-[3px] pr-4 ${TONE[line.kind]}`}>
      <span aria-hidden="true" className="inline-block w-10 select-none text-right text-ink-soft">
        {line.a ?? ''}
      </span>
      <span aria-hidden="true" className="mr-3 inline-block w-10 select-none text-right text-ink-soft">
        {line.b ?? ''}
      </span>
      <span className="font-bold">{SIGN[line.kind]} </span>
      {plainText(line.text.replaceAll('\t', '  '))}
    </div>
  );
}
