import { group } from 'd3-array';
import type { UserActor } from '#shared/access/actors.ts';
import type { Seen } from '#shared/contracts/calls.ts';
import type { ReadingCode } from '#shared/contracts/readings.ts';
import type { EyeAgreement } from '#shared/contracts/reviews.ts';
import { answerAgreementOf } from '#shared/reliability/summary.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { need } from '../../http/need.ts';
import { inSightSql } from '../athletes/caseload.ts';

/** What an eye and a reading both can say of a side. */
const SAID = ['early', 'on-time', 'still'] as const satisfies readonly Seen[];
type Said = (typeof SAID)[number];

const SAME_WORD: Partial<Record<ReadingCode, Said>> = {
  'early-turn-out': 'early',
  'expected-turn-in': 'on-time',
  'holds-still': 'still',
};

type Row = { id: string; name: string; seen: Seen; code: ReadingCode };

/** Each person's first call of a side, made before any figure was shown, against the reading of that side. */
const SQL = (inSight: string) => `
  select u.id, u.name, c.seen, r.code
  from (
    select distinct on (visit_id, side, by_id) visit_id, side, by_id, seen, before_figures
    from call order by visit_id, side, by_id, at, id
  ) c
  join account u on u.id = c.by_id
  join side_setting s on s.visit_id = c.visit_id and s.side = c.side
  join reading r on r.id = s.reading_id
  where c.before_figures and ${inSight}
  order by u.name, u.id`;

const said = (seen: Seen): Said | null => SAID.find((each) => each === seen) ?? null;

/** How well the eye of every coach in sight agrees with what was measured. */
export const eyeAgreement = async ({ em, actor }: Unit<UserActor>): Promise<EyeAgreement[]> => {
  need(actor, 'practice.read', { kind: 'practice', practiceId: actor.practiceId });
  const inSight = inSightSql(actor, 'c.by_id');
  const rows = await em.execute<Row[]>(SQL(inSight.sql), [...inSight.params]);
  return [...group(rows, ({ id }) => id).values()].flatMap((own) => {
    const [first] = own;
    if (!first) return [];
    const pairs = own.flatMap(({ seen, code }) => {
      const eye = said(seen);
      const measured = SAME_WORD[code];
      return eye && measured ? [[eye, measured] as const] : [];
    });
    return [
      {
        person: { id: first.id, name: first.name },
        agreement: answerAgreementOf(SAID, pairs),
        unsaid: own.length - pairs.length,
      },
    ];
  });
};
