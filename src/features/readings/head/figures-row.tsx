import type { ReactNode } from 'react';
import type { Reading } from '#shared/contracts/readings.ts';
import type { Onset, ReadingFigures } from '#shared/reading/types.ts';
import { degrees, plusMinus, turn } from '#src/ui/figures.ts';
import { gateRange } from '#src/ui/gate-words.ts';
import { type Gates, gatesOf } from '#shared/protocol/protocol.ts';
import { isTold, partHalfWidth } from '#shared/reading/part-half-width.ts';
import { inHundred } from '../words/probability-words.ts';

/** The figures of the reps together, each with its ± and what it means. */
export function FiguresRow({ reading }: { reading: Reading }) {
  const { figures, onset, code, rules } = reading.result;
  const gates = gatesOf(rules);
  if (!figures) return null;
  return (
    <>
      <dl className="grid grid-cols-2 border-b border-rule border-t-ink [border-top-width:1px] desk:grid-cols-4">
        <Figure
          name={`Turn, from ${gateRange(gates)} of lift`}
          value={turn(figures.d)}
          pm={1.96 * figures.uC}
        >
          {figures.d < 0 ? 'inwards' : 'outwards'}; 95 of 100 true values lie inside, under our
          error model
        </Figure>
        <Figure
          name="of it, pelvis over the planted thigh"
          value={turn(figures.pelvis.value)}
          pm={partHalfWidth(figures, figures.pelvis)}
        >
          {partWords(figures, 'pelvis', 'thigh')}
        </Figure>
        <Figure
          name="of it, thigh itself"
          value={turn(figures.thigh.value)}
          pm={partHalfWidth(figures, figures.thigh)}
        >
          {figures.lambda === null
            ? partWords(figures, 'thigh', 'pelvis')
            : `assumed to turn little: ${Math.round(100 * figures.lambda)} of 100 parts of it count`}
        </Figure>
        {onset ? (
          <OnsetFigure onset={onset} gates={gates} />
        ) : (
          <Figure name="Smallest early turn found" value={degrees(figures.mdt90)} pm={null}>
            9 times in 10; a smaller one may be missed
          </Figure>
        )}
      </dl>
      {code === 'cannot-tell' && <ThreeWays figures={figures} />}
    </>
  );
}

const partWords = (
  figures: ReadingFigures,
  own: 'pelvis' | 'thigh',
  other: 'pelvis' | 'thigh',
): string => {
  if (!isTold(figures, figures[own])) return 'may be none';
  return Math.abs(figures[own].value) > Math.abs(figures[other].value)
    ? 'the larger part'
    : 'the smaller part';
};

const CELL =
  'border-rule py-4 pl-4 pr-3 max-desk:odd:pl-0 max-desk:even:border-l max-desk:[&:nth-child(n+3)]:border-t desk:border-l desk:first:border-l-0 desk:first:pl-0';

function Figure({
  name,
  value,
  pm,
  children,
}: {
  name: string;
  value: string;
  pm: number | null;
  children: ReactNode;
}) {
  return (
    <div className={CELL}>
      <dt className="min-h-[44px] text-note text-soft">{name}</dt>
      <dd className="pt-1">
        <span className="text-value font-light">{value}</span>
        {pm !== null && (
          <span className="whitespace-nowrap text-lead text-soft"> {plusMinus(pm)}</span>
        )}
        <span className="block text-note text-soft">{children}</span>
      </dd>
    </div>
  );
}

/** A bar over the lifts where the turn may start; its middle says nothing by itself. */
function OnsetFigure({ onset: { low, high }, gates }: { onset: Onset; gates: Gates }) {
  const x = (lift: number) => `${Math.min(100, Math.max(0, ((lift - 25) / 75) * 100))}%`;
  const words = `${degrees(low, 0)} to ${degrees(high, 0)}`;
  return (
    <div className={CELL}>
      <dt className="min-h-[44px] text-note text-soft">Starts somewhere from a lift of</dt>
      <dd className="pt-1">
        <span className="whitespace-nowrap text-filled font-light leading-[44px]">{words}</span>
        <svg width="100%" height="14" aria-hidden="true" className="block max-w-[220px]">
          <line x1="0" x2="100%" y1="7" y2="7" className="stroke-rule" />
          <line x1={x(low)} x2={x(high)} y1="7" y2="7" strokeWidth="3" className="stroke-ink" />
          {[gates.from, gates.to].map((gate) => (
            <line
              key={gate}
              x1={x(gate)}
              x2={x(gate)}
              y1="0"
              y2="14"
              strokeDasharray="2 2"
              className="stroke-ink"
            />
          ))}
        </svg>
        <span className="block text-note text-soft">
          a range, never a point; dots: {gates.from}° and {gates.to}°
        </span>
      </dd>
    </div>
  );
}

function ThreeWays({ figures: { pEarly, pIn } }: { figures: ReadingFigures }) {
  const ways = [
    ['Turns out by more than 1°', pEarly],
    ['Within 1° either way', Math.max(0, 1 - pEarly - pIn)],
    ['Turns in by more than 1°', pIn],
  ] as const;
  return (
    <dl className="grid border-b border-rule phone:grid-cols-3">
      {ways.map(([name, p]) => (
        <div
          key={name}
          className="border-rule py-3 phone:border-l phone:px-4 phone:first:border-l-0 phone:first:pl-0"
        >
          <dt className="text-note text-soft">{name}</dt>
          <dd>
            <span className="text-filled font-light">{inHundred(p)}</span> in 100
          </dd>
        </div>
      ))}
    </dl>
  );
}
