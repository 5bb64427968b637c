import type { Side } from '#shared/contracts/primitives.ts';
import type { ReadingResult } from '#shared/reading/types.ts';
import { degrees, inWords, plusMinus, turn } from '#src/ui/figures.ts';
import { CourseBracket, CourseOnset } from '#src/ui/plots/course-markers.tsx';
import { CoursePlot } from '#src/ui/plots/course-plot.tsx';
import { turnAt } from '#shared/reading/at-lift.ts';
import { gatesOf } from '#shared/protocol/protocol.ts';
import { coursePoints } from './course-data.ts';

const label = ({ course, figures, reps, rules }: ReadingResult, side: Side): string => {
  const used = reps.filter(({ used }) => used).length;
  const { from, to } = gatesOf(rules);
  const [atFrom, atTo] = [turnAt(course, from), turnAt(course, to)];
  if (!figures || atFrom === null || atTo === null)
    return `Course of the ${side} support side: nothing could be fitted.`;
  return `Course of the ${side} support side over ${inWords(used)} ${used === 1 ? 'rep' : 'reps'}: turn ${turn(atFrom)} at ${from}° of lift, ${turn(atTo)} at ${to}°; change ${turn(figures.d)} ${plusMinus(1.96 * figures.uC)}.`;
};

/** The courses of one side: points of each rep, line and band of all, the change as a bracket. */
export function ReadingCourse({
  result,
  side,
  height,
  small = false,
  reach,
}: {
  result: ReadingResult;
  side: Side;
  height?: number;
  /** Without the lines of the single reps, for a pair of plots. */
  small?: boolean;
  /** Further turns that have to fit, so that two plots share their scale. */
  reach?: readonly number[];
}) {
  const { course, figures, onset, reps } = result;
  const used = reps.filter((rep) => rep.used);
  const gates = gatesOf(result.rules);
  const atFrom = turnAt(course, gates.from);
  return (
    <CoursePlot
      label={label(result, side)}
      height={height}
      gates={gates}
      curve={course}
      repCurves={used.length > 1 && !small ? used.map(({ curve }) => curve) : []}
      points={coursePoints(reps)}
      reach={reach}
    >
      {(scale) => (
        <>
          {atFrom !== null && figures && (
            <CourseBracket
              atFrom={atFrom}
              change={figures.d}
              words={turn(figures.d)}
              scale={scale}
            />
          )}
          {onset && !small && (
            <CourseOnset
              low={onset.low}
              high={onset.high}
              words={
                scale.compact
                  ? 'starts here'
                  : `starts somewhere here: ${degrees(onset.low, 0)} to ${degrees(onset.high, 0)}`
              }
              scale={scale}
            />
          )}
        </>
      )}
    </CoursePlot>
  );
}
