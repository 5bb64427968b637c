import { stripFrames, stripUrl } from '#src/api/clip-source.ts';
import { useBenchTools } from '../bench-context.ts';
import type { StripLayout } from './strip-layout.ts';

const TILE_HEIGHT = 120;
const GAP = 10;

interface Tile {
  readonly frame: number;
  readonly index: number;
}

/** As many as fit beside each other, each at its own time. */
const beside = (tiles: readonly Tile[], { x, left, right }: StripLayout, width: number): Tile[] => {
  const shown: Tile[] = [];
  let free = left;
  for (const tile of tiles) {
    const at = x(tile.frame) - width / 2;
    if (at < free || at + width > right) continue;
    free = at + width + GAP;
    shown.push(tile);
  }
  return shown;
};

/** Small pictures every so often, until the hill takes their place. */
export function StripPreviews({ layout }: { layout: StripLayout }) {
  const { clipId, times, frameSize } = useBenchTools();
  const { top, base, x, from, to } = layout;
  const tiles = stripFrames(times.length);
  const height = base - top - 8;
  const width = (height * frameSize.width) / frameSize.height;
  const inside = tiles
    .map((frame, index) => ({ frame, index }))
    .filter(({ frame }) => from <= frame && frame <= to);
  const shown = beside(inside, layout, width);
  const tileWidth = Math.max(
    2,
    Math.round((TILE_HEIGHT * frameSize.width) / frameSize.height / 2) * 2,
  );
  const scale = height / TILE_HEIGHT;
  return (
    <>
      {shown.map(({ frame, index }) => (
        <span
          key={frame}
          aria-hidden="true"
          className="pointer-events-none absolute overflow-hidden bg-rule"
          style={{ left: x(frame) - width / 2, top, width, height }}
        >
          <img
            src={stripUrl(clipId)}
            alt=""
            draggable={false}
            className="block max-w-none"
            style={{
              height,
              width: tileWidth * tiles.length * scale,
              marginLeft: -index * tileWidth * scale,
            }}
          />
        </span>
      ))}
    </>
  );
}
