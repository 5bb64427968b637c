import type { PaintContext } from '../paint-marks.ts';
import { arcSteps, dashesOf, type Ring, type Spot, strokeOf } from './geometry.ts';

/** A shape in one colour. */
export interface Fill {
  /** `#RRGGBB` */
  readonly colour: string;
  /** 0 clear to 1 full. */
  readonly alpha: number;
  readonly rings: readonly Ring[];
}

/** What letters look like, for who has no page to write on. */
export interface Letters {
  /** Pixels at this size. */
  width(text: string, size: number): number;
  /** Outlines about the start of the text, halfway up its line. */
  rings(text: string, size: number): readonly Ring[];
}

interface Line {
  points: Spot[];
  closed: boolean;
}

interface Look {
  x: number;
  y: number;
  strokeStyle: string;
  fillStyle: string;
  lineWidth: number;
  lineCap: CanvasLineCap;
  lineJoin: CanvasLineJoin;
  font: string;
  textAlign: CanvasTextAlign;
  textBaseline: CanvasTextBaseline;
  dash: readonly number[];
}

const FRESH: Look = {
  x: 0,
  y: 0,
  strokeStyle: '#000000',
  fillStyle: '#000000',
  lineWidth: 1,
  lineCap: 'butt',
  lineJoin: 'miter',
  font: '16px sans-serif',
  textAlign: 'left',
  textBaseline: 'alphabetic',
  dash: [],
};

const colourOf = (style: string): Pick<Fill, 'colour' | 'alpha'> => {
  if (/^#[0-9a-f]{6}$/i.test(style)) return { colour: style.toUpperCase(), alpha: 1 };
  const [, r, g, b, a] =
    /^rgba\((\d+), (\d+), (\d+), ([\d.]+)\)$/.exec(style) ?? ([] as (string | undefined)[]);
  if (a === undefined) throw new RangeError(`The colour ${style} is not known here.`);
  const two = (part: string | undefined) => Number(part).toString(16).padStart(2, '0');
  return { colour: `#${two(r)}${two(g)}${two(b)}`.toUpperCase(), alpha: Number(a) };
};

/** Where a painter's strokes and words become filled outlines, which a film and a paper can both show. */
class FillContext {
  readonly fills: Fill[] = [];
  readonly #letters: Letters;
  readonly #looks: Look[] = [];
  #look: Look = { ...FRESH };
  #lines: Line[] = [];

  constructor(letters: Letters) {
    this.#letters = letters;
  }

  set strokeStyle(style: string) {
    this.#look.strokeStyle = style;
  }
  set fillStyle(style: string) {
    this.#look.fillStyle = style;
  }
  set lineWidth(width: number) {
    this.#look.lineWidth = width;
  }
  set lineCap(cap: CanvasLineCap) {
    this.#look.lineCap = cap;
  }
  /** Sharp bends are round whatever is asked: no painter asks for more where it shows. */
  set lineJoin(join: CanvasLineJoin) {
    this.#look.lineJoin = join;
  }
  set font(font: string) {
    this.#look.font = font;
  }
  set textAlign(align: CanvasTextAlign) {
    this.#look.textAlign = align;
  }
  set textBaseline(baseline: CanvasTextBaseline) {
    this.#look.textBaseline = baseline;
  }

  setLineDash(dash: number[]): void {
    this.#look.dash = dash;
  }
  save(): void {
    this.#looks.push({ ...this.#look });
  }
  restore(): void {
    this.#look = this.#looks.pop() ?? this.#look;
  }
  translate(x: number, y: number): void {
    this.#look.x += x;
    this.#look.y += y;
  }

  beginPath(): void {
    this.#lines = [];
  }
  #spot(x: number, y: number): Spot {
    return { x: this.#look.x + x, y: this.#look.y + y };
  }
  moveTo(x: number, y: number): void {
    this.#lines.push({ points: [this.#spot(x, y)], closed: false });
  }
  lineTo(x: number, y: number): void {
    const line = this.#lines.at(-1);
    if (!line) return this.moveTo(x, y);
    line.points.push(this.#spot(x, y));
  }
  closePath(): void {
    const line = this.#lines.at(-1);
    if (line) line.closed = true;
  }
  rect(x: number, y: number, width: number, height: number): void {
    this.moveTo(x, y);
    this.lineTo(x + width, y);
    this.lineTo(x + width, y + height);
    this.lineTo(x, y + height);
    this.closePath();
  }
  arc(x: number, y: number, radius: number, from: number, to: number, back = false): void {
    const whole = Math.abs(to - from) >= 2 * Math.PI;
    const round = 2 * Math.PI;
    const forward = (((to - from) % round) + round) % round;
    const sweep = whole ? round : back ? forward - round : forward;
    const steps = arcSteps(radius, sweep);
    for (let n = 0; n <= (whole ? steps - 1 : steps); n += 1) {
      const angle = from + (sweep * n) / steps;
      const at = [x + radius * Math.cos(angle), y + radius * Math.sin(angle)] as const;
      if (n === 0 && whole) this.moveTo(...at);
      else this.lineTo(...at);
    }
    if (whole) this.closePath();
  }

  #paint(style: string, rings: readonly Ring[]): void {
    if (rings.length > 0) this.fills.push({ ...colourOf(style), rings });
  }
  #strokes(lines: readonly Line[]): Ring[] {
    const { dash, lineWidth: width, lineCap, strokeStyle: _ } = this.#look;
    const pen = { width, cap: lineCap === 'round' ? 'round' : 'butt' } as const;
    return lines.flatMap(({ points, closed }) =>
      dash.length === 0
        ? strokeOf(points, closed, pen)
        : dashesOf(points, closed, dash).flatMap((piece) => strokeOf(piece, false, pen)),
    );
  }
  stroke(): void {
    this.#paint(this.#look.strokeStyle, this.#strokes(this.#lines));
  }
  fill(): void {
    this.#paint(
      this.#look.fillStyle,
      this.#lines.map(({ points }) => points),
    );
  }

  get #size(): number {
    return Number(/([\d.]+)px/.exec(this.#look.font)?.[1] ?? NaN);
  }
  measureText(text: string): Pick<TextMetrics, 'width'> {
    return { width: this.#letters.width(text, this.#size) };
  }
  #text(text: string, x: number, y: number): Ring[] {
    if (this.#look.textAlign !== 'left' || this.#look.textBaseline !== 'middle')
      throw new RangeError('Words are painted from the left and about the middle of their line.');
    const at = this.#spot(x, y);
    return this.#letters
      .rings(text, this.#size)
      .map((ring) => ring.map((spot) => ({ x: at.x + spot.x, y: at.y + spot.y })));
  }
  fillText(text: string, x: number, y: number): void {
    this.#paint(this.#look.fillStyle, this.#text(text, x, y));
  }
  strokeText(text: string, x: number, y: number): void {
    const outlines = this.#text(text, x, y).map((points) => ({
      points: [...points],
      closed: true,
    }));
    this.#paint(this.#look.strokeStyle, this.#strokes(outlines));
  }
}

/** What a painter paints, as filled outlines, bottom first. */
export const fillsOf = (letters: Letters, paint: (context: PaintContext) => void): Fill[] => {
  const context = new FillContext(letters);
  paint(context as unknown as PaintContext);
  return context.fills;
};
