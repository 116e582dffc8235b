import { useAccount } from '#web/api/account.ts';
import { MailChoices } from '#web/components/account/mail-choices.tsx';
import { NameForm } from '#web/components/account/name-form.tsx';
import { PasswordForm } from '#web/components/account/password-form.tsx';
import { Sessions } from '#web/components/account/sessions.tsx';
import { PageHead } from '#web/components/page-head.tsx';
import { View } from '#web/components/view.tsx';

/** One's own account. */
export function Component() {
  const account = useAccount();
  return (
    <>
      <PageHead title="Your account">{account.data?.email ?? '\u00a0'}</PageHead>
      <View query={account} rows={10}>
        {(data) => (
          <>
            <div className="cols">
              <div>
                <NameForm name={data.name} />
                <PasswordForm email={data.email} />
              </div>
              <MailChoices mail={data.mail} />
            </div>
            <Sessions sessions={data.sessions} />
          </>
        )}
      </View>
    </>
  );
}
