import type { Side } from '#shared/contracts/primitives.ts';
import type { Plan, PlanItem } from '#shared/contracts/plans.ts';
import { exerciseOf } from '#shared/plan/library.ts';
import { sideLines } from '#shared/plan/sides.ts';
import { otherSide } from '#shared/landmarks/types.ts';
import { Button } from '#src/ui/button.tsx';
import { StateDot } from '#src/ui/state-dot.tsx';
import { nameOf, withItem } from './plan-words.ts';
import type { PlanActs } from './use-plan-acts.ts';

/** The side that the rule set, which the coach confirms or turns. */
export function SideChoice({
  plan,
  item,
  edit,
}: {
  plan: Plan;
  item: PlanItem;
  edit: PlanActs['edit'] | null;
}) {
  const { exercise, side, sideConfirmed } = item;
  const rule = exerciseOf(exercise).side;
  const set = (to: Side, confirmed: boolean) =>
    edit?.mutate({ items: withItem(plan, exercise, { side: to, sideConfirmed: confirmed }) });
  return (
    <div className="mt-3">
      <p>
        {sideConfirmed ? (
          <StateDot kind="done">side confirmed</StateDot>
        ) : (
          <StateDot kind="wait">side set by the rule, to be confirmed</StateDot>
        )}
      </p>
      <p>{sideLines(rule, side).join(' ')}</p>
      {edit && (
        <div className="flex flex-wrap gap-x-5">
          {!sideConfirmed && (
            <Button
              look="plain"
              aria-label={`Confirm the side of ${nameOf(item)}`}
              onClick={() => set(side, true)}
            >
              Confirm
            </Button>
          )}
          <Button
            look="plain"
            aria-label={`Turn ${nameOf(item)} to the ${otherSide(side)} leg`}
            onClick={() => set(otherSide(side), false)}
          >
            Turn to the {otherSide(side)} leg
          </Button>
        </div>
      )}
    </div>
  );
}
