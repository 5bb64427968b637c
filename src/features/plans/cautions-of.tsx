import { Link } from 'react-router-dom';
import type { PlanStart } from '#shared/contracts/plans.ts';
import { SAFETY_ANSWERS } from '#shared/plan/cautions.ts';
import { shortDay } from '#src/ui/days.ts';
import { SAFETY_SHORT } from '#src/ui/exercise-words.ts';
import { paths } from '#src/ui/paths.ts';
import { Caution } from '#src/ui/states.tsx';

/** What to be careful with: what is written down of the athlete, and what the last safety check answered. */
export function CautionsOf({
  of: { athlete, safety, visit },
}: {
  of: Pick<PlanStart, 'athlete' | 'safety' | 'visit'>;
}) {
  const yes = SAFETY_ANSWERS.filter((question) => safety?.answers[question] === true);
  return (
    <div className="mb-7 max-w-lead space-y-3">
      {athlete.cautions !== '' && (
        <Caution title="Be careful with:">
          <span className="whitespace-pre-line">{athlete.cautions}</span>
        </Caution>
      )}
      {safety === null && (
        <Caution title="The safety questions were never asked.">
          What matters to them is held back.{' '}
          <Link to={paths.visit(visit.id)} className="tap">
            Ask them
          </Link>
        </Caution>
      )}
      {safety !== null && yes.length > 0 && (
        <Caution title="Answered with yes:">
          {yes.map((question) => SAFETY_SHORT[question]).join('; ')} (
          <Link to={paths.visit(safety.visitId)} className="tap">
            safety check of {shortDay(safety.day)}
          </Link>
          ).{' '}
          {safety.clearedBy === null
            ? 'Nobody is named who cleared it.'
            : `Cleared by ${safety.clearedBy}.`}
        </Caution>
      )}
      {safety !== null && yes.length === 0 && (
        <p className="text-soft">
          Safety check of {shortDay(safety.day)}: nothing that holds an exercise back.
        </p>
      )}
    </div>
  );
}
