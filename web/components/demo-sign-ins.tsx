import type { Session } from '#core/api/people.ts';
import { Button } from './button.tsx';
import { DataTable } from './data-table.tsx';
import { SectionHead } from './section-head.tsx';

/** The people of the demo, each with a button that fills the form. */
export function DemoSignIns({
  signIns,
  fill,
}: {
  signIns: Session['demoSignIns'];
  fill: (email: string, password: string) => void;
}) {
  return (
    <section aria-labelledby="demo">
      <SectionHead title="This is a demo" id="demo">
        nobody here is real
      </SectionHead>
      <DataTable
        caption="Sign-ins of the demo"
        rows={signIns}
        keyOf={(row) => row.email}
        columns={[
          { key: 'email', head: 'e-mail', cell: (row) => row.email },
          { key: 'role', head: 'role', cell: (row) => row.role },
          { key: 'password', head: 'password', cell: (row) => <span className="code">{row.password}</span> },
          {
            key: 'fill',
            head: '',
            cell: (row) => (
              <Button
                kind="word"
                aria-label={`Fill in ${row.email}, ${row.role}`}
                onClick={() => fill(row.email, row.password)}
              >
                Fill in
              </Button>
            ),
          },
        ]}
      />
    </section>
  );
}
