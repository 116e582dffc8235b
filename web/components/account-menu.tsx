import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { Session } from '#core/api/people.ts';
import { asProblem } from '#web/api/api-problem.ts';
import { signOut } from '#web/api/session.ts';
import { asSentence } from '#web/lib/sentence.ts';
import { PATHS } from '#web/paths.ts';
import { Disclosure } from './disclosure.tsx';
import { ThemeSwitch } from './theme-switch.tsx';

/** Who is signed in: account, theme, sign out; the demo's mail where the server shows it. */
export function AccountMenu({ session }: { session: Session }) {
  const [fault, setFault] = useState<string | null>(null);
  const person = session.person;
  const leave = () => signOut().catch((error: unknown) => setFault(asSentence(asProblem(error).detail)));
  return (
    <Disclosure label={person?.name ?? 'Theme'} name={person ? `${person.name}: your account` : undefined}>
      {(close) => (
        <>
          {person && (
            <>
              <p>{person.email}</p>
              <Link to={PATHS.account} onClick={close}>
                Account
              </Link>
              {person.administrator && (
                <Link to={PATHS.people} onClick={close}>
                  Everybody on this server
                </Link>
              )}
            </>
          )}
          {session.demo && (
            <Link to={PATHS.mail} onClick={close}>
              Mail of the demo
            </Link>
          )}
          {(person || session.demo) && <hr />}
          <ThemeSwitch />
          {person && (
            <>
              <hr />
              <button type="button" onClick={() => void leave()}>
                Sign out
              </button>
              {fault !== null && <p role="alert">{fault}</p>}
            </>
          )}
        </>
      )}
    </Disclosure>
  );
}
