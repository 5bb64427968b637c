import type { Reading } from '#shared/contracts/readings.ts';
import { capital, degrees, plusMinus } from '#src/ui/figures.ts';
import { MethodLink } from '#src/ui/method-link.tsx';
import { Section } from '#src/ui/page.tsx';
import { repSymbol } from '#src/ui/plots/course-points.tsx';
import { LiftPlot } from '#src/ui/plots/lift-plot.tsx';
import { gatesOf } from '#shared/protocol/protocol.ts';
import { repName } from '../words/rep-names.ts';
import { liftCurve, sideReps, topHalfWidth } from './lift-curves.ts';

/** Lift of the clips that were filmed from the side, where no turn can be seen. */
export function LiftSection({ reading }: { reading: Reading }) {
  const reps = sideReps(reading.result.reps);
  if (reps.length === 0) return null;
  const curves = reps.map(liftCurve);
  const named = reps.map((rep) => {
    const half = topHalfWidth(rep);
    const top =
      rep.fMax === null
        ? 'no top was found'
        : `highest ${degrees(rep.fMax, 0)}${half === null ? '' : ` ${plusMinus(half, 0)}°`}`;
    return { id: rep.id, words: `${capital(repName(reading, rep.id))}: ${top}` };
  });
  return (
    <Section
      title="Lift over time"
      note="filmed from the side"
      margin={
        <>
          <p>
            <b className="text-ink">How to read it.</b> Right is later, up is a higher thigh. The
            band holds 95 of 100 true lifts, under our error model. A side clip shows lift, and no
            turn.
          </p>
          <ul className="space-y-1">
            {named.map(({ id, words }, n) => (
              <li key={id} className="flex items-baseline gap-2 text-ink">
                <svg
                  width="12"
                  height="12"
                  viewBox="-6 -6 12 12"
                  aria-hidden="true"
                  className="flex-none self-center"
                >
                  <path d={repSymbol(n)} className="fill-tide" />
                </svg>
                {words}
              </li>
            ))}
          </ul>
          <p>
            <MethodLink to="lift">How lift is computed</MethodLink>
          </p>
          {curves.some(({ points }) => points.some(({ hollow }) => hollow)) && (
            <p>Hollow points rest on marks nobody has looked at.</p>
          )}
        </>
      }
    >
      <LiftPlot
        label={`Lift over time, filmed from the side. ${named.map(({ words }) => words).join('. ')}.`}
        curves={curves}
        gates={gatesOf(reading.result.rules)}
      />
    </Section>
  );
}
