import type { LandmarkId, Side, View } from '#shared/landmarks/types.ts';
import { roleIn } from '#shared/landmarks/table.ts';
import { DRAWINGS, isMirrored } from './drawing-figures.ts';

const COLOUR = {
  support: 'text-shank-dusk',
  lifted: 'text-tide-dusk',
  midline: 'text-dusk-ink',
} as const;

/** A small drawing of where the landmark is found; words beside it say the same. */
export function LandmarkDrawing({
  id,
  view,
  standingOn,
  width = 92,
}: {
  id: LandmarkId;
  view: View;
  standingOn: Side;
  width?: number;
}) {
  const { figure, at } = DRAWINGS[id];
  const role = roleIn(id, view);
  const mirrored = isMirrored(id, standingOn);
  const x = mirrored ? 92 - at[0] : at[0];
  return (
    <svg
      width={width}
      height={(width * 112) / 92}
      viewBox="0 0 92 112"
      fill="none"
      strokeLinecap="round"
      strokeLinejoin="round"
      aria-hidden="true"
      className="flex-none overflow-visible"
    >
      <g
        transform={mirrored ? 'translate(92 0) scale(-1 1)' : undefined}
        className="stroke-dusk-ink"
        strokeWidth="1.6"
      >
        <path d={figure.lines} />
        {figure.dashed && <path d={figure.dashed} strokeDasharray="3 3" strokeOpacity="0.75" />}
        {figure.gear && <path d={figure.gear} strokeWidth="2.4" />}
      </g>
      {figure.words && (
        <text
          x={figure.words.x}
          y={figure.words.y}
          fontSize="14"
          textAnchor="middle"
          className="fill-dusk-soft"
        >
          {figure.words.text}
        </text>
      )}
      <g
        transform={`translate(${x} ${at[1]})`}
        className={COLOUR[role]}
        stroke="currentColor"
        strokeWidth="2.4"
      >
        <circle r="12" stroke="none" className="fill-dusk" fillOpacity="0.55" />
        {role === 'support' && <circle r="7" />}
        {role === 'lifted' && <path d="M0-8 8 0 0 8-8 0Z" />}
        {role === 'midline' && <path d="M-3-7h-4V7h4M3-7h4V7H3" />}
        <circle r="1.8" fill="currentColor" stroke="none" />
      </g>
    </svg>
  );
}
