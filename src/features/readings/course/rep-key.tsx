import { Link } from 'react-router-dom';
import type { Reading } from '#shared/contracts/readings.ts';
import { repHalfWidth } from '#shared/reading/at-lift.ts';
import type { RepResult } from '#shared/reading/types.ts';
import { capital, degrees, plusMinus, turn } from '#src/ui/figures.ts';
import { paths } from '#src/ui/paths.ts';
import { tieFaultWords } from '#src/ui/tie-words.ts';
import { repSymbol } from '#src/ui/plots/course-points.tsx';
import { faultsToSay, repFaultWords } from '../words/rep-fault-words.ts';
import { drawnReps } from './course-data.ts';
import { repName } from '../words/rep-names.ts';

/** Each rep with its symbol and its own change; what is left out says why and stays open to be looked at. */
export function RepKey({ reading }: { reading: Reading }) {
  const { reps } = reading.result;
  const drawn = drawnReps(reps);
  const left = reps.filter((rep) => !drawn.includes(rep));
  return (
    <ul className="space-y-1">
      {drawn.map((rep, n) => (
        <li key={rep.id} className="flex items-baseline gap-2 text-ink">
          <svg
            width="12"
            height="12"
            viewBox="-6 -6 12 12"
            aria-hidden="true"
            className="flex-none self-center"
          >
            <path d={repSymbol(n)} className="fill-shank" />
          </svg>
          <span>
            <RepLink reading={reading} rep={rep} />{' '}
            {rep.fit
              ? `${turn(rep.fit.change.value)} ${plusMinus(repHalfWidth(rep, reading.result.rules.gateTo))}, ${rep.fit.used} frames`
              : leftOut(rep)}
            <LiftFrom reading={reading} rep={rep} />
          </span>
        </li>
      ))}
      {left.map((rep) => (
        <li key={rep.id} className="flex items-baseline gap-2">
          <span aria-hidden="true" className="w-3 flex-none">
            –
          </span>
          <span>
            <RepLink reading={reading} rep={rep} /> {leftOut(rep)}
          </span>
        </li>
      ))}
      {drawn.length > 1 && (
        <li>
          <Link
            to={paths.compare({ first: ofSide(reading), second: ofSide(reading) })}
            className="inline-block py-1"
          >
            Play two reps together
          </Link>
        </li>
      )}
    </ul>
  );
}

const ofSide = ({ visitId, side }: Reading): string => `${visitId}.${side}`;

/** Which clip its lift comes from, where a hand has named a side clip of the same moment. */
function LiftFrom({ reading, rep }: { reading: Reading; rep: RepResult }) {
  const named = reading.reps.find((each) => each.id === rep.id);
  if (rep.liftFrom !== undefined)
    return (
      <span className="block text-soft">
        lift from {repName(reading, rep.liftFrom)}, filmed at the same time
      </span>
    );
  if (!named?.liftFrom || !named.tieFault) return null;
  return (
    <span className="block text-soft">
      lift from its own clip, not from {repName(reading, named.liftFrom)}:{' '}
      {tieFaultWords(named.tieFault)}
    </span>
  );
}

/** Why it does not count, and how high it went where that is known. */
const leftOut = ({ why, fMax }: RepResult): string => {
  const reasons = faultsToSay(why).map(repFaultWords).join('; ');
  const top = fMax === null ? '' : `. Highest lift ${degrees(fMax, 0)}.`;
  return `left out${reasons === '' ? '' : `: ${reasons}`}${top}`;
};

function RepLink({ reading, rep }: { reading: Reading; rep: RepResult }) {
  const clipId = reading.reps.find((each) => each.id === rep.id)?.clipId;
  const name = capital(repName(reading, rep.id));
  const frame = rep.frames.find(({ phase }) => phase === 'rise')?.frame ?? rep.frames[0]?.frame;
  if (clipId === undefined) return <>{name}</>;
  return <Link to={paths.bench(clipId, frame === undefined ? {} : { frame })}>{name}</Link>;
}
