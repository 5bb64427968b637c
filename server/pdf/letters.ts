import { create, type Font, type PathCommand } from 'fontkit';
import type { Letters } from '#shared/overlay/fills/fill-context.ts';
import type { Ring, Spot } from '#shared/overlay/fills/geometry.ts';
import { fontFiles, type Weight } from './fonts.ts';
import { fontName, Typeface } from './typeface.ts';

/** Corners of one curve of a letter; more cannot be seen at the sizes that are written. */
const STEPS = 4;

/** A letter's outlines in the font's own units, y up. */
const outlines = (commands: readonly PathCommand[]): Spot[][] => {
  const rings: Spot[][] = [];
  const at = (): Spot => rings.at(-1)?.at(-1) ?? { x: 0, y: 0 };
  for (const { command, args } of commands) {
    const [a = 0, b = 0, c = 0, d = 0, e = 0, f = 0] = args;
    if (command === 'moveTo') rings.push([{ x: a, y: b }]);
    else if (command === 'lineTo') rings.at(-1)?.push({ x: a, y: b });
    else if (command !== 'closePath') {
      const from = at();
      const [to, one, two] =
        command === 'quadraticCurveTo'
          ? [
              { x: c, y: d },
              { x: from.x + (2 / 3) * (a - from.x), y: from.y + (2 / 3) * (b - from.y) },
              { x: c + (2 / 3) * (a - c), y: d + (2 / 3) * (b - d) },
            ]
          : [
              { x: e, y: f },
              { x: a, y: b },
              { x: c, y: d },
            ];
      for (let n = 1; n <= STEPS; n += 1) {
        const [t, s] = [n / STEPS, 1 - n / STEPS];
        const on = (p: number, q: number, r: number, u: number) =>
          s ** 3 * p + 3 * s * s * t * q + 3 * s * t * t * r + t ** 3 * u;
        rings
          .at(-1)
          ?.push({ x: on(from.x, one.x, two.x, to.x), y: on(from.y, one.y, two.y, to.y) });
      }
    }
  }
  return rings.filter((ring) => ring.length > 2);
};

let read: Promise<Record<Weight, Letters>> | undefined;

/** The product's own letters as outlines, so that a film shows them wherever it is made. */
export const letters = (): Promise<Record<Weight, Letters>> => {
  read ??= fontFiles().then((files) => {
    const fonts = new Map<string, Font>();
    const face = new Typeface(files, (name, bytes) => {
      const font = create(bytes);
      fonts.set(name, font);
      return { font };
    });
    const plain = fonts.get(fontName('latin', 'plain'));
    if (!plain) throw new Error('The Latin letters are missing.');
    const of = (weight: Weight): Letters => {
      const laid = (text: string) =>
        face.runs(text, weight).map((run) => {
          const font = fonts.get(run.font) ?? plain;
          // its width is a getter, which a copy would lose
          const { advanceWidth, glyphs, positions } = font.layout(run.text);
          return { font, advanceWidth, glyphs, positions };
        });
      return {
        width: (text, size) =>
          laid(text).reduce(
            (sum, { advanceWidth, font }) => sum + (advanceWidth / font.unitsPerEm) * size,
            0,
          ),
        rings: (text, size) => {
          const rings: Ring[] = [];
          let x = 0;
          for (const { font, glyphs, positions } of laid(text)) {
            const scale = size / font.unitsPerEm;
            const base = (scale * (font.ascent + font.descent)) / 2;
            for (const [n, { path }] of glyphs.entries()) {
              const place = positions[n] ?? { xAdvance: 0, xOffset: 0, yOffset: 0 };
              for (const ring of outlines(path.commands))
                rings.push(
                  ring.map((spot) => ({
                    x: x + scale * (place.xOffset + spot.x),
                    y: base - scale * (place.yOffset + spot.y),
                  })),
                );
              x += scale * place.xAdvance;
            }
          }
          return rings;
        },
      };
    };
    return { plain: of('plain'), strong: of('strong') };
  });
  return read;
};
