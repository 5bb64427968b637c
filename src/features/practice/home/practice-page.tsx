import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { PracticeSettings } from '#shared/contracts/practice.ts';
import { useMe } from '#src/api/me.ts';
import { practiceQuery } from '#src/api/practice.queries.ts';
import { useMayInPractice } from '#src/api/use-may.ts';
import { Page, Section } from '#src/ui/page.tsx';
import { Caution, ErrorState, Loading } from '#src/ui/states.tsx';
import { OwnersCode } from './owners-code.tsx';
import { PracticeForm } from './practice-form.tsx';
import { placesFor } from './practice-places.ts';

/** `/practice`: what is set for the practice as a whole, as far as this person may see it. */
export function PracticePage() {
  const { user, practice } = useMe();
  return (
    <Page
      title={practice.name}
      lead={
        user.role === 'owner'
          ? 'What holds for everybody in your practice.'
          : 'What holds for everybody in the practice. The owner sets it.'
      }
    >
      <Section title="Settings" first wide>
        <ul>
          {placesFor(user.role).map(({ to, name, says }) => (
            <li
              key={to}
              className="grid gap-x-6 border-b border-rule py-3 first:pt-0 last:border-0 tablet:grid-cols-[200px_minmax(0,1fr)]"
            >
              <Link to={to} className="tap font-bold">
                {name}
              </Link>
              <span className="text-soft">{says}</span>
            </li>
          ))}
        </ul>
      </Section>
      <ShownToAthletes />
      {user.role === 'owner' && <SignInOfOwners />}
    </Page>
  );
}

function ShownToAthletes() {
  const settings = useQuery(practiceQuery);
  const may = useMayInPractice()('practice.edit');
  return (
    <Section title="Shown to athletes" note="on replays and in mails">
      {settings.data ? (
        may ? (
          <PracticeForm settings={settings.data} />
        ) : (
          <Read settings={settings.data} />
        )
      ) : settings.isError ? (
        <ErrorState error={settings.error} onRetry={() => void settings.refetch()} />
      ) : (
        <Loading label="Loading the practice" />
      )}
    </Section>
  );
}

function SignInOfOwners() {
  const settings = useQuery(practiceQuery);
  // what fails is said once, above
  return settings.data ? (
    <Section title="Sign-in of owners" note="they see every athlete">
      <OwnersCode settings={settings.data} />
    </Section>
  ) : null;
}

function Read({ settings: { name, contact } }: { settings: PracticeSettings }) {
  return (
    <>
      <p className="font-bold">{name}</p>
      {contact === '' ? (
        <Caution title="No contact yet.">
          A replay cannot say whom to call if it hurts. Ask the owner to write one here.
        </Caution>
      ) : (
        <p>{contact}</p>
      )}
    </>
  );
}
