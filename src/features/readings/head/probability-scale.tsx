import { inHundred } from '../words/probability-words.ts';
import type { Certainty } from '../words/sentence-words.ts';

const at = (p: number): string => `${100 * p}%`;

/** 0 to 100 in 100, with the place from which a reading begins; ink, since it is a threshold. */
export function ProbabilityScale({ p, limit, of }: Certainty) {
  const needed = Math.round(1000 * limit) / 10;
  return (
    <div className="w-full max-w-[260px] text-caption text-soft">
      <svg
        width="100%"
        height="56"
        role="img"
        aria-label={`${inHundred(p)} in 100 ${of}; a reading needs ${needed} in 100`}
        className="overflow-visible"
      >
        <text x={at(limit)} y="13" textAnchor="end" className="fill-soft text-caption">
          a reading needs {needed} in 100
        </text>
        <line x1="0" x2="100%" y1="34" y2="34" className="stroke-edge" />
        <line x1={at(limit)} x2="100%" y1="34" y2="34" strokeWidth="5" className="stroke-ink" />
        {[0, 0.5, 1].map((tick) => (
          <line key={tick} x1={at(tick)} x2={at(tick)} y1="34" y2="40" className="stroke-edge" />
        ))}
        <line x1={at(limit)} x2={at(limit)} y1="18" y2="40" className="stroke-ink" />
        <circle
          cx={at(Math.min(1, Math.max(0, p)))}
          cy="34"
          r="7"
          strokeWidth="2"
          className="fill-ink stroke-mud"
        />
        <text x="0" y="55" className="fill-soft text-caption">
          0
        </text>
        <text x="50%" y="55" textAnchor="middle" className="fill-soft text-caption">
          50
        </text>
        <text x="100%" y="55" textAnchor="end" className="fill-soft text-caption">
          100
        </text>
      </svg>
    </div>
  );
}
