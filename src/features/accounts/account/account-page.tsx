import { useQuery } from '@tanstack/react-query';
import { accountQuery } from '#src/api/accounts.queries.ts';
import { Page, Section } from '#src/ui/page.tsx';
import { ErrorState, Loading, SkeletonLines } from '#src/ui/states.tsx';
import { useHashTarget } from '#src/ui/use-hash-target.ts';
import { CodesSection } from '../codes/codes-section.tsx';
import { LettersSection } from '../letters/letters-section.tsx';
import { EmailSection } from './email-section.tsx';
import { NameForm } from './name-form.tsx';
import { PasswordForm } from './password-form.tsx';
import { Sessions } from './sessions.tsx';

/** One's own account: what others see of one, and how one signs in. */
export function AccountPage() {
  const account = useQuery(accountQuery);
  return (
    <Page title="Your account" lead="Your name, how you sign in, and where you are signed in.">
      {account.data ? (
        <>
          <HashTarget />
          <Section title="Name" note="Others of the practice see it." first>
            <NameForm name={account.data.name} />
          </Section>
          <Section title="E-mail" note="You sign in with it.">
            <EmailSection account={account.data} />
          </Section>
          <Section title="Password" note="You are then signed out everywhere but here.">
            <PasswordForm />
          </Section>
          <Section
            id="codes"
            title="One-time codes"
            note="Six digits from your phone, asked for besides the password."
          >
            <CodesSection codes={account.data.codes} />
          </Section>
          <Section
            id="letters"
            title="Letters"
            note="When something waits for you. They name nobody who was filmed."
          >
            <LettersSection />
          </Section>
          <Section
            title="Signed in"
            note="A device that you do not know? Sign out there, then change your password."
          >
            <Sessions />
          </Section>
        </>
      ) : account.isError ? (
        <ErrorState error={account.error} onRetry={() => void account.refetch()} />
      ) : (
        <Loading label="Loading your account">
          <SkeletonLines count={8} />
        </Loading>
      )}
    </Page>
  );
}

/** Only once the sections are there. */
function HashTarget() {
  useHashTarget();
  return null;
}
