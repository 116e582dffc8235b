import { useQuery } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import { useLocation } from 'react-router-dom';
import type { InputTexts } from '#core/api/runs.ts';
import type { RollUpRecord } from '#core/record/record.ts';
import { inputsQuery } from '#web/api/run.ts';
import { SectionHead } from '#web/components/section-head.tsx';
import { View } from '#web/components/view.tsx';
import { readLineAnchor } from './line-anchor.ts';
import { NumberedText, type Remark } from './numbered-text.tsx';

/** The text of every input with its line numbers; lines of warnings and of broken limits are marked. */
export function InputsSection({
  record,
  project,
  run,
}: {
  record: RollUpRecord;
  project: string;
  run: string;
}) {
  const { hash } = useLocation();
  const wanted = readLineAnchor(hash);
  const [open, setOpen] = useState<ReadonlySet<string>>(new Set());
  const asked = open.size > 0 || wanted !== null;
  const inputs = useQuery({
    ...inputsQuery(project, run),
    enabled: asked,
    staleTime: Number.POSITIVE_INFINITY,
  });
  const remarks = remarksOf(record);
  const file = wanted?.file;
  useEffect(() => {
    if (file !== undefined) setOpen((before) => new Set(before).add(file));
  }, [file]);
  const toggle = (path: string, shown: boolean) =>
    setOpen((before) => {
      const next = new Set(before);
      if (shown) next.add(path);
      else next.delete(path);
      return next;
    });
  return (
    <section aria-labelledby="inputs" className="screen-only">
      <SectionHead title="Inputs" id="inputs">
        as they were computed from, each by its SHA-256
      </SectionHead>
      {record.inputs.map(({ path, sha256 }) => (
        <details
          key={path}
          open={open.has(path)}
          onToggle={(event) => toggle(path, event.currentTarget.open)}
          className="border-b border-rule py-1.5"
        >
          <summary>
            <span className="code break-all">{path}</span>{' '}
            <span className="soft code" title={sha256}>
              {sha256.slice(0, 12)}
            </span>
          </summary>
          {open.has(path) && (
            <View query={inputs} rows={8}>
              {(texts) => (
                <OneInput
                  input={texts.find((t) => t.path === path)}
                  remarks={remarks.filter((r) => r.file === path)}
                  wanted={wanted?.file === path ? wanted.line : null}
                />
              )}
            </View>
          )}
        </details>
      ))}
    </section>
  );
}

function OneInput({
  input,
  remarks,
  wanted,
}: {
  input: InputTexts[number] | undefined;
  remarks: readonly Remark[];
  wanted: number | null;
}) {
  if (!input) return <p className="soft py-2">The server does not have this input.</p>;
  if (input.text === null)
    return (
      <p className="soft py-2">
        Not a text{input.bytes === null ? '' : `: ${input.bytes.toLocaleString('en-GB')} bytes`}.
      </p>
    );
  return <NumberedText path={input.path} text={input.text} remarks={remarks} wanted={wanted} />;
}

function remarksOf({ warnings, limits }: RollUpRecord): (Remark & { file: string })[] {
  return [
    ...warnings.flatMap((w) => (w.at ? [{ ...w.at, text: `${w.code}: ${w.message}` }] : [])),
    ...limits
      .filter((l) => l.verdict === 'outside')
      .map((l) => ({ ...l.at, text: `limit ${l.name} is broken` })),
  ];
}
