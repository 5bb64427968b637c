import { align, type Aligned, compare } from './align.ts';
import type { Place } from './flow.ts';
import { DISTINCT, REFINE_REACH, SEARCH_LEVEL, SEARCH_RADIUS } from './follower-bounds.ts';
import type { Plane } from './plane.ts';
import { type Pyramid, toLevelX, toLevelY } from './pyramid.ts';
import { search } from './search.ts';
import { makeTemplate, type Template } from './template.ts';
import { atPlace, movedTo, type Warp } from './warp.ts';

/** A place that may be the point's, by the template that it is most like. */
export interface Candidate extends Aligned {
  readonly template: Template;
  /** How far the way there and back ends from where it began, pixels; null where there was no such way. */
  readonly roundTrip: number | null;
}

/** How a point looks, and where else on a picture something looks so. */
export class Likeness {
  readonly #radius: number;
  /** Of the keyframe: never replaced. */
  readonly first: Template;
  readonly #searched: Template;
  /** Its middle alone: what slides over the point's surroundings covers this at last. */
  readonly #core: Template;
  /** The newest: as the point looks now, where that has slowly changed. */
  #newest: Template;
  #newestWarp: Warp;

  /** @param radius of the template, pixels of the picture looked at */
  constructor(picture: Plane, around: Pyramid, at: Place, radius: number) {
    const level = around[SEARCH_LEVEL];
    if (!level) throw new RangeError('The pyramid is too low to search on.');
    const warp = atPlace(at.x, at.y);
    const coarse = atPlace(toLevelX(level, at.x), toLevelY(level, at.y));
    this.#radius = radius;
    this.first = makeTemplate(picture, warp, radius, 'similar');
    this.#core = makeTemplate(picture, warp, Math.ceil(radius / 2), 'move');
    this.#searched = makeTemplate(level.plane, coarse, SEARCH_RADIUS, 'move');
    this.#newest = this.first;
    this.#newestWarp = warp;
  }

  /** What the middle alone says: is it there, and would it rather be elsewhere? */
  middleOf(
    picture: Plane,
    { warp: { tx, ty } }: Aligned,
    shape: Warp,
  ): { core: number; apart: number } {
    const here = compare(picture, this.#core, movedTo(shape, tx, ty));
    const own = align(picture, this.#core, here.warp, REFINE_REACH, 6);
    const better = own && own.correlation > here.correlation + 0.03;
    return {
      core: here.correlation,
      apart: better ? Math.hypot(own.warp.tx - tx, own.warp.ty - ty) : 0,
    };
  }

  /** Refined against the templates about a place; `roundTrip` as it was found there. */
  refine(after: Pyramid, at: Place, roundTrip: number | null, shape: Warp): Candidate | null {
    const plane = after[0]?.plane;
    if (!plane) return null;
    const first = align(plane, this.first, movedTo(shape, at.x, at.y), REFINE_REACH);
    const byFirst = first && { ...first, template: this.first, roundTrip };
    if (this.#newest === this.first) return byFirst;
    const newest = align(plane, this.#newest, movedTo(this.#newestWarp, at.x, at.y), REFINE_REACH);
    if (!newest) return byFirst;
    // what was never refreshed does not drift: it wins unless it fits clearly worse
    if (byFirst && byFirst.correlation > newest.correlation - 0.06) return byFirst;
    return { ...newest, template: this.#newest, roundTrip };
  }

  /** A wide look on a coarse level for what the keyframe showed, then refined. */
  fetch(after: Pyramid, about: Place, reach: number, shape: Warp): Candidate | null {
    const level = after[SEARCH_LEVEL];
    if (!level) return null;
    const start = movedTo(shape, toLevelX(level, about.x), toLevelY(level, about.y));
    const found = search(level.plane, this.#searched, start, reach);
    if (!found || found.second > found.correlation - DISTINCT) return null;
    const at = {
      x: level.x0 + found.warp.tx * level.scale,
      y: level.y0 + found.warp.ty * level.scale,
    };
    return this.refine(after, at, null, shape);
  }

  /** The newest look goes along to where the point was found. */
  moveTo({ template, warp }: Candidate): void {
    this.#newestWarp =
      template === this.#newest ? warp : movedTo(this.#newestWarp, warp.tx, warp.ty);
  }

  /** Keeps how the point looks now, where that has slowly changed. */
  refresh(picture: Plane, best: Candidate): void {
    if (best.correlation > 0.82 || best.correlation < 0.7) return;
    const plain = atPlace(best.warp.tx, best.warp.ty);
    this.#newest = makeTemplate(picture, plain, this.#radius, 'similar');
    this.#newestWarp = plain;
  }
}
