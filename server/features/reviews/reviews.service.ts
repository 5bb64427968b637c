import type * as z from 'zod';
import type { UserActor } from '#shared/access/actors.ts';
import { can } from '#shared/access/can.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import type {
  handInBody,
  SideReview as SideReviewShape,
  verdictBody,
} from '#shared/contracts/reviews.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { tell } from '../../events/tell.ts';
import { caseloadOf } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { SideSetting } from '../readings/side-setting.entity.ts';
import { type VisitInSight, visitInSight } from '../visits/visit-in-sight.ts';
import { writeOf } from '../waiting-mail/mail-choices.ts';
import { openThreads } from './open-threads.ts';
import { Review } from './review.entity.ts';
import { latestCall, type Subject, subjectAsItStands } from './review-subject.ts';
import { reviewersOf } from './reviewers.ts';
import { presentStep, reviewStateOf } from './reviews.presenter.ts';
import { SideReview } from './side-review.entity.ts';

type Of = Unit<UserActor>;

const stepsOf = ({ em }: Of, visitId: string, side: Side): Promise<Review[]> =>
  em.find(
    Review,
    { visit: visitId, side },
    { populate: ['by', 'reading', 'call'], orderBy: { at: 'desc', id: 'desc' } },
  );

const presented = async (
  unit: Of,
  { visit, athlete }: VisitInSight,
  side: Side,
): Promise<SideReviewShape> => {
  const { em, actor } = unit;
  const steps = await stepsOf(unit, visit.id, side);
  const setting = await em.findOne(SideSetting, { visit: visit.id, side });
  const call = await latestCall(unit, visit.id, side);
  const [last] = steps;
  const resource = caseloadOf(athlete);
  return {
    state: reviewStateOf(
      last
        ? { step: last.step, reading: last.reading?.id ?? null, call: last.call?.id ?? null }
        : null,
      { reading: setting?.reading?.id ?? null, call: call?.id ?? null },
    ),
    steps: steps.map(presentStep),
    reviewers: (await reviewersOf(em, athlete)).map(presentPerson),
    openComments: await openThreads(em, visit.id, side),
    may: {
      handIn: can(actor, 'review.hand-in', resource),
      decide: can(actor, 'review.decide', resource),
    },
  };
};

/** Where the review of one side stands. */
export const sideReview = async (unit: Of, visitId: string, side: Side): Promise<SideReviewShape> =>
  presented(unit, await visitInSight(unit, visitId, 'athlete.read'), side);

type Step = Pick<Review, 'step' | 'reason'>;

/** Two who say something of one side at once say it one after the other. */
const lastStep = async ({ em }: Of, visitId: string, side: Side): Promise<SideReview | null> => {
  await em.execute('select 1 from visit where id = ? for update', [visitId]);
  return em.findOne(SideReview, { visit: visitId, side }, { populate: ['last'] });
};

const take = async (
  unit: Of,
  sight: VisitInSight,
  side: Side,
  subject: Subject,
  before: SideReview | null,
  { step, reason }: Step,
): Promise<void> => {
  const { em, actor } = unit;
  const review = em.create(Review, {
    visit: sight.visit,
    side,
    step,
    ...subject,
    reason,
    by: em.getReference(User, actor.id),
  });
  const waitsSince = step === 'handed-in' ? new Date() : null;
  if (before)
    em.assign(before, {
      last: review,
      waitsSince,
      sentBack: before.sentBack || step === 'sent-back',
    });
  else
    em.create(SideReview, {
      visit: sight.visit,
      side,
      last: review,
      waitsSince,
      sentBack: step === 'sent-back',
    });
  await em.flush();
  await tell(
    unit,
    { coachId: sight.athlete.coach.id },
    { type: 'reading', visitId: sight.visit.id, side },
  );
};

const about = ({ athlete, visit }: VisitInSight, side: Side) => ({
  athlete: athlete.id,
  visit: visit.id,
  side,
});

/** The coach's word that a side is ready to be looked at. It waits from then on. */
export const handIn = async (
  unit: Of,
  visitId: string,
  side: Side,
  body: z.output<typeof handInBody>,
): Promise<SideReviewShape> => {
  const sight = await visitInSight(unit, visitId, 'review.hand-in');
  const before = await lastStep(unit, visitId, side);
  if (before?.waitsSince)
    throw new Problem('not-as-it-stands', 'It has been handed in and waits for a reviewer.');
  const subject = await subjectAsItStands(unit, visitId, side, sight.athlete, body.about);
  await take(unit, sight, side, subject, before, { step: 'handed-in', reason: body.note });
  const reviewers = await reviewersOf(unit.em, sight.athlete);
  const supervisors = reviewers.filter(({ role }) => role === 'supervisor');
  await writeOf(
    unit,
    (supervisors.length > 0 ? supervisors : reviewers).map(({ id }) => id),
    { kind: 'to-review', aboutId: visitId, path: '/review' },
  );
  audit(unit, 'review.hand-in', body.about.id, about(sight, side));
  await unit.em.flush();
  return presented(unit, sight, side);
};

/** The reviewer's word: signed off as it stands, or back to the coach with the reason. */
export const decideReview = async (
  unit: Of,
  visitId: string,
  side: Side,
  body: z.output<typeof verdictBody>,
): Promise<SideReviewShape> => {
  const sight = await visitInSight(unit, visitId, 'review.decide');
  const before = await lastStep(unit, visitId, side);
  const subject = await subjectAsItStands(unit, visitId, side, sight.athlete, body.about);
  const last = before?.last.unwrap();
  const step = body.verdict === 'sign-off' ? 'signed-off' : 'sent-back';
  const again = last?.step === step && (last.reading?.id ?? last.call?.id) === body.about.id;
  if (again)
    throw new Problem(
      'not-as-it-stands',
      step === 'signed-off' ? 'It is signed off already.' : 'It has been sent back already.',
    );
  const reason = body.verdict === 'send-back' ? body.reason : '';
  await take(unit, sight, side, subject, before, { step, reason });
  if (step === 'sent-back')
    await writeOf(unit, [sight.athlete.coach.id], {
      kind: 'sent-back',
      aboutId: visitId,
      path: `/visits/${visitId}/sides/${side}#sign-off`,
    });
  audit(
    unit,
    step === 'signed-off' ? 'review.sign-off' : 'review.send-back',
    body.about.id,
    about(sight, side),
  );
  await unit.em.flush();
  return presented(unit, sight, side);
};
