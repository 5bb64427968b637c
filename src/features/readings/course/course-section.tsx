import type { Reading } from '#shared/contracts/readings.ts';
import { degrees, inWords, turn } from '#src/ui/figures.ts';
import { MethodLink } from '#src/ui/method-link.tsx';
import { Section } from '#src/ui/page.tsx';
import { coursePoints } from './course-data.ts';
import { ReadingCourse } from './reading-course.tsx';
import { RepKey } from './rep-key.tsx';

/** The central picture with how to read it and what may be missed. */
export function CourseSection({ reading }: { reading: Reading }) {
  const { result, side } = reading;
  const { figures, returnPast90, rules } = result;
  const used = result.reps.filter((rep) => rep.used);
  const frames = used.reduce((sum, rep) => sum + (rep.fit?.used ?? 0), 0);
  const note =
    used.length > 0
      ? `${frames} frames in the rise of ${inWords(used.length)} ${used.length === 1 ? 'rep' : 'reps'}`
      : undefined;
  return (
    <Section
      title="Course"
      note={note}
      margin={
        <>
          {result.course.length > 0 && (
            <p>
              <b className="text-ink">How to read it.</b> Right is a higher thigh, up is a hip that
              turns out. What counts is the change between the dotted lines. The band, pinched at{' '}
              {rules.gateFrom}°, holds 95 of 100 true changes, under our error model. Green hatch:
              turning in, as expected. Grey hatch: holding still, not a pass.
            </p>
          )}
          {figures && (
            <p>
              <b className="text-ink">What may be missed.</b> An early turn smaller than{' '}
              {degrees(figures.mdt90)} may be missed with these marks.
            </p>
          )}
          <RepKey reading={reading} />
          <p>
            <MethodLink to="turn">How turn is computed</MethodLink>
          </p>
          {reading.provisional && <p>Hollow points rest on marks nobody has looked at.</p>}
          {returnPast90 && (
            <p>
              From {rules.gateTo}° to {degrees(returnPast90.to, 0)} the turn changes by{' '}
              {turn(returnPast90.change)}. That is described only; nothing is read from it.
            </p>
          )}
        </>
      }
    >
      {coursePoints(result.reps).length > 0 ? (
        <ReadingCourse result={result} side={side} />
      ) : (
        <p className="max-w-lead text-soft">
          There is no course: no marked frame of this side gives a turn.
        </p>
      )}
      {result.course.length === 0 && coursePoints(result.reps).length > 0 && (
        <p className="mt-2 text-note text-soft">Points only: nothing could be fitted to them.</p>
      )}
    </Section>
  );
}
