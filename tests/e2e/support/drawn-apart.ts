/** A picture of red, green and blue, or with how much of it is drawn besides. */
export interface Pixels {
  readonly width: number;
  readonly height: number;
  readonly channels: 3 | 4;
  readonly data: Uint8Array;
}

/** Between the pixels by the nearest four; 0 beyond the edge. */
const at = ({ width, height, channels, data }: Pixels, x: number, y: number, channel: number) => {
  const [left, top] = [Math.floor(x - 0.5), Math.floor(y - 0.5)];
  const [across, down] = [x - 0.5 - left, y - 0.5 - top];
  const pixel = (column: number, row: number) =>
    column < 0 || row < 0 || column >= width || row >= height
      ? 0
      : (data[(row * width + column) * channels + channel] ?? 0);
  const upper = (1 - across) * pixel(left, top) + across * pixel(left + 1, top);
  const lower = (1 - across) * pixel(left, top + 1) + across * pixel(left + 1, top + 1);
  return (1 - down) * upper + down * lower;
};

/** Brightness of a colour, ITU-R BT.709. */
const bright = (of: (channel: number) => number) =>
  0.2126 * of(0) + 0.7152 * of(1) + 0.0722 * of(2);

/** How far drawings are looked for, and in which steps, px of the film. */
const FARTHEST = 2;
const STEP = 0.5;
/** Half the side of the square that is compared, px of the film. */
const REACH = 16;

/**
 * By how much a page's drawing has to be moved so that, laid over the plain frame, it is most like the film, about one
 * place; px of the film.
 * @param toDrawing from a place of the film to that of the drawing
 */
export const drawnApart = (
  film: Pixels,
  plain: Pixels,
  drawing: Pixels,
  toDrawing: (x: number, y: number) => readonly [number, number],
  place: { readonly x: number; readonly y: number },
): { readonly apart: number; readonly likeness: number } => {
  const difference = (dx: number, dy: number): number => {
    let sum = 0;
    for (let v = Math.round(place.y) - REACH; v <= place.y + REACH; v += 1)
      for (let u = Math.round(place.x) - REACH; u <= place.x + REACH; u += 1) {
        const [x, y] = toDrawing(u + 0.5 - dx, v + 0.5 - dy);
        const share = at(drawing, x, y, 3) / 255;
        // premultiplied, as between two pixels one of which is empty
        const laid = bright((channel) => at(drawing, x, y, channel));
        const under = bright((channel) => at(plain, u + 0.5, v + 0.5, channel));
        const seen = bright((channel) => at(film, u + 0.5, v + 0.5, channel));
        sum += (laid + (1 - share) * under - seen) ** 2;
      }
    return sum;
  };
  const bare = (() => {
    let sum = 0;
    for (let v = Math.round(place.y) - REACH; v <= place.y + REACH; v += 1)
      for (let u = Math.round(place.x) - REACH; u <= place.x + REACH; u += 1)
        sum +=
          (bright((channel) => at(plain, u + 0.5, v + 0.5, channel)) -
            bright((channel) => at(film, u + 0.5, v + 0.5, channel))) **
          2;
    return sum;
  })();
  let best = { apart: Infinity, sum: Infinity };
  for (let dx = -FARTHEST; dx <= FARTHEST; dx += STEP)
    for (let dy = -FARTHEST; dy <= FARTHEST; dy += STEP) {
      const sum = difference(dx, dy);
      if (sum < best.sum) best = { apart: Math.hypot(dx, dy), sum };
    }
  // of what the film has beside the plain frame, the share that the drawing explains
  return { apart: best.apart, likeness: 1 - best.sum / bare };
};
