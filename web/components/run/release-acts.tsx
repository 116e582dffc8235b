import { type ReactNode, useEffect, useRef, useState } from 'react';
import type { RunDetail } from '#core/api/runs.ts';
import { type ReleaseAct, useReleaseAct } from '#web/api/releases.ts';
import { Button } from '#web/components/button.tsx';
import { TextField } from '#web/components/field.tsx';
import { Form } from '#web/components/form.tsx';
import { ProblemNotice } from '#web/components/problem-notice.tsx';
import { useProject } from '#web/hooks/use-project.ts';
import { announce } from '#web/lib/announce.ts';
import { atLeast } from '#web/lib/roles.ts';

const DONE: Record<ReleaseAct['act'], string> = {
  ask: 'Release asked for',
  check: 'Marked as checked',
  release: 'Released as the baseline',
  withdraw: 'Release withdrawn',
};

/** Ask, check, release, withdraw: what one's role does is there, and says why where it cannot be done now. */
export function ReleaseActs({ detail, project }: { detail: RunDetail; project: string }) {
  const { may, needsReason, run } = detail;
  const { role } = useProject();
  const act = useReleaseAct(project, run.id);
  const [asking, setAsking] = useState<'release' | 'withdraw' | null>(null);
  const place = useRef<HTMLDivElement>(null);
  const perform = async (what: ReleaseAct) => {
    await act.mutateAsync(what);
    announce(DONE[what.act]);
    setAsking(null);
    place.current?.focus();
  };
  const now = (what: ReleaseAct) => void perform(what).catch(() => undefined);
  const released = detail.release?.state === 'released';
  const engineer = atLeast(role, 'engineer');
  const approver = atLeast(role, 'approver');
  const buttons: { name: string; allowed: RunDetail['may']['ask']; onClick: () => void; shown: boolean }[] = [
    {
      name: 'Ask for release',
      allowed: may.ask,
      onClick: () => now({ act: 'ask' }),
      shown: engineer && !released,
    },
    {
      name: 'Mark as checked',
      allowed: may.check,
      onClick: () => now({ act: 'check' }),
      shown: engineer && !released,
    },
    {
      name: needsReason ? 'Release with a reason …' : 'Release',
      allowed: may.release,
      onClick: () => (needsReason ? setAsking('release') : now({ act: 'release' })),
      shown: approver && !released,
    },
    {
      name: released ? 'Withdraw …' : 'Decline …',
      allowed: may.withdraw,
      onClick: () => setAsking('withdraw'),
      shown: approver && may.withdraw.allowed,
    },
  ];
  const shown = buttons.filter((b) => b.shown);
  if (shown.length === 0) return null;
  return (
    <div ref={place} tabIndex={-1} className="screen-only outline-none">
      {act.error && asking === null && <ProblemNotice error={act.error} />}
      <div className="acts">
        {shown.map((b, i) => (
          <Button
            key={b.name}
            kind={i === shown.findIndex((x) => x.allowed.allowed) ? 'plain' : 'quiet'}
            disabled={!b.allowed.allowed || act.isPending}
            aria-describedby={b.allowed.allowed ? undefined : 'release-why'}
            onClick={b.onClick}
          >
            {b.name}
          </Button>
        ))}
      </div>
      <ul id="release-why" className="soft mt-2 max-w-[80ch] text-sm">
        {shown.map(
          (b) =>
            !b.allowed.allowed &&
            b.allowed.why && (
              <li key={b.name}>
                <b>{b.name.replace(' …', '')}</b>: {b.allowed.why}
              </li>
            ),
        )}
      </ul>
      {asking === 'release' && (
        <Reason
          act="Release with this reason"
          label="Why it is released with a broken limit"
          why="It stays with the record and stands in every report."
          onCancel={() => setAsking(null)}
          onReason={(reason) => perform({ act: 'release', reason })}
        />
      )}
      {asking === 'withdraw' && (
        <Reason
          act="Withdraw the release"
          label="Why the release is withdrawn"
          why="The run is no longer a baseline. Whoever asked for mail about releases is told."
          grave
          onCancel={() => setAsking(null)}
          onReason={(reason) => perform({ act: 'withdraw', reason })}
        />
      )}
    </div>
  );
}

function Reason({
  act,
  label,
  why,
  grave = false,
  onCancel,
  onReason,
}: {
  act: string;
  label: string;
  why: ReactNode;
  grave?: boolean;
  onCancel: () => void;
  onReason: (reason: string) => Promise<void>;
}) {
  const frame = useRef<HTMLDivElement>(null);
  useEffect(() => frame.current?.querySelector('textarea')?.focus(), []);
  return (
    <div ref={frame}>
      <Form
        act={act}
        kind={grave ? 'grave' : 'plain'}
        name={label}
        check={(values) =>
          String(values.get('reason')).trim().length < 3
            ? { reason: 'Give the reason in a few words.' }
            : ({} as Record<string, string>)
        }
        submit={(values) => onReason(String(values.get('reason')).trim())}
        beside={
          <Button kind="quiet" onClick={onCancel}>
            Leave it
          </Button>
        }
      >
        <TextField name="reason" label={label} why={why} rows={3} maxLength={2000} />
      </Form>
    </div>
  );
}
