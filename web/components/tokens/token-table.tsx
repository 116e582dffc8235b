import type { Token } from '#core/api/people.ts';
import { request } from '#web/api/client.ts';
import { Confirm } from '#web/components/confirm.tsx';
import { DataTable } from '#web/components/data-table.tsx';
import { Time } from '#web/components/time.tsx';

/** Tokens with how long they hold and when they were last used. */
export function TokenTable({
  project,
  tokens,
  changed,
}: {
  project: string;
  tokens: readonly Token[];
  changed: () => Promise<unknown>;
}) {
  return (
    <DataTable
      caption="Tokens"
      rows={tokens}
      keyOf={({ id }) => id}
      columns={[
        { key: 'label', head: 'what for', cell: ({ label }) => label },
        {
          key: 'owner',
          head: 'whose',
          cell: ({ kind, owner }) => (kind === 'machine' ? `a machine’s, made by ${owner}` : owner),
        },
        {
          key: 'scope',
          head: 'may',
          cell: ({ scope }) => (scope === 'push' ? 'push and read' : 'read'),
        },
        { key: 'made', head: 'made', cell: ({ createdAt }) => <Time at={createdAt} dayOnly /> },
        {
          key: 'used',
          head: 'last used',
          cell: ({ lastUsedAt }) => (lastUsedAt === null ? 'never' : <Time at={lastUsedAt} />),
        },
        { key: 'state', head: 'holds', cell: (token) => <Holds token={token} /> },
        {
          key: 'acts',
          head: '',
          cell: ({ id, label, mayRevoke, revokedAt }) =>
            mayRevoke && revokedAt === null ? (
              <Confirm
                act="Revoke"
                name={`Revoke ${label}`}
                question="What uses it is refused from now on."
                yes="Revoke it"
                done={`${label} is revoked`}
                run={async () => {
                  await request('revokeToken', { places: { project, token: String(id) } });
                  await changed();
                }}
              />
            ) : null,
        },
      ]}
    />
  );
}

function Holds({ token: { revokedAt, expiresAt } }: { token: Token }) {
  if (revokedAt !== null)
    return (
      <span className="soft">
        revoked <Time at={revokedAt} dayOnly />
      </span>
    );
  if (Date.parse(expiresAt) <= Date.now())
    return (
      <span className="soft">
        expired <Time at={expiresAt} dayOnly />
      </span>
    );
  return (
    <>
      until <Time at={expiresAt} dayOnly />
    </>
  );
}
