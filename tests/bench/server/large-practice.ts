import { asAdmin } from '#tests/support/admin.ts';
import type { Served } from './served.ts';

export const ATHLETES = 1_000;
export const CLIPS = 100_000;
export const MARKS = 1_000_000;
const VISITS_EACH = 5;
const MARKED_FRAMES = 5;
/** Sides that were handed in and wait for a word. */
export const HANDED_IN = 500;

const FILLED = ['athlete', 'visit', 'call', 'review', 'side_review', 'clip', 'rep', 'mark'];

/** One coach's caseload of years: what is filmed is called and marked, and some of it waits for a review. */
export const seedLargePractice = async ({ api }: Served): Promise<void> => {
  const { coach } = api.world;
  await api.ground.inPractice(coach, async ({ em }) => {
    const insert = (sql: string) => em.execute(sql.replaceAll(':coach', `'${coach.id}'::uuid`));
    await insert(
      `insert into athlete (id, practice_id, coach_id, given_name, family_name, birth_date, created_at)
       select gen_random_uuid(), current_practice(), :coach, 'Wren', 'Marsh ' || n, '1999-04-01', now()
       from generate_series(1, ${ATHLETES}) n`,
    );
    await insert(
      `insert into visit (id, practice_id, athlete_id, coach_id, day, note, filming, created_at)
       select gen_random_uuid(), current_practice(), a.id, :coach, current_date - 60 * n, '', '{}', now()
       from athlete a, generate_series(1, ${VISITS_EACH}) n where a.family_name like 'Marsh %'`,
    );
    await insert(
      `insert into call (id, practice_id, visit_id, side, seen, substitutions, confidence, hands_felt, by_id, at,
         before_figures)
       select gen_random_uuid(), current_practice(), v.id, 'right', 'early', '{}', 'sure', '', :coach, now(), true
       from visit v`,
    );
    await insert(
      `insert into review (id, practice_id, visit_id, side, step, call_id, reason, by_id, at)
       select gen_random_uuid(), current_practice(), k.visit_id, 'right', 'handed-in', k.id, '', :coach, now()
       from call k order by k.visit_id limit ${HANDED_IN}`,
    );
    await insert(
      `insert into side_review (id, practice_id, visit_id, side, last_id, waits_since)
       select gen_random_uuid(), current_practice(), visit_id, 'right', id, at from review`,
    );
    await insert(
      `insert into clip (id, practice_id, visit_id, name, state, view, camera_stood, mirrored, bytes, files, geometry,
         accept_remains, uploaded_by_id, uploaded_at, version)
       select gen_random_uuid(), current_practice(), v.id, 'clip-' || n || '.mp4', 'ready', 'front', 'front', false,
         1000000, '{}', '{}', false, :coach, now() - n * interval '1 minute', 1
       from (select id from visit order by id limit ${ATHLETES * VISITS_EACH}) v,
         generate_series(1, ${CLIPS / (ATHLETES * VISITS_EACH)}) n`,
    );
    await insert(
      `insert into rep (id, practice_id, clip_id, support_side, start_frame, end_frame, hand_boundaries, excluded_note,
         created_by_id, created_at, version)
       select gen_random_uuid(), current_practice(), id, 'right', 0, 100, '{}', '', :coach, now(), 1 from clip`,
    );
    await insert(
      `insert into mark (rep_id, frame, landmark, practice_id, present, hidden, u, v, source, looked,
         picture_long_edge, revision, by_user, at)
       select rep.id, n, landmark, current_practice(), true, false, 100, 100, 'hand', true, 1920, 1, :coach, now()
       from rep, generate_series(1, ${MARKED_FRAMES}) n, unnest(array['asis-support', 'asis-lifted']) landmark`,
    );
  });
  // as a database that has been in use for a day: vacuumed, its statistics known
  const { pathname } = new URL(api.ground.config.database.owner);
  await asAdmin(async (client) => {
    for (const table of FILLED) await client.query(`vacuum analyze "${table}"`);
  }, pathname.slice(1));
};
