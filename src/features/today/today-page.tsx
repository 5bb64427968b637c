import { useQuery } from '@tanstack/react-query';
import type { Today } from '#shared/contracts/today.ts';
import { useMe } from '#src/api/me.ts';
import { todayQuery } from '#src/api/today.queries.ts';
import { useMayInPractice } from '#src/api/use-may.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { weekday } from '#src/ui/days.ts';
import { capital, inWords } from '#src/ui/figures.ts';
import { Page, Section } from '#src/ui/page.tsx';
import { paths } from '#src/ui/paths.ts';
import { Empty, ErrorState, Loading, Skeleton } from '#src/ui/states.tsx';
import { FirstSteps, isBeginning } from './first-steps.tsx';
import { groupTasks, isWork } from './groups.ts';
import { TaskRow } from './task-row.tsx';
import { taskOf } from './task-of.ts';

/** What waits for the person signed in; each row opens the exact place. */
export function TodayPage() {
  const { user } = useMe();
  const mayAdd = useMayInPractice()('athlete.add');
  const today = useQuery(todayQuery);
  const given = user.name.split(' ')[0] ?? user.name;
  return (
    <Page
      title={weekday()}
      documentTitle="Today"
      lead={
        today.data ? (
          leadOf(today.data, given, mayAdd)
        ) : (
          <Skeleton className="h-[30px] w-80 max-w-full" />
        )
      }
      actions={
        <>
          {mayAdd && <ButtonLink to={paths.newAthlete()}>Add an athlete</ButtonLink>}
          {mayAdd && today.data !== undefined && today.data.athletes > 0 && (
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

function leadOf(today: Today, given: string, mayAdd: boolean): string {
  const count = today.items.map(taskOf).filter(isWork).length;
  if (today.athletes === 0 && mayAdd) return `Welcome, ${given}. It starts with an athlete.`;
  if (count === 0) return `Nothing waits for you, ${given}.`;
  return count === 1
    ? `One thing waits for you, ${given}.`
    : `${capital(inWords(count))} things wait for you, ${given}.`;
}

function Tasks({ today }: { today: Today }) {
  const { user } = useMe();
  const mayAdd = useMayInPractice()('athlete.add');
  if (today.athletes === 0 && !mayAdd)
    return (
      <Section title="Next" wide>
        <Empty title="No athlete in your sight yet">
          Clips, readings and comments of the coaches you look after appear here as they come. The
          owner of the practice says who they are.
        </Empty>
      </Section>
    );
  const beginning = mayAdd && isBeginning(today, user.role);
  const groups = groupTasks(today.items.map(taskOf), user.role);
  if (groups.length === 0)
    return beginning ? (
      <FirstSteps today={today} />
    ) : (
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
  return (
    <>
      {beginning && <FirstSteps today={today} />}
      {groups.map(({ group, name, tasks }) => (
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
      ))}
    </>
  );
}
