import type { Session } from '#core/api/people.ts';
import { Button } from './button.tsx';
import { type Column, DataTable } from './data-table.tsx';
import { SectionHead } from './section-head.tsx';

type SignIn = Session['demoSignIns'][number];

/** The people of the demo, each with a button that fills the form. A password that all share is said once. */
export function DemoSignIns({
  signIns,
  fill,
}: {
  signIns: readonly SignIn[];
  fill: (email: string, password: string) => void;
}) {
  const shared = signIns.every(({ password }) => password === signIns[0]!.password);
  const columns: Column<SignIn>[] = [
    { key: 'email', head: 'e-mail', cell: ({ email }) => email },
    { key: 'role', head: 'role', cell: ({ role }) => role },
  ];
  if (!shared)
    columns.push({
      key: 'password',
      head: 'password',
      cell: ({ password }) => <span className="code">{password}</span>,
    });
  columns.push({
    key: 'fill',
    head: '',
    cell: ({ email, password, role }) => (
      <Button kind="word" aria-label={`Fill in ${email}, ${role}`} onClick={() => fill(email, password)}>
        Fill in
      </Button>
    ),
  });
  return (
    <section aria-labelledby="demo">
      <SectionHead title="This is a demo" id="demo">
        nobody here is real
      </SectionHead>
      <DataTable
        caption="Sign-ins of the demo"
        rows={signIns}
        keyOf={({ email }) => email}
        columns={columns}
      />
      {shared && (
        <p className="conv mt-2">
          The password of each is <b className="code">{signIns[0]!.password}</b>
        </p>
      )}
    </section>
  );
}
