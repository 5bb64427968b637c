import { Client } from 'pg';
import type { BenchEntry } from '../entry.ts';
import { median } from '../median.ts';
import { ATHLETES, CLIPS, HANDED_IN, MARKS, seedLargePractice } from '../server/large-practice.ts';
import { replay, statementsOf } from '../server/recorded.ts';
import { serve, timed, type Served } from '../server/served.ts';

const ROUNDS = 9;

const PAGES = [
  { name: 'Today', path: '/api/today', as: 'coach' },
  { name: 'athletes', path: '/api/athletes?pageSize=50', as: 'coach' },
  { name: 'review queue', path: '/api/reviews', as: 'owner' },
] as const;

/** One page asked for over a socket, and the statements that it sends given to PostgreSQL by themselves, in turns. */
const compared = async (served: Served, bare: Client, { path, as }: (typeof PAGES)[number]) => {
  const ask = await served.asking(served.api.world[as]);
  const statements = await statementsOf(() => ask(path));
  const ours: number[] = [];
  const plain: number[] = [];
  const slowest: number[] = [];
  for (let round = 0; round <= ROUNDS; round += 1) {
    const a = await timed(() => ask(path));
    let most = 0;
    const b = await timed(async () => {
      most = await replay(bare, statements);
    });
    // the first round warms both up
    if (round === 0) continue;
    ours.push(a);
    plain.push(b);
    slowest.push(most);
  }
  return {
    a: median(ours),
    b: median(plain),
    slowest: median(slowest),
    statements: statements.length,
  };
};

const oneDecimal = (value: number): number => Math.round(value * 10) / 10;

const entry: BenchEntry = {
  name: 'Today, athletes and review queue over 100,000 clips and 1,000,000 marks, against their own statements alone; the worst of the three',
  target: 2,
  async run() {
    const served = await serve();
    const bare = new Client({ connectionString: served.api.ground.config.database.app });
    await bare.connect();
    try {
      await seedLargePractice(served);
      const info: Record<string, number | string> = {
        unit: 'ms',
        athletes: ATHLETES,
        clips: CLIPS,
        marks: MARKS,
        'sides handed in': HANDED_IN,
      };
      let worst = { ratio: 0, a: NaN, b: NaN };
      for (const page of PAGES) {
        const { a, b, slowest, statements } = await compared(served, bare, page);
        const ratio = a / b;
        info[`${page.name}: ratio`] = Math.round(ratio * 100) / 100;
        info[`${page.name}: ms`] = oneDecimal(a);
        info[`${page.name}: statements`] = statements;
        info[`${page.name}: slowest statement, ms`] = oneDecimal(slowest);
        if (ratio > worst.ratio) worst = { ratio, a, b };
      }
      return { ...worst, info };
    } finally {
      await bare.end();
      await served.stop();
    }
  },
};

export default entry;
