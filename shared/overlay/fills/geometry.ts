/** A place of what is painted on; x to the right, y down, its own pixels. */
export interface Spot {
  readonly x: number;
  readonly y: number;
}

/** A closed outline; its last corner joins its first. Filled by the rule of non-zero winding. */
export type Ring = readonly Spot[];

/** How far a round line may run beside its corners, pixels. */
const FLAT = 0.04;
/** A bend sharper than this is rounded off; a gentler one is drawn out to its corner. Radians. */
const SHARP = 0.6;

/** Steps of an arc that is drawn as a line with corners. */
export const arcSteps = (radius: number, sweep: number): number =>
  radius <= FLAT
    ? 1
    : Math.max(2, Math.ceil(Math.abs(sweep) / (2 * Math.acos(1 - FLAT / Math.max(radius, FLAT)))));

export const disc = (centre: Spot, radius: number): Ring => {
  const steps = Math.max(8, arcSteps(radius, 2 * Math.PI));
  return Array.from({ length: steps }, (_, n) => {
    const angle = (2 * Math.PI * n) / steps;
    return { x: centre.x + radius * Math.cos(angle), y: centre.y + radius * Math.sin(angle) };
  });
};

const same = (a: Spot, b: Spot): boolean => Math.hypot(a.x - b.x, a.y - b.y) < 1e-9;

/** Twice the area; positive where the corners run clockwise on the screen. */
export const windingOf = (ring: Ring): number =>
  ring.reduce((sum, a, n) => {
    const b = ring[(n + 1) % ring.length] ?? a;
    return sum + a.x * b.y - b.x * a.y;
  }, 0);

/** Overlapping pieces add up only where all of them turn the same way. */
const clockwise = (ring: Ring): Ring => (windingOf(ring) < 0 ? [...ring].reverse() : ring);

const headings = (line: readonly Spot[]): number[] =>
  line.slice(1).map((to, n) => {
    const from = line[n] ?? to;
    return Math.atan2(to.y - from.y, to.x - from.x);
  });

const turnBetween = (a: number, b: number): number => {
  const turn = b - a;
  return Math.atan2(Math.sin(turn), Math.cos(turn));
};

/** Beside a corner between two headings, `half` to the left; drawn out so that both edges keep their distance. */
const beside = ({ x, y }: Spot, before: number, after: number, half: number): Spot => {
  const turn = turnBetween(before, after);
  const across = before + turn / 2 - Math.PI / 2;
  const reach = half / Math.cos(turn / 2);
  return { x: x + reach * Math.cos(across), y: y + reach * Math.sin(across) };
};

/** A line without sharp bends as one outline; ends are cut straight. */
const band = (line: readonly Spot[], half: number): Ring => {
  const along = headings(line);
  const edge = (side: number) =>
    line.map((corner, n) => {
      const after = along[n] ?? along[n - 1] ?? 0;
      return beside(corner, along[n - 1] ?? after, after, side * half);
    });
  return clockwise([...edge(1), ...edge(-1).reverse()]);
};

export interface Pen {
  readonly width: number;
  readonly cap: 'butt' | 'round';
}

/** Corners that stand on each other draw nothing. */
const distinct = (line: readonly Spot[]): Spot[] =>
  line.filter((spot, n) => {
    const before = line[n - 1];
    return !before || !same(before, spot);
  });

/** The outlines of a drawn line: bands, and discs where it bends sharply or ends round. */
export const strokeOf = (drawn: readonly Spot[], closed: boolean, { width, cap }: Pen): Ring[] => {
  const half = width / 2;
  const line = distinct(drawn);
  const [first] = line;
  if (!first) return [];
  const last = line.at(-1) ?? first;
  if (closed && line.length > 1 && !same(first, last)) line.push(first);
  if (line.length < 2) return cap === 'round' ? [disc(first, half)] : [];
  const along = headings(line);
  const rings: Ring[] = [];
  let run: Spot[] = [first];
  for (const [n, heading] of along.entries()) {
    const to = line[n + 1] ?? first;
    run.push(to);
    const next = along[n + 1];
    if (next !== undefined && Math.abs(turnBetween(heading, next)) <= SHARP) continue;
    rings.push(band(run, half));
    if (next !== undefined || closed || cap === 'round') rings.push(disc(to, half));
    run = [to];
  }
  if (!closed && cap === 'round') rings.push(disc(first, half));
  return rings;
};

/** A line in dashes, each with both its ends. */
export const dashesOf = (drawn: readonly Spot[], closed: boolean, dash: readonly number[]) => {
  const [on = 0, off = 0] = dash;
  const line = distinct(drawn);
  const [first] = line;
  if (!first || on <= 0 || off <= 0) return [line];
  if (closed) line.push(first);
  const pieces: Spot[][] = [[first]];
  let [left, drawing] = [on, true];
  let at = first;
  for (const to of line.slice(1)) {
    let length = Math.hypot(to.x - at.x, to.y - at.y);
    while (length > left) {
      const share = left / length;
      at = { x: at.x + share * (to.x - at.x), y: at.y + share * (to.y - at.y) };
      length -= left;
      if (drawing) pieces.at(-1)?.push(at);
      else pieces.push([at]);
      drawing = !drawing;
      left = drawing ? on : off;
    }
    left -= length;
    at = to;
    if (drawing) pieces.at(-1)?.push(to);
  }
  return pieces.filter((piece) => piece.length > 1);
};
