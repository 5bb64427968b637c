import type { Role } from '#shared/contracts/accounts.ts';
import type { Task, TaskGroup } from './task-of.ts';

const NAMES: Record<TaskGroup, string> = {
  pain: 'Something hurts',
  retest: 'Retests due',
  sides: 'To review',
  back: 'Sent back to you',
  review: 'Readings',
  call: 'To call by eye',
  mark: 'To mark',
  again: 'To mark again, blind',
  answer: 'To answer',
  film: 'To send or film again',
  retry: 'Could not be prepared',
  prepare: 'Being prepared',
  lapse: 'About to lapse',
};

/** A coach works from the clip to the reading; a supervisor starts with what others brought. */
const ORDER: Record<Role, readonly TaskGroup[]> = {
  coach: [
    'pain',
    'back',
    'call',
    'mark',
    'again',
    'answer',
    'film',
    'retry',
    'review',
    'retest',
    'sides',
    'prepare',
    'lapse',
  ],
  supervisor: [
    'pain',
    'sides',
    'back',
    'review',
    'answer',
    'again',
    'call',
    'mark',
    'film',
    'retry',
    'retest',
    'prepare',
    'lapse',
  ],
  owner: [
    'pain',
    'lapse',
    'sides',
    'back',
    'review',
    'answer',
    'again',
    'call',
    'mark',
    'film',
    'retry',
    'retest',
    'prepare',
  ],
};

export type Group = { group: TaskGroup; name: string; tasks: Task[] };

/** The tasks in groups; within a group they keep the server's order, most pressing first. */
export function groupTasks(tasks: readonly Task[], role: Role): Group[] {
  return ORDER[role]
    .map((group) => ({
      group,
      name: NAMES[group],
      tasks: tasks.filter((task) => task.group === group),
    }))
    .filter(({ tasks: own }) => own.length > 0);
}

/** Groups in which a person can do something now; what is being prepared only takes time. */
export const isWork = (task: Task): boolean => task.group !== 'prepare';
