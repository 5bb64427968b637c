import { Link } from 'react-router-dom';
import type { Side } from '#shared/contracts/primitives.ts';
import type { VisitRow } from '#shared/contracts/visits.ts';
import { shortDay } from '#src/ui/days.ts';
import { plusMinus, turn } from '#src/ui/figures.ts';
import { MethodLink } from '#src/ui/method-link.tsx';
import { Section } from '#src/ui/page.tsx';
import { gateRange } from '#src/ui/gate-words.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import { comparable, since, trendOf, type Trend, type TrendPoint } from './trend.ts';
import { TrendPlot } from './trend-plot.tsx';

/** How the readings of both sides went over the visits. Nothing is shown before something was measured. */
export function TrendSection({
  visits,
  retest,
}: {
  visits: readonly VisitRow[];
  /** Where a visit like an earlier one is opened; null where this person opens none. */
  retest: ((visitId: string) => string) | null;
}) {
  const whole = trendOf(visits);
  const { trend, gates, leftOut } = comparable(whole);
  if (!gates) return null;
  const latest = visits.find(({ id }) =>
    [...trend.left, ...trend.right].some((point) => point.visitId === id),
  );
  const unmeasured = visits.filter(({ id }) =>
    [...whole.left, ...whole.right].every((point) => point.visitId !== id),
  ).length;
  return (
    <Section
      title="Trend"
      note={
        unmeasured > 0
          ? 'Measured visits only: what was seen by eye has no place on this axis.'
          : 'Measured visits.'
      }
      margin={
        <>
          <Changes side="right" points={trend.right} />
          <Changes side="left" points={trend.left} />
          <p>
            The bars are 95 % errors under our error model. Two visits differ only where they are
            further apart than both errors together.
          </p>
          {latest && retest && (
            <p>
              <Link to={retest(latest.id)} className="inline-block py-1">
                Prepare a retest, filmed as on {shortDay(latest.day)}
              </Link>
            </p>
          )}
          <p>
            <MethodLink to="reading">How a reading is computed</MethodLink>
          </p>
        </>
      }
    >
      <TrendPlot trend={trend} gates={gates} />
      <AsTable trend={trend} gates={gates} />
      {leftOut > 0 && (
        <p className="mt-3 text-note text-soft">
          {leftOut === 1 ? 'One reading is' : `${leftOut} readings are`} left out: made between
          other gates than {gateRange(gates)}, so the turns cannot be compared.
        </p>
      )}
    </Section>
  );
}

function Changes({ side, points }: { side: Side; points: readonly TrendPoint[] }) {
  const latest = points.at(-1);
  if (latest === undefined) return null;
  const before = points.at(-2);
  const first = points[0];
  const earlier = [...new Set([before, first])].filter(
    (point): point is TrendPoint => point !== undefined && point !== latest,
  );
  return (
    <div>
      <p className="font-bold text-ink">Standing on the {side}</p>
      {earlier.length === 0 && <p>One measured visit; a change needs a second.</p>}
      {earlier.map((point) => {
        const { day, difference, plusMinus: error, changed } = since(point, latest);
        return (
          <p key={day}>
            Since {shortDay(day)} {turn(difference)} {plusMinus(error)}.{' '}
            {changed ? 'Changed by more than the error.' : 'No change that this test can show.'}
          </p>
        );
      })}
    </div>
  );
}

/** The plot's figures for those who do not see it. */
function AsTable({ trend, gates }: { trend: Trend; gates: Gates }) {
  return (
    <div className="sr-only">
      <table>
        <caption>Turn from {gateRange(gates)} of lift at each measured visit</caption>
        <thead>
          <tr>
            <th scope="col">Visit</th>
            <th scope="col">Side stood on</th>
            <th scope="col">Turn and 95 % error</th>
            <th scope="col">Reading</th>
          </tr>
        </thead>
        <tbody>
          {(['right', 'left'] as const).flatMap((side) =>
            trend[side].map((point) => (
              <tr key={`${side} ${point.visitId}`}>
                <td>{shortDay(point.day)}</td>
                <td>{side}</td>
                <td>
                  {turn(point.change)} {plusMinus(point.plusMinus)}
                </td>
                <td>
                  {point.label}
                  {point.provisional && ', provisional'}
                </td>
              </tr>
            )),
          )}
        </tbody>
      </table>
    </div>
  );
}
