import { Client } from 'pg';
import type { BenchEntry } from '../entry.ts';
import { median, serve, timed, type Served } from '../server/served.ts';

const CLIPS = 10_000;
const PAGE_SIZE = 200;
const PAGES = CLIPS / PAGE_SIZE;
const rounds = 5;

const seed = ({ api }: Served): Promise<unknown> => {
  const { coach, visit } = api.world;
  return api.ground.inPractice(coach, async ({ em }) => {
    await em.execute(
      `insert into clip (id, practice_id, visit_id, name, state, view, camera_stood, mirrored, bytes, files, geometry,
          accept_remains, uploaded_by_id, uploaded_at, version)
        select gen_random_uuid(), current_practice(), ?, 'clip-' || n || '.mp4', 'ready', 'front', 'front', false,
          1000000, '{}', '{}', false, ?, now() - n * interval '1 minute', 1
        from generate_series(1, ${CLIPS}) n`,
      [visit.id, coach.id],
    );
    await em.execute(
      `insert into rep (id, practice_id, clip_id, support_side, start_frame, end_frame, hand_boundaries, excluded_note,
          created_by_id, created_at, version)
        select gen_random_uuid(), current_practice(), id, 'right', 0, 100, '{}', '', ?, now(), 1 from clip`,
      [coach.id],
    );
  });
};

/** The rows of one page by the plainest statement that holds the same facts, one practice, one coach. */
const BARE = `
  select c.id, c.visit_id, c.name, c.state, c.view, c.support_side, c.duration_seconds, c.uploaded_at, v.day, a.id,
    a.given_name, a.family_name,
    (select count(*) from rep r where r.clip_id = c.id) as reps,
    (select count(distinct (m.rep_id, m.frame)) from rep r join mark m on m.rep_id = r.id
      where r.clip_id = c.id and m.present) as marked
  from clip c join visit v on v.id = c.visit_id join athlete a on a.id = v.athlete_id
  where a.coach_id = $1
  order by c.uploaded_at desc, c.id limit ${PAGE_SIZE} offset $2`;

const COUNT = `select count(*) from clip c join visit v on v.id = c.visit_id join athlete a on a.id = v.athlete_id
  where a.coach_id = $1`;

const entry: BenchEntry = {
  name: 'listing 10,000 clips by pages of 200, milliseconds, against the bare SQL behind it',
  target: 2,
  async run() {
    const served = await serve();
    const bare = new Client({ connectionString: served.api.ground.config.database.app });
    await bare.connect();
    try {
      await seed(served);
      const { coach, practiceId } = served.api.world;
      const ours: number[] = [];
      const plain: number[] = [];
      const pages = Array.from({ length: PAGES }, (_, page) => page);
      for (let round = 0; round < rounds; round += 1) {
        ours.push(
          await timed(async () => {
            for (const page of pages)
              await served.ask(`/api/clips?page=${page + 1}&pageSize=${PAGE_SIZE}`);
          }),
        );
        plain.push(
          await timed(async () => {
            for (const page of pages) {
              await bare.query('begin');
              await bare.query(`select set_config('app.practice', $1, true)`, [practiceId]);
              await bare.query(COUNT, [coach.id]);
              await bare.query(BARE, [coach.id, page * PAGE_SIZE]);
              await bare.query('commit');
            }
          }),
        );
      }
      const [a, b] = [median(ours), median(plain)];
      return { ratio: a / b, a, b, info: { clips: CLIPS, pageSize: PAGE_SIZE, rounds } };
    } finally {
      await bare.end();
      await served.stop();
    }
  },
};

export default entry;
