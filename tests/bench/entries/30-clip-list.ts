import { Client } from 'pg';
import { asAdmin } from '#tests/support/admin.ts';
import type { BenchEntry } from '../entry.ts';
import { median } from '../median.ts';
import { serve, timed, type Served } from '../server/served.ts';

const CLIPS = 10_000;
const MARKED_FRAMES = 4;
const PAGE_SIZE = 200;
const PAGES = CLIPS / PAGE_SIZE;
const ROUNDS = 7;

/** Each clip with one rep, marked at a few frames, in the caseload of one coach. */
const seed = async ({ api }: Served): Promise<void> => {
  const { coach, visit } = api.world;
  await api.ground.inPractice(coach, async ({ em }) => {
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
    await em.execute(
      `insert into mark (rep_id, frame, landmark, practice_id, present, hidden, u, v, source, looked,
          picture_long_edge, revision, by_user, at)
        select rep.id, n, landmark, current_practice(), true, false, 100, 100, 'hand', true, 1920, 1, ?, now()
        from rep, generate_series(1, ${MARKED_FRAMES}) n, unnest(array['asis-left', 'asis-right']) landmark`,
      [coach.id],
    );
  });
  // as a database that has been in use for a day: vacuumed, its statistics known
  const { pathname } = new URL(api.ground.config.database.owner);
  await asAdmin(async (client) => {
    for (const table of ['clip', 'rep', 'mark']) await client.query(`vacuum analyze ${table}`);
  }, pathname.slice(1));
};

/** The rows of one page by the best statement that holds the same facts: counts for the page's clips alone. */
const BARE = `
  with page as (
    select c.id, c.visit_id, c.name, c.state, c.view, c.support_side, c.duration_seconds, c.uploaded_at, v.day,
      a.id as athlete_id, a.given_name, a.family_name
    from clip c join visit v on v.id = c.visit_id join athlete a on a.id = v.athlete_id
    where a.coach_id = $1
    order by c.uploaded_at desc, c.id limit ${PAGE_SIZE} offset $2
  )
  select page.*, (select count(*) from rep r where r.clip_id = page.id) as reps,
    (select count(distinct (m.rep_id, m.frame)) from rep r join mark m on m.rep_id = r.id
      where r.clip_id = page.id and m.present) as marked
  from page order by uploaded_at desc, id`;

const COUNT = `select count(*) from clip c join visit v on v.id = c.visit_id join athlete a on a.id = v.athlete_id
  where a.coach_id = $1`;

const entry: BenchEntry = {
  name: 'listing 10,000 clips by pages of 200, against the bare SQL behind it',
  target: 2,
  async run() {
    const served = await serve();
    const bare = new Client({ connectionString: served.api.ground.config.database.app });
    await bare.connect();
    try {
      await seed(served);
      const { coach, practiceId } = served.api.world;
      const ask = async (page: number): Promise<void> => {
        await served.ask(`/api/clips?page=${page + 1}&pageSize=${PAGE_SIZE}`);
      };
      const query = async (page: number): Promise<void> => {
        await bare.query('begin');
        await bare.query(`select set_config('app.practice', $1, true)`, [practiceId]);
        await bare.query(COUNT, [coach.id]);
        await bare.query(BARE, [coach.id, page * PAGE_SIZE]);
        await bare.query('commit');
      };
      const ours: number[] = [];
      const plain: number[] = [];
      for (let round = 0; round < ROUNDS; round += 1) {
        let [a, b] = [0, 0];
        // page by page in turns, so that other work on the machine slows both
        for (let page = 0; page < PAGES; page += 1) {
          a += await timed(() => ask(page));
          b += await timed(() => query(page));
        }
        // the first round warms both up
        if (round === 0) continue;
        ours.push(a);
        plain.push(b);
      }
      const [a, b] = [median(ours), median(plain)];
      const info = { unit: 'ms', clips: CLIPS, 'page size': PAGE_SIZE, rounds: ours.length };
      return { ratio: a / b, a, b, info };
    } finally {
      await bare.end();
      await served.stop();
    }
  },
};

export default entry;
