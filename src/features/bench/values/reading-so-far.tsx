import { Link } from 'react-router-dom';
import { capital, plusMinus, turn } from '#src/ui/figures.ts';
import { followedWords } from '#src/ui/followed-words.ts';
import { markErrorWords } from '#src/ui/mark-error-words.ts';
import { paths } from '#src/ui/paths.ts';
import { supportWords } from '#src/ui/words.ts';
import { useBenchDocument, useBenchModel } from '../bench-context.ts';
import { countFollowed } from '../look/followed.ts';
import { useReading } from '../reading/use-reading.ts';
import { readingLabel, settleWords } from './reading-words.ts';

/** What the reps of this side say together so far, and what would settle it. */
export function ReadingSoFar() {
  const { visit, protocol } = useBenchDocument();
  const { current, reps } = useBenchModel();
  const { result, working } = useReading();
  if (!current) return null;
  const side = current.rep.supportSide;
  const nameOf = (id: string) => {
    const rep = reps.find((each) => each.rep.id === id)?.rep;
    return rep ? `rep ${rep.number}` : null;
  };
  const used = result?.reps.filter((rep) => rep.used).length ?? 0;
  const settle = result?.settle[0];
  const followed = followedWords(countFollowed(reps.filter(({ rep }) => rep.supportSide === side)));
  return (
    <section aria-label="Reading so far" className="bench-sofar" aria-busy={working}>
      <p className="text-soft">
        Reading so far, {supportWords(side)}
        {used > 0 && `, ${used} ${used === 1 ? 'rep' : 'reps'}`}
      </p>
      {result?.figures ? (
        <>
          <p className="bench-big">
            {turn(result.figures.d)} <small>{plusMinus(1.96 * result.figures.uC)}</small>
          </p>
          <p>
            “{readingLabel(result)}”
            {result.provisional && <span className="text-ochre"> provisional</span>}
          </p>
        </>
      ) : result && result.code === 'lift-stops-short' ? (
        <p>“{readingLabel(result)}”</p>
      ) : !result && working ? (
        <p>Working it out.</p>
      ) : current.rep.view !== 'front' ? (
        <p>This view shows the lift. The turn is read from a clip filmed from the front.</p>
      ) : (
        <p>
          Not yet. It needs 3 quiet frames, then at least 7 in the rise, two of them near{' '}
          {protocol.rules.gateFrom}° and two near {protocol.rules.gateTo}°.
        </p>
      )}
      {result?.figures && (
        <p className="text-soft">
          {capital(
            markErrorWords({
              px: current.markError.anatomicalPx,
              frames: current.markError.doublyMarkedFrames,
            }),
          )}
        </p>
      )}
      {followed !== null && <p className="text-soft">{followed}</p>}
      {settle && <p className="text-soft">{settleWords(settle, nameOf)}</p>}
      <p className="mt-1">
        <Link to={paths.reading(visit.id, side)} className="inline-block min-h-[24px]">
          Open the reading
        </Link>
      </p>
    </section>
  );
}
