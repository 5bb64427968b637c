import { useMemo } from 'react';
import { cx } from '../class-names.ts';
import { qrModules } from './qr-modules.ts';

/** Light modules around the symbol, without which no reader finds it. */
const QUIET = 4;

/** A text for a camera, dark on white. A `large` one is as wide as what it stands in, up to a hand's breadth. */
export function QrCode({
  text,
  label,
  size: extent = 'small',
}: {
  text: string;
  label: string;
  size?: 'small' | 'large';
}) {
  const modules = useMemo(() => qrModules(text), [text]);
  const size = modules.length + 2 * QUIET;
  const dark = modules.flatMap((row, down) =>
    row.flatMap((on, right) => (on ? [`M${right + QUIET} ${down + QUIET}h1v1h-1z`] : [])),
  );
  return (
    <svg
      role="img"
      aria-label={label}
      viewBox={`0 0 ${size} ${size}`}
      shapeRendering="crispEdges"
      className={cx(
        'block max-w-full border border-rule',
        extent === 'large' ? 'w-80 print:w-full' : 'w-56',
      )}
    >
      <rect width={size} height={size} fill="#fff" />
      <path d={dark.join('')} fill="#000" />
    </svg>
  );
}
