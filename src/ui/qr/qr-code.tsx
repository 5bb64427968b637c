import { useMemo } from 'react';
import { qrModules } from './qr-modules.ts';

/** Light modules around the symbol, without which no reader finds it. */
const QUIET = 4;

/** A text for a camera, dark on white. */
export function QrCode({ text, label }: { text: string; label: string }) {
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
      className="block w-56 max-w-full border border-rule"
    >
      <rect width={size} height={size} fill="#fff" />
      <path d={dark.join('')} fill="#000" />
    </svg>
  );
}
