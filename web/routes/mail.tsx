import type { Mail } from '#core/api/people.ts';
import { asProblem } from '#web/api/api-problem.ts';
import { useDemoMail } from '#web/api/demo-mail.ts';
import { Linked } from '#web/components/linked.tsx';
import { PageHead } from '#web/components/page-head.tsx';
import { NotFound } from '#web/components/problem-page.tsx';
import { SectionHead } from '#web/components/section-head.tsx';
import { Time } from '#web/components/time.tsx';
import { View } from '#web/components/view.tsx';

/** Mail that the demo kept instead of sending it. */
export function Component() {
  const mail = useDemoMail();
  if (asProblem(mail.error).status === 404) return <NotFound />;
  return (
    <>
      <PageHead title="Mail of the demo">
        The demo sends nothing: what it would have sent is kept here, the newest first. Its links work.
      </PageHead>
      <View
        query={mail}
        isEmpty={(list) => list.length === 0}
        empty={
          <>
            <SectionHead title="No mail yet" />
            <p>Invite somebody, or ask for a new password, and look again.</p>
          </>
        }
      >
        {(list) => (
          <div className="mails">
            {list.map((message, i) => (
              <Message key={message.id} message={message} open={i === 0} />
            ))}
          </div>
        )}
      </View>
    </>
  );
}

/** One message, shut but for the newest; its head opens it. */
function Message({ message: { to, at, subject, text }, open }: { message: Mail; open: boolean }) {
  return (
    <details open={open}>
      <summary>
        <b>{subject}</b>
        <span className="soft">
          to {to} · <Time at={at} />
        </span>
      </summary>
      <p className="max-w-[80ch] whitespace-pre-wrap">
        <Linked text={text} />
      </p>
    </details>
  );
}
