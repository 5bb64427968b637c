import { degrees, turn } from '#shared/exports/figures.ts';
import { fillsOf, type Letters } from '#shared/overlay/fills/fill-context.ts';
import { paintOverlay } from '#shared/overlay/paint-overlay.ts';
import type { OverlayMarks } from '#shared/contracts/replay-parts.ts';
import { drawnOn } from '#shared/replay/drawn-on.ts';
import { type Paper, type Pen, SOFT } from '#server/pdf/paper.ts';
import type { Still } from '../make-pictures.ts';
import type { ReportKeyFrames, ReportReading } from '../report-content.ts';

const GAP = 9;

type Row = OverlayMarks[number];

/** Of a picture, pt: what stands after them then mostly fits on the same page. */
const TALLEST = 158;

const nameOf = ({ moments }: ReportKeyFrames['drawn'], { gates }: ReportReading, frame: number) => {
  switch (frame) {
    case moments.quiet:
      return 'Quiet stance';
    case moments.from:
      return `${gates.from}° of lift`;
    case moments.to:
      return `${gates.to}° of lift`;
    default:
      return 'Top of the lift';
  }
};

/** Never surer than it is: rounded up. */
const within = (value: number | null): string =>
  value === null ? '' : ` ±\u00a0${Math.ceil(value)}°`;

const valuesOf = ({ lift, liftPlusMinus, turn: turned, turnPlusMinus }: Row, front: boolean) =>
  [
    lift === null
      ? ''
      : front && lift < 20
        ? 'lift under 20°'
        : `lift ${degrees(lift, 0)}${within(liftPlusMinus)}`,
    turned === null ? '' : `turn ${turn(turned, 0)}${within(turnPlusMinus)}`,
  ].filter((part) => part !== '');

const path = (rings: readonly (readonly { readonly x: number; readonly y: number }[])[]): string =>
  rings
    .map((ring) => `M${ring.map(({ x, y }) => `${x.toFixed(2)} ${y.toFixed(2)}`).join('L')}Z`)
    .join('');

/** The picture, and over it exactly what the Bench and the replay draw. */
const draw = (
  { doc, word }: Pen,
  { drawn }: ReportKeyFrames,
  row: Row,
  still: Still,
  [width, height]: readonly [number, number],
  letters: Letters,
  words: readonly string[],
): void => {
  doc.image(still.jpeg, 0, 0, { width, height });
  const scale = (width / still.size.width) * still.scale;
  const fills = fillsOf(letters, (context) =>
    paintOverlay(context, drawnOn(drawn, [], row.frame, null).primitives, {
      viewport: { scale, x: -still.from.u * scale, y: -still.from.v * scale },
      bounds: { width, height },
      // marks of about a third of the page's: the picture is a third as large
      unit: 0.34,
    }),
  );
  doc.save().rect(0, 0, width, height).clip();
  for (const { colour, alpha, rings } of fills)
    doc.path(path(rings)).fillOpacity(alpha).fillColor(colour).fill('non-zero');
  doc.restore();
  doc.fillOpacity(1);
  for (const [n, text] of words.entries())
    word(text, 0, height + 3 + n * 9.5, {
      size: 8,
      weight: n === 0 ? 'strong' : 'plain',
      ...(n === 0 ? {} : { colour: SOFT }),
      width,
    });
};

/** Quiet stance, gates and top beside each other, each with its words; or why there are none. */
export const writeKeyFrames = (
  paper: Paper,
  reading: ReportReading,
  keyFrames: ReportKeyFrames,
  stills: readonly Still[] | string,
  letters: Letters,
): void => {
  if (typeof stills === 'string') {
    paper.subheading('Key frames');
    paper.says(`There are none in this report: ${stills}.`);
    return;
  }
  const { drawn } = keyFrames;
  const column = (paper.width - 3 * GAP) / 4;
  const tallest = Math.max(...stills.map(({ size }) => size.height / size.width));
  const width = Math.min(column, TALLEST / tallest);
  const sizes = stills.map(({ size }) => (width * size.height) / size.width);
  const height = Math.max(...sizes) + 36;
  // the heading stays with them
  paper.room(height + 24);
  paper.subheading('Key frames');
  const top = paper.y;
  for (const [n, still] of stills.entries()) {
    const row = drawn.overlay.find(({ frame }) => frame === still.frame);
    if (!row) continue;
    const name = nameOf(drawn, reading, still.frame);
    const values = valuesOf(row, drawn.view === 'front');
    paper.y = top;
    paper.within(n * (column + GAP), column, () =>
      paper.figure(
        `${name}: frame ${still.frame} of the clip with the marks on it, the head hidden. ${values.join(', ')}.`,
        width,
        height,
        (pen) =>
          draw(pen, keyFrames, row, still, [width, sizes[n] ?? 0], letters, [name, ...values]),
      ),
    );
  }
  paper.y = top + height;
  paper.note(
    'One rep of those that count. Marks and lines stand where they were placed; the ± is of the one frame (95 %). The head is hidden in the pictures.',
  );
};
