import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { Choices } from '#core/api/runs.ts';
import { Choice } from '#web/components/sentence/choice.tsx';
import { Entry } from '#web/components/sentence/entry.tsx';
import type { Option } from '#web/components/sentence/option.ts';
import { type HistoryView, isFiltered } from './history-view.ts';
import { dayText, sinceOptions } from './since-options.ts';

const VERDICTS = [
  { value: '', label: 'within or outside' },
  { value: 'within', label: 'within its limits' },
  { value: 'outside', label: 'outside a limit' },
  { value: 'unlimited', label: 'without limits' },
];

/** The filters of the history as a sentence; each choice goes to the address. */
export function HistorySentence({
  view,
  choices,
  change,
}: {
  view: HistoryView;
  choices: Choices | undefined;
  change: (changes: Record<string, string | null>) => void;
}) {
  const { filter } = view;
  const choose = (key: string) => (value: string) => change({ [key]: value || null });
  return (
    <search className="block">
      <p className="sentence">
        Every run of{' '}
        <Choice
          name="assembly"
          value={filter.assembly ?? ''}
          options={named('any assembly', choices?.assemblies, filter.assembly)}
          onChoose={choose('assembly')}
        />{' '}
        in{' '}
        <Choice
          name="state"
          value={filter.state ?? ''}
          options={named('any state', choices?.states, filter.state)}
          onChoose={choose('state')}
        />{' '}
        on{' '}
        <Choice
          name="branch"
          value={filter.branch ?? ''}
          options={named('any branch', choices?.branches, filter.branch)}
          onChoose={choose('branch')}
        />
        ,{' '}
        <Choice name="verdict" value={filter.verdict ?? ''} options={VERDICTS} onChoose={choose('verdict')} />
        , since <Since since={filter.since} onChoose={choose('since')} />.{' '}
        {isFiltered(view) && (
          <Link to="?" className="text-[15px]">
            Start over
          </Link>
        )}
      </p>
    </search>
  );
}

/** What is chosen stays on the list even where the server no longer names it. */
function named(
  any: string,
  names: readonly string[] | undefined,
  chosen: string | undefined,
): Option<string>[] {
  const all = new Set(names ?? []);
  if (chosen !== undefined) all.add(chosen);
  return [{ value: '', label: any }, ...[...all].map((name) => ({ value: name, label: name }))];
}

const ANOTHER = 'another';

function Since({ since, onChoose }: { since: string | undefined; onChoose: (value: string) => void }) {
  const [writing, setWriting] = useState(false);
  if (writing)
    return (
      <Entry
        name="since the day"
        type="date"
        first={since ?? ''}
        onDone={(day) => {
          setWriting(false);
          if (day !== null) onChoose(day);
        }}
      />
    );
  const options = sinceOptions(new Date());
  const known = options.some((option) => option.value === (since ?? ''));
  return (
    <Choice
      name="since"
      value={since ?? ''}
      options={[
        ...options,
        ...(known ? [] : [{ value: since!, label: dayText(since!) }]),
        { value: ANOTHER, label: 'another day …' },
      ]}
      onChoose={(value) => (value === ANOTHER ? setWriting(true) : onChoose(value))}
    />
  );
}
