import type { ValueAgreementShape } from '#shared/contracts/reliability.ts';
import { capital, degrees, turn as signed } from '#src/ui/figures.ts';
import { AgreementPlot } from '#src/ui/plots/agreement-plot.tsx';
import { degreesOrUnknown, iccWords, whyWords } from './reliability-words.ts';

const limitsWords = (limits: ValueAgreementShape['limits']): string =>
  limits === null
    ? 'unknown'
    : `bias ${signed(limits.bias)} (${signed(limits.biasLow)} to ${signed(limits.biasHigh)}), limits ${signed(limits.low)} to ${signed(limits.high)}`;

/** How well lift or turn repeats at frames marked twice: what follows from one marking and from the other. */
export function ValueFigures({
  what,
  of,
  whose,
}: {
  what: 'turn' | 'lift';
  of: ValueAgreementShape;
  whose: string;
}) {
  const why = whyWords(of);
  const rows: readonly (readonly [string, string])[] = [
    ['Typical error, √(Σd²/2n)', degreesOrUnknown(of.typical)],
    ['Standard error of measurement', degreesOrUnknown(of.sem)],
    ['Smallest change that shows, 95 %', degreesOrUnknown(of.mdc95)],
    ['ICC (1,1)', iccWords(of.oneWay)],
    ['ICC (2,1)', iccWords(of.random)],
    ['ICC (3,1)', iccWords(of.fixed)],
    [
      'ICC of the mean of both, (1,2) (2,2) (3,2)',
      of.ofMeans
        ? [of.ofMeans.oneWay, of.ofMeans.random, of.ofMeans.fixed]
            .map((value) => value.toFixed(2).replace('-', '−'))
            .join(', ')
        : 'unknown',
    ],
    ['Limits of agreement', limitsWords(of.limits)],
  ];
  return (
    <section aria-label={`${capital(what)}: ${whose}`} className="mt-6">
      <h3 className="font-bold">{capital(what)}</h3>
      {of.pairs === 0 ? (
        <p>
          No frame has its {what} both times yet: that needs the scale, the camera’s distance
          {what === 'turn' ? ' and three quiet frames' : ' and quiet frames'} among those marked
          again.
        </p>
      ) : (
        <>
          <p className="text-note text-soft">
            {of.pairs} {of.pairs === 1 ? 'frame' : 'frames'} measured twice.{why && ` ${why}`}
          </p>
          {of.why !== 'too-few' && (
            <dl className="mt-2">
              {rows.map(([name, value]) => (
                <div
                  key={name}
                  className="flex flex-wrap justify-between gap-x-6 border-b border-rule py-1.5"
                >
                  <dt className="text-soft">{name}</dt>
                  <dd>{value}</dd>
                </div>
              ))}
            </dl>
          )}
          <div className="mt-4">
            <AgreementPlot
              label={`${capital(what)} of ${of.pairs} frames by the first marking less the second, against the mean of both; ${
                of.limits
                  ? `${limitsWords(of.limits)}`
                  : `differences up to ${degrees(Math.max(...of.points.map(({ difference }) => Math.abs(difference))))}`
              }`}
              what={what}
              points={of.points}
              limits={of.limits}
            />
          </div>
        </>
      )}
    </section>
  );
}
