import { useMutation, useQueryClient } from '@tanstack/react-query';
import type * as z from 'zod';
import type { Plan, planEdit } from '#shared/contracts/plans.ts';
import { routes } from '#shared/contracts/routes.ts';
import { call } from '#src/api/client.ts';
import { isProblem } from '#src/api/problem.ts';
import { planOptions, plansKey } from '#src/api/plans.queries.ts';
import { todayQuery } from '#src/api/today.queries.ts';

export type PlanChange = Omit<z.input<typeof planEdit>, 'version'>;

/** Keeps what the server answered; where somebody else was faster, the newer version is fetched. */
function usePlanMutation<V>(plan: Plan, send: (given: V) => Promise<Plan>) {
  const client = useQueryClient();
  const { queryKey } = planOptions(plan.id);
  return useMutation({
    mutationFn: send,
    onSuccess: (saved) => {
      client.setQueryData(queryKey, saved);
      void client.invalidateQueries({ queryKey: [...plansKey, 'of-athlete'] });
      void client.invalidateQueries({ queryKey: todayQuery.queryKey });
    },
    onError: (error) => {
      if (isProblem(error, 'edited-meanwhile'))
        void client.invalidateQueries({ queryKey, exact: true });
    },
  });
}

/** Everything that can be done to a plan. */
export function usePlanActs(plan: Plan) {
  const params = { id: plan.id };
  const { version } = plan;
  return {
    edit: usePlanMutation(plan, (change: PlanChange) =>
      call(routes.editPlan, { params, body: { ...change, version } }),
    ),
    give: usePlanMutation(plan, () => call(routes.givePlan, { params, body: { version } })),
    stop: usePlanMutation(plan, () => call(routes.stopPlan, { params })),
    seePain: usePlanMutation(plan, () => call(routes.seePain, { params })),
    again: usePlanMutation(plan, (from: 'reading' | 'call') =>
      call(routes.planAgain, { params, body: { from, version } }),
    ),
  };
}
export type PlanActs = ReturnType<typeof usePlanActs>;
