import { turn as turnText } from '../figures.ts';
import type { CourseScale } from '#shared/plots/course-scale.ts';

/** The frame that is shown: cross lines, tags on both axes, a ring where its turn is known and lies in the plot. */
export function CourseCurrent({
  lift,
  liftWords,
  turn,
  scale,
}: {
  lift: number;
  /** Its figure as it is shown elsewhere: a front view names none under 20°. */
  liftWords: string;
  turn: number | null;
  scale: CourseScale;
}) {
  const { x, y, left, bottom, top } = scale;
  const [least = 0, most = 0] = y.domain();
  const within = turn !== null && turn >= least && turn <= most;
  const height = y(Math.min(Math.max(turn ?? most, least), most));
  return (
    <g>
      <path d={`M${x(lift)} ${within ? height : top}V${bottom}`} className="stroke-ink/45" />
      {within && (
        <>
          <path d={`M${left} ${height}H${x(lift)}`} className="stroke-ink/45" />
          <circle
            cx={x(lift)}
            cy={height}
            r="8.5"
            fill="none"
            strokeWidth="2"
            className="stroke-ink"
          />
        </>
      )}
      {turn !== null && (
        <g transform={`translate(${left - 2} ${height})`}>
          <rect x="-42" y="-12" width="42" height="24" rx="2" className="fill-ink" />
          <text x="-21" y="5" textAnchor="middle" className="fill-mud font-bold">
            {turnText(turn).replace('°', '')}
          </text>
        </g>
      )}
      <g transform={`translate(${x(lift)} ${bottom + 17})`}>
        <rect x="-22" y="-13" width="44" height="26" rx="2" className="fill-ink" />
        <text y="5" textAnchor="middle" className="fill-mud font-bold">
          {liftWords}
        </text>
      </g>
    </g>
  );
}

/** The frame that is worth marking next; its words stand left of the lower gate. */
export function CourseNext({
  lift,
  turn,
  words,
  scale,
}: {
  lift: number;
  /** Height of the ring: the course there, or zero where there is no course yet. */
  turn: number;
  /** What to do, and the gain. */
  words: readonly [string, string];
  scale: CourseScale;
}) {
  const { x, y, bottom, compact, gates } = scale;
  const wordsY = bottom - 62;
  return (
    <g>
      <path
        d={`M${x(lift)} ${y(turn)}V${bottom}`}
        strokeDasharray="3 3"
        strokeWidth="1.25"
        className="stroke-ink"
      />
      {!compact && lift > gates.from + 2 && (
        <>
          <path
            d={`M${x(gates.from) - 4} ${wordsY + 4}H${x(lift)}`}
            strokeDasharray="3 3"
            strokeWidth="1.25"
            className="stroke-ink"
          />
          <text
            x={x(gates.from) - 10}
            y={wordsY}
            textAnchor="end"
            className="plot-over plot-strong"
          >
            {words[0]}
          </text>
          <text
            x={x(gates.from) - 10}
            y={wordsY + 18}
            textAnchor="end"
            className="plot-over fill-ink"
          >
            {words[1]}
          </text>
        </>
      )}
      <circle
        cx={x(lift)}
        cy={y(turn)}
        r="8.5"
        strokeDasharray="3 3"
        strokeWidth="1.5"
        className="fill-mud stroke-ink motion-safe:animate-breathe"
      />
    </g>
  );
}

const SHORT_BRACKET = 56;

/** The change from gate to gate, as a bracket at the upper one with its words. */
export function CourseBracket({
  atFrom,
  change,
  words,
  scale,
}: {
  atFrom: number;
  /** Exactly d. */
  change: number;
  /** `+6.8° ± 3.6` */
  words: string;
  scale: CourseScale;
}) {
  const { x, y, gates } = scale;
  const from = y(atFrom);
  const to = y(atFrom + change);
  const at = x(gates.to) + 10;
  // beside a short bracket the words would lie over those of the wedge
  const short = Math.abs(to - from) < SHORT_BRACKET;
  const wordsY = short ? to + (change < 0 ? 20 : -8) : (from + to) / 2 + 6;
  return (
    <g>
      <path d={`M${x(gates.from)} ${from}H${at}`} strokeDasharray="1 3" className="stroke-ink" />
      <path
        d={`M${at - 4} ${from}h4V${to}h-4`}
        fill="none"
        strokeWidth="1.5"
        className="stroke-ink"
      />
      <text x={at + 8} y={wordsY} className="plot-over fill-ink text-sub font-bold">
        {words}
      </text>
    </g>
  );
}

/** Where an early turn starts: a bar over its range, never a point. */
export function CourseOnset({
  low,
  high,
  words,
  scale,
}: {
  low: number;
  high: number;
  words: string;
  scale: CourseScale;
}) {
  const { x, bottom } = scale;
  const y = bottom - 30;
  return (
    <g>
      <path
        d={`M${x(low)} ${y - 5}v10M${x(low)} ${y}H${x(high)}M${x(high)} ${y - 5}v10`}
        fill="none"
        strokeWidth="1.5"
        className="stroke-ink"
      />
      <text x={(x(low) + x(high)) / 2} y={y - 12} textAnchor="middle" className="plot-over">
        {words}
      </text>
    </g>
  );
}
