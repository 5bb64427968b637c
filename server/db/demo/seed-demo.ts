import { Client } from 'pg';
import type { Ground } from '../../main/ground.ts';
import { DEMO_ACCOUNTS } from './accounts.ts';
import { demoReplayLine } from './demo-replay.ts';
import { demoPassword, keepDemoPassword } from './demo-password.ts';
import { GREYWATER_STORY } from './greywater-story.ts';
import { PENNYWORT_STORY } from './pennywort-story.ts';
import { seedPractice } from './seed-practice.ts';

/** Any number, the same in every process: two that start together make one demo. */
const DEMO_LOCK = 4_600_003;

const STORIES = [GREYWATER_STORY, PENNYWORT_STORY];

/** What a start prints about the demo. */
export interface Demo {
  readonly lines: readonly string[];
}

/**
 * Makes the demo once, into a database in which there is nothing else. A demo that was cut short is completed,
 * practice by practice.
 * @returns the accounts to print, or null where this instance has no demo
 */
export const seedDemo = async (ground: Ground): Promise<Demo | null> => {
  const client = new Client({ connectionString: ground.config.database.owner });
  await client.connect();
  try {
    await client.query('select pg_advisory_lock($1)', [DEMO_LOCK]);
    const { rows } = await client.query<{ id: string }>('select id from practice');
    const there = new Set(rows.map((row) => row.id));
    const demoIsThere = there.has(GREYWATER_STORY.id);
    const foreign = [...there].some((id) => STORIES.every((story) => story.id !== id));
    if (!demoIsThere && (foreign || !ground.config.demo)) return null;
    const password = await demoPassword(ground);
    if (!foreign) {
      for (const story of STORIES)
        if (!there.has(story.id)) await seedPractice(ground, story, password);
    }
    if (demoIsThere) await keepDemoPassword(ground, password);
    return { lines: [...linesOf(password), await demoReplayLine(ground)] };
  } finally {
    await client.end();
  }
};

const linesOf = (password: string): string[] => [
  'Demo accounts, all with the password '.concat(password),
  ...Object.values(DEMO_ACCOUNTS).map(({ email, role }) => `  ${email.padEnd(34)} ${role}`),
];
