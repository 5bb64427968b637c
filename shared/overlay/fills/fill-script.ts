import type { Fill } from './fill-context.ts';
import type { Ring } from './geometry.ts';

/** What stands on the picture from one moment to another, in seconds of the script's own clock. */
export interface Shown {
  readonly from: number;
  readonly to: number;
  readonly fills: readonly Fill[];
}

/** Hundredths of a second are the finest that the format knows. */
const clock = (seconds: number): string => {
  const hundredths = Math.round(seconds * 100);
  const part = (per: number, of: number) =>
    String(Math.floor(hundredths / per) % of).padStart(2, '0');
  return `${Math.floor(hundredths / 360_000)}:${part(6000, 60)}:${part(100, 60)}.${part(1, 100)}`;
};

/** Corners are written in eighths of a pixel: `\p4`. */
const EIGHTHS = 8;
const ringText = (ring: Ring): string =>
  ring
    .map(({ x, y }, n) => {
      const verb = n === 0 ? 'm ' : n === 1 ? 'l ' : '';
      return `${verb}${Math.round(x * EIGHTHS)} ${Math.round(y * EIGHTHS)}`;
    })
    .join(' ');

/** From `#RRGGBB` to the format's blue, green, red. */
const bgr = (colour: string): string =>
  `${colour.slice(5, 7)}${colour.slice(3, 5)}${colour.slice(1, 3)}`;
/** 0 is full here, 255 clear. */
const clearness = (alpha: number): string =>
  Math.round(255 * (1 - alpha))
    .toString(16)
    .padStart(2, '0')
    .toUpperCase();

const eventsOf = ({ from, to, fills }: Shown): string[] =>
  fills.map(
    ({ colour, alpha, rings }, layer) =>
      `Dialogue: ${layer},${clock(from)},${clock(to)},Fill,,0,0,0,,{\\an7\\pos(0,0)\\1c&H${bgr(colour)}&\\1a&H${clearness(alpha)}&\\p4}${rings.map(ringText).join(' ')}`,
  );

/**
 * Fills as an Advanced SubStation script that a film's maker lays over the picture: vector drawings only, no words,
 * so that no font is looked for. Later fills lie over earlier ones of the same moment.
 * @param size of the picture, px: the script's own pixels
 */
export const fillScript = (
  size: { readonly width: number; readonly height: number },
  shown: readonly Shown[],
): string =>
  [
    '[Script Info]',
    'ScriptType: v4.00+',
    `PlayResX: ${size.width}`,
    `PlayResY: ${size.height}`,
    'ScaledBorderAndShadow: yes',
    'WrapStyle: 2',
    'YCbCr Matrix: None',
    '',
    '[V4+ Styles]',
    'Format: Name, Fontname, Fontsize, PrimaryColour, SecondaryColour, OutlineColour, BackColour, Bold, Italic, Underline, StrikeOut, ScaleX, ScaleY, Spacing, Angle, BorderStyle, Outline, Shadow, Alignment, MarginL, MarginR, MarginV, Encoding',
    'Style: Fill,Sans,16,&H00FFFFFF,&H00FFFFFF,&H00000000,&H00000000,0,0,0,0,100,100,0,0,1,0,0,7,0,0,0,1',
    '',
    '[Events]',
    'Format: Layer, Start, End, Style, Name, MarginL, MarginR, MarginV, Effect, Text',
    ...shown.flatMap(eventsOf),
    '',
  ].join('\n');
