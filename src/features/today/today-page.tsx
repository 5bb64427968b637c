import { useQuery } from '@tanstack/react-query';
import type { Today } from '#shared/contracts/today.ts';
import { useMe } from '#src/api/me.ts';
import { todayQuery } from '#src/api/today.queries.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { weekday } from '#src/ui/days.ts';
import { capital, inWords } from '#src/ui/figures.ts';
import { Page, Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Empty, ErrorState, Loading, Skeleton } from '#src/ui/states.tsx';
import { groupTasks, isWork } from './groups.ts';
import { TaskRow } from './task-row.tsx';
import { taskOf } from './task-of.ts';

/** What waits for the person signed in; each row opens the exact place. */
export function TodayPage() {
  const { user } = useMe();
  const today = useQuery(todayQuery);
  const given = user.name.split(' ')[0] ?? user.name;
  return (
    <Page
      title={weekday()}
      documentTitle="Today"
      lead={
        today.data ? leadOf(today.data, given) : <Skeleton className="h-[30px] w-80 max-w-full" />
      }
      actions={
        <>
          <ButtonLink to={paths.newAthlete()}>Add an athlete</ButtonLink>
          {today.data !== undefined && today.data.athletes > 0 && (
            <ButtonLink to={paths.athletes()}>New visit</ButtonLink>
          )}
        </>
      }
    >
      {today.isPending && (
        <Section title="Looking" wide>
          <Loading label="Looking for what waits" />
        </Section>
      )}
      {today.isError && !today.data && (
        <ErrorState error={today.error} onRetry={() => void today.refetch()} />
      )}
      {today.data && <Tasks today={today.data} />}
    </Page>
  );
}

function leadOf(today: Today, given: string): string {
  const count = today.items.map(taskOf).filter(isWork).length;
  if (today.athletes === 0) return `Welcome, ${given}. It starts with an athlete.`;
  if (count === 0) return `Nothing waits for you, ${given}.`;
  return count === 1
    ? `One thing waits for you, ${given}.`
    : `${capital(inWords(count))} things wait for you, ${given}.`;
}

function Tasks({ today }: { today: Today }) {
  const { user } = useMe();
  if (today.athletes === 0) return <FirstAthlete />;
  const groups = groupTasks(today.items.map(taskOf), user.role);
  if (groups.length === 0)
    return (
      <Section title="Next" wide>
        <Empty
          title={today.visitsThisWeek === 0 ? 'No visit yet this week' : 'All done for now'}
          action={<ButtonLink to={paths.athletes()}>Choose an athlete for a visit</ButtonLink>}
        >
          Clips to call, reps to mark, readings and comments appear here as they come.
        </Empty>
      </Section>
    );
  const first = groups.flatMap(({ tasks }) => tasks).find(isWork);
  return groups.map(({ group, name, tasks }) => (
    <Section
      key={group}
      title={name}
      wide
      note={
        <span className="mt-1 block text-value font-light leading-10 tracking-[-0.015em] text-ink">
          {tasks.length}
        </span>
      }
    >
      <ul>
        {tasks.map((task) => (
          <TaskRow key={task.key} task={task} pressing={task === first} />
        ))}
      </ul>
    </Section>
  ));
}

function FirstAthlete() {
  return (
    <Section title="To begin" wide>
      <ol className="max-w-lead">
        {[
          ['Add an athlete', 'Name, date of birth, body height, and what to be careful with.'],
          [
            'Record their consent',
            'For a minor, from a guardian. Without it nothing can be filmed.',
          ],
          ['Film and send a clip', 'The visit leads through the safety questions and the filming.'],
          ['Say what you saw', 'Your call by eye comes first; then mark, and read the course.'],
        ].map(([step, words], n) => (
          <li key={step} className="flex gap-4 border-b border-rule py-3 first:pt-0 last:border-0">
            <span className="text-soft">{n + 1}</span>
            <span>
              <b>{step}</b>
              <span className="block text-soft">{words}</span>
            </span>
          </li>
        ))}
      </ol>
      <ButtonLink look="primary" to={paths.newAthlete()} className="mt-5">
        Add the first athlete
      </ButtonLink>
    </Section>
  );
}
