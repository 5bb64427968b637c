import { useQuery } from '@tanstack/react-query';
import { useMe } from '#src/api/me.ts';
import { peopleQuery } from '#src/api/people.queries.ts';
import { useMayInPractice } from '#src/api/use-may.ts';
import { Page, Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { ErrorState, Loading, SkeletonLines } from '#src/ui/states.tsx';
import { Invitations } from './invitations.tsx';
import { InviteForm } from './invite-form.tsx';
import { PeopleList } from './people-list.tsx';

/** Who works in the practice, as what, and who sees whose athletes. */
export function PeoplePage() {
  const { practice } = useMe();
  const mayManage = useMayInPractice()('people.manage');
  return (
    <Page
      crumbs={[{ label: 'Practice', to: paths.practice() }, { label: 'people' }]}
      title="People"
      lead={
        mayManage
          ? `Who works in ${practice.name}, as what, and whose athletes each supervisor sees.`
          : `The owner of ${practice.name} invites people and sets who sees what.`
      }
    >
      {mayManage && <Managed />}
    </Page>
  );
}

function Managed() {
  const people = useQuery(peopleQuery);
  if (people.data)
    return (
      <>
        <Section title="Invite somebody" first>
          <InviteForm />
        </Section>
        <Section
          title="Invited"
          note="A link works once and for seven days. The letter goes out within moments."
          wide
        >
          <Invitations invitations={people.data.invitations} />
        </Section>
        <Section title="In the practice" wide>
          <PeopleList people={people.data.people} />
        </Section>
      </>
    );
  return people.isError ? (
    <ErrorState error={people.error} onRetry={() => void people.refetch()} />
  ) : (
    <Loading label="Loading people">
      <SkeletonLines count={6} />
    </Loading>
  );
}
