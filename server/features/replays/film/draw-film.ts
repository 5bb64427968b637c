import type { PublicReplay } from '#shared/contracts/replays.ts';
import { type Fill, fillsOf, type Letters } from '#shared/overlay/fills/fill-context.ts';
import { paintOverlay } from '#shared/overlay/paint-overlay.ts';
import { OVERLAY_COLOURS } from '#shared/overlay/style.ts';
import { callWords, NOT_AN_INJURY, readingWords } from '#shared/replay/athlete-words.ts';
import { calmTurn } from '#shared/replay/calm-turn.ts';
import { drawnOn, type Shown } from '#shared/replay/drawn-on.ts';
import { liftReadout, turnReadout } from '#shared/replay/readout.ts';
import type { Milliseconds } from '#shared/timing/units.ts';
import type { BurnInRequest } from '#server/media/burn-in.ts';
import type { Size } from '#server/media/types.ts';
import type { Weight } from '#server/pdf/fonts.ts';
import { dayWords } from '../../reports/write/report-words.ts';

/** Of the band under the picture. */
export const GROUND = '#1A211E';
const INK = '#EDEBE2';
const SOFT = '#B9BDB2';

export type Face = Record<Weight, Letters>;
type Drawing = Pick<BurnInRequest, 'size' | 'band' | 'drawn'>;

/** What the page of a link shows. */
export type Content = Omit<PublicReplay, 'film'>;

interface Style {
  readonly size: number;
  readonly weight: Weight;
  readonly colour: string;
}

const SEEN = 'Seen by your coach, not measured:';

/** What a replay's page says under the film, in its order. */
export const saidInFilm = (replay: Content, madeAt: Date) => {
  const { reading, call, side, coachName, gates, practice, visitDay } = replay;
  const seen = call && callWords(call.seen, side, coachName, gates);
  const main = reading ? readingWords(reading, side, gates) : seen;
  return {
    title: main?.title ?? `Your lift, standing on the ${side} leg`,
    text: [
      ...(main ? [`${!reading ? `${SEEN} ` : ''}${main.text.join(' ')}`] : []),
      ...(reading && seen ? [`${SEEN} ${seen.text.at(-1) ?? ''}`] : []),
      `${main?.sure ?? ''} ${NOT_AN_INJURY}`.trim(),
    ],
    foot: `${practice.name}, visit of ${dayWords(visitDay)}. This film was made on ${dayWords(madeAt.toISOString())} and says what stood then.`,
  };
};

/** Lines no wider than there is room for; a word that is wider stands alone. */
const wrapped = (text: string, letters: Letters, size: number, room: number): string[] => {
  const lines: string[] = [];
  for (const word of text.split(' ')) {
    const longer = lines.length > 0 ? `${lines.at(-1)} ${word}` : word;
    if (lines.length > 0 && letters.width(longer, size) <= room) lines[lines.length - 1] = longer;
    else lines.push(word);
  }
  return lines;
};

/** Words from the left about the middle of their line. */
const words = (
  face: Face,
  text: string,
  x: number,
  y: number,
  { size, weight, colour }: Style,
) => ({
  colour,
  alpha: 1,
  rings: face[weight]
    .rings(text, size)
    .map((ring) => ring.map((spot) => ({ x: x + spot.x, y: y + spot.y }))),
});

const even = (length: number): number => 2 * Math.ceil(length / 2);

/** The two angles of one frame, left and right under the picture, as the replay's page has them. */
const readout = (
  face: Face,
  shown: Shown,
  fromFront: boolean,
  at: { x: number; end: number; y: number },
  size: number,
): Fill[] => {
  const part = (name: string, value: string, colour: string) => {
    const said = value === '' ? '–' : value;
    const label = `${name} `;
    const width = face.plain.width(label, size);
    return {
      width: width + face.strong.width(said, size),
      at: (x: number): Fill[] => [
        words(face, label, x, at.y, { size, weight: 'plain', colour: SOFT }),
        words(face, said, x + width, at.y, { size, weight: 'strong', colour }),
      ],
    };
  };
  const lift = part('lifted thigh', liftReadout(shown, fromFront), OVERLAY_COLOURS.lifted);
  const turn = part('standing hip', turnReadout(shown), OVERLAY_COLOURS.support);
  return [...lift.at(at.x), ...turn.at(at.end - turn.width)];
};

/**
 * The marks on every frame of the span, and under the picture the angles of the frame and what the replay says: the
 * same as its page shows, by the same code.
 * @param size of the picture, px
 */
export const drawFilm = (
  replay: Content,
  times: readonly Milliseconds[],
  size: Size,
  face: Face,
  madeAt: Date,
): Drawing => {
  const { width, height } = size;
  const em = Math.max(width, height) / 900;
  const [margin, room] = [20 * em, width - 40 * em];
  const figures = replay.reading !== null;
  const said = saidInFilm(replay, madeAt);
  const still: Fill[] = [];
  let y = height + 14 * em;
  const readoutAt = y + 15 * em;
  if (figures) y += 36 * em;
  const write = (text: string, style: Style, after: number) => {
    for (const line of wrapped(text, face[style.weight], style.size, room)) {
      still.push(words(face, line, margin, y + 0.65 * style.size, style));
      y += 1.3 * style.size;
    }
    y += after;
  };
  write(said.title, { size: 24 * em, weight: 'strong', colour: INK }, 8 * em);
  for (const text of said.text)
    write(text, { size: 16 * em, weight: 'plain', colour: INK }, 7 * em);
  write(said.foot, { size: 14 * em, weight: 'plain', colour: SOFT }, 0);
  const calm = { ...replay, overlay: calmTurn(replay.overlay, times) };
  const scale = width / replay.width;
  const { fromFrame, toFrame } = replay;
  const frames = Array.from({ length: toFrame - fromFrame + 1 }, (_, n) => fromFrame + n);
  return {
    size,
    band: even(y + 14 * em - height),
    drawn: [
      { from: fromFrame, to: toFrame, fills: still },
      ...frames.map((frame) => {
        const shown = drawnOn(calm, times, frame, null);
        const marks = fillsOf(face.strong, (context) =>
          paintOverlay(context, shown.primitives, {
            viewport: { scale, x: 0, y: 0 },
            bounds: size,
            unit: height / 900,
          }),
        );
        const at = { x: margin, end: width - margin, y: readoutAt };
        return {
          from: frame,
          to: frame,
          fills: [
            ...marks,
            ...(figures ? readout(face, shown, replay.view === 'front', at, 18 * em) : []),
          ],
        };
      }),
    ],
  };
};
