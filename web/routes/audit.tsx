import { Link, useSearchParams } from 'react-router-dom';
import type { AuditEntry } from '#core/api/people.ts';
import { useAudit } from '#web/api/audit.ts';
import { ActionLink } from '#web/components/button.tsx';
import { DataTable } from '#web/components/data-table.tsx';
import { PageHead } from '#web/components/page-head.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { Time } from '#web/components/time.tsx';
import { View } from '#web/components/view.tsx';
import { PATHS } from '#web/paths.ts';

/** The audit trail, newest first, paged by a cursor in the address. */
export function Component() {
  const [search] = useSearchParams();
  const cursor = search.get('cursor') ?? undefined;
  const page = useAudit(cursor);
  return (
    <>
      <PageHead title="Audit trail">
        Every change of rights, release, token and deletion. Nobody can edit it, administrators included.
      </PageHead>
      <SectionHead title={cursor === undefined ? 'Newest' : 'Older'}>
        {cursor === undefined ? 'newest first' : <Link to={PATHS.audit}>to the newest</Link>}
      </SectionHead>
      <View
        query={page}
        rows={10}
        isEmpty={({ entries }) => entries.length === 0}
        empty={<p>{cursor === undefined ? 'Nothing has happened yet.' : 'Nothing older.'}</p>}
      >
        {({ entries, next }) => (
          <>
            <AuditTable entries={entries} />
            {next !== null && (
              <p className="acts">
                <ActionLink kind="quiet" to={`${PATHS.audit}?${new URLSearchParams({ cursor: next })}`}>
                  Older
                </ActionLink>
              </p>
            )}
          </>
        )}
      </View>
    </>
  );
}

function AuditTable({ entries }: { entries: readonly AuditEntry[] }) {
  return (
    <DataTable
      caption="Audit trail"
      rows={entries}
      keyOf={({ id }) => id}
      columns={[
        { key: 'at', head: 'when', cell: ({ at }) => <Time at={at} /> },
        { key: 'who', head: 'who', cell: ({ who }) => who },
        { key: 'what', head: 'what', cell: ({ what }) => what },
        { key: 'action', head: 'kind', cell: ({ action }) => <span className="code">{action}</span> },
        {
          key: 'project',
          head: 'project',
          cell: ({ project }) => project ?? <span className="soft">–</span>,
        },
        {
          key: 'address',
          head: 'from',
          cell: ({ address }) =>
            address === null ? <span className="soft">–</span> : <span className="code">{address}</span>,
        },
      ]}
    />
  );
}
