import { useQueryClient } from '@tanstack/react-query';
import { useRef } from 'react';
import { Link, Navigate, useSearchParams } from 'react-router-dom';
import { request } from '#web/api/client.ts';
import { enter } from '#web/api/session.ts';
import { DemoSignIns } from '#web/components/demo-sign-ins.tsx';
import { Field } from '#web/components/field.tsx';
import { Form } from '#web/components/form.tsx';
import { Notice } from '#web/components/notice.tsx';
import { PageHead } from '#web/components/page-head.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { useSessionHere } from '#web/hooks/use-session-here.ts';
import { announce } from '#web/lib/announce.ts';
import { exactTextOf, faultsOf, textOf } from '#web/lib/form-values.ts';
import { PATHS } from '#web/paths.ts';

/** Sign in, then go on to where one wanted to go. */
export function Component() {
  const session = useSessionHere();
  const client = useQueryClient();
  const [search] = useSearchParams();
  const fields = useRef<HTMLDivElement>(null);
  const to = ownAddress(search.get('to'));
  if (session.person) return <Navigate to={to} replace />;
  const fill = (email: string, password: string) => {
    const inputs = fields.current?.querySelectorAll('input');
    if (!inputs) return;
    inputs[0]!.value = email;
    inputs[1]!.value = password;
    announce(`Filled in as ${email}`);
    fields.current?.closest('form')?.querySelector<HTMLElement>('[type="submit"]')?.focus();
  };
  return (
    <>
      <PageHead title="Sign in">
        The mass, the centre of mass and the inertia tensor of what your team builds, with every change since
        the last release.
      </PageHead>
      {search.has('to') && <Notice>To see the page you asked for, sign in first.</Notice>}
      {search.has('set') && <Notice kind="good">Your new password is set. Sign in with it.</Notice>}
      <div className="cols">
        <section aria-labelledby="yours">
          <SectionHead title="With your account" id="yours" />
          <Form
            act="Sign in"
            acting="Signing in…"
            check={(values) =>
              faultsOf({
                email: textOf(values, 'email') === '' && 'Write the e-mail address of your account.',
                password: exactTextOf(values, 'password') === '' && 'Write your password.',
              })
            }
            submit={async (values) => {
              const body = { email: textOf(values, 'email'), password: exactTextOf(values, 'password') };
              enter(client, await request('signIn', { body }));
            }}
            beside={<Link to={PATHS.askReset}>Forgotten your password?</Link>}
          >
            <div ref={fields} className="grid w-full gap-[18px]">
              <Field name="email" label="E-mail" type="email" autoComplete="username" />
              <Field name="password" label="Password" type="password" autoComplete="current-password" />
            </div>
          </Form>
        </section>
        {session.demo && session.demoSignIns.length > 0 && (
          <DemoSignIns signIns={session.demoSignIns} fill={fill} />
        )}
      </div>
    </>
  );
}

/** Only an address of this site is gone on to. */
function ownAddress(to: string | null): string {
  return to?.startsWith('/') && !/^\/[/\\]/.test(to) ? to : PATHS.projects;
}
