import { useState } from 'react';
import type { Member } from '#core/api/people.ts';
import { asProblem } from '#web/api/api-problem.ts';
import { request } from '#web/api/client.ts';
import { Button } from '#web/components/button.tsx';
import { announce } from '#web/lib/announce.ts';
import { MEMBER_ROLES } from '#web/lib/roles.ts';
import { asSentence } from '#web/lib/sentence.ts';

/** A member's role, and a button that gives another once another is chosen. */
export function RoleChanger({
  project,
  member,
  changed,
}: {
  project: string;
  member: Member;
  changed: () => Promise<unknown>;
}) {
  const [chosen, setChosen] = useState(member.role);
  const [fault, setFault] = useState<string | null>(null);
  const give = async () => {
    setFault(null);
    try {
      await request('setMember', {
        places: { project, person: String(member.person) },
        body: { role: chosen },
      });
      await changed();
      announce(`${member.name} is now ${chosen}`);
    } catch (error) {
      setFault(asSentence(asProblem(error).detail));
    }
  };
  return (
    <span className="inline-flex flex-wrap items-center gap-x-3">
      <select
        className="entry"
        aria-label={`Role of ${member.name}`}
        value={chosen}
        onChange={(event) => setChosen(event.target.value as Member['role'])}
      >
        {MEMBER_ROLES.map(({ role }) => (
          <option key={role}>{role}</option>
        ))}
      </select>
      {chosen !== member.role && (
        <Button kind="word" aria-label={`Make ${member.name} ${chosen}`} onClick={() => void give()}>
          Give this role
        </Button>
      )}
      {fault !== null && (
        <span role="alert" className="outside">
          {fault}
        </span>
      )}
    </span>
  );
}
