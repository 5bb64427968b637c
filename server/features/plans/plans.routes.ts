import type { UserActor } from '#shared/access/actors.ts';
import { routes } from '#shared/contracts/routes.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { linkAnswerLimits } from '../../http/rate-limit.ts';
import type { Feature } from '../../main/feature.ts';
import { linkActor } from '../replays/link.ts';
import { answerPain, tickExercise } from './athlete-answers.ts';
import { editPlan } from './edit-plan.ts';
import { givePlan, seePain, stopPlan } from './give-plan.ts';
import { makePlan, planAgain } from './make-plan.ts';
import { listPlans } from './plan-list.ts';
import { planPage, planStart } from './plan-page.ts';

type Of = Unit<UserActor>;

/** Does something with a plan, then shows it as it stands. */
const thenShown = (id: string, act: (unit: Of) => Promise<void>) => async (unit: Of) => {
  await act(unit);
  return planPage(unit, id);
};

export const plansFeature: Feature = ({ serve, ground }) => {
  serve(routes.planStart, ({ params, work }) =>
    work((unit) => planStart(unit, params.id, params.side)),
  );
  serve(routes.makePlan, ({ params, body, work }) =>
    work(async (unit) => planPage(unit, await makePlan(unit, params.id, params.side, body))),
  );
  serve(routes.listPlans, async ({ params, work }) => ({
    items: await work((unit) => listPlans(unit, params.id)),
  }));
  serve(routes.plan, ({ params, work }) => work((unit) => planPage(unit, params.id)));
  serve(routes.givePlan, ({ params: { id }, body, work }) =>
    work(thenShown(id, (unit) => givePlan(unit, id, body.version))),
  );
  serve(routes.stopPlan, ({ params: { id }, work }) =>
    work(thenShown(id, (unit) => stopPlan(unit, id))),
  );
  serve(routes.seePain, ({ params: { id }, work }) =>
    work(thenShown(id, (unit) => seePain(unit, id))),
  );
  serve(routes.editPlan, ({ params: { id }, body, work }) =>
    work(thenShown(id, (unit) => editPlan(unit, id, body))),
  );
  serve(routes.planAgain, ({ params: { id }, body, work }) =>
    work(thenShown(id, (unit) => planAgain(unit, id, body))),
  );

  serve(
    routes.tickExercise,
    async ({ params, body, req }) => {
      const actor = await linkActor(ground, req, params.token);
      return { ticks: await ground.inPractice(actor, (unit) => tickExercise(unit, body)) };
    },
    ...linkAnswerLimits(),
  );
  serve(
    routes.answerPain,
    async ({ params, body, req }) => {
      const actor = await linkActor(ground, req, params.token);
      await ground.inPractice(actor, (unit) => answerPain(unit, body));
    },
    ...linkAnswerLimits(),
  );
};
