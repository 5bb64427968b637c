import type { TrackState } from '../types.ts';
import { align } from './align.ts';
import {
  confidenceOf,
  isBack,
  isItself,
  isTorn,
  isUnmistakable,
  spreadOf,
  stateOf,
} from './certainty.ts';
import { coveredShare } from './covered.ts';
import { leastAlikeHalf } from './halves.ts';
import { flow, type Place } from './flow.ts';
import {
  ALONG_AN_EDGE,
  BACK,
  DOUBTFUL,
  EXPECTED,
  FORESEEN,
  FOUND_AGAIN,
  HOME_REACH,
  JERK,
  LEVELS,
  NEAR,
  ON_ITS_WAY,
  REACH,
  RETURNED,
  UNPROVED,
} from './follower-bounds.ts';
import { type Candidate, Likeness } from './likeness.ts';
import type { Plane } from './plane.ts';
import { pyramidAround, type Pyramid } from './pyramid.ts';
import { slidesAt } from './texture.ts';
import { atPlace, movedTo, scaleOf, type Warp } from './warp.ts';

/** Radii of the patches, pixels of the picture looked at. */
export interface FollowSettings {
  /** Of the step from picture to picture, on each level. */
  readonly stepRadius: number;
  /** Of the template that keeps a point from drifting. */
  readonly templateRadius: number;
}

export const SETTINGS: FollowSettings = { stepRadius: 10, templateRadius: 17 };

/** Where the point is on one picture; null where it is lost. */
export interface Seen {
  readonly place: Place | null;
  readonly confidence: number;
  readonly state: TrackState;
}

/** Follows one point away from its keyframe, picture by picture, in either direction of time. */
export class Follower {
  readonly #settings: FollowSettings;
  readonly #home: Place;
  readonly #likeness: Likeness;
  #warp: Warp;
  #velocity: Place = { x: 0, y: 0 };
  /** False until two pictures have told the velocity: a keyframe may lie in the middle of a lift. */
  #velocityKnown = false;
  /** The picture before, and its pyramid about the point once that was needed. */
  #picture: Plane;
  #before: Pyramid | null = null;
  #correlation = 1;
  /** Pictures since the point was last seen; 0 while it is. */
  #lostFor = 0;
  /** Along an edge nothing proves where it is: then no place is called sure. */
  readonly #most: number;
  /** How sure it may be called: less where it was found again, until it has proved itself. */
  #trust = 1;

  constructor(picture: Plane, at: Place, settings: FollowSettings = SETTINGS) {
    this.#settings = settings;
    this.#home = at;
    this.#warp = atPlace(at.x, at.y);
    this.#picture = picture;
    this.#likeness = new Likeness(picture, this.#pyramidBefore(at), at, settings.templateRadius);
    this.#most = slidesAt(picture, at.x, at.y, settings.templateRadius) ? ALONG_AN_EDGE : 1;
  }

  /** The next picture in the direction that is being followed. */
  step(picture: Plane): Seen {
    return this.#lostFor > 0 ? this.#lookFor(picture) : this.#followOn(picture);
  }

  #pyramidBefore(at: Place): Pyramid {
    this.#before ??= pyramidAround(this.#picture, at.x, at.y, REACH, LEVELS);
    return this.#before;
  }

  #followOn(picture: Plane): Seen {
    const from = { x: this.#warp.tx, y: this.#warp.ty };
    const guess = { x: from.x + this.#velocity.x, y: from.y + this.#velocity.y };
    const best = this.#asExpected(picture, guess) ?? this.#findFrom(picture, from, guess);
    if (!best) return this.#lose();
    const fall = this.#correlation - best.correlation;
    const covered = coveredShare(picture, best.template, best);
    const half = leastAlikeHalf(picture, best.template, best);
    const leap = Math.hypot(best.warp.tx - guess.x, best.warp.ty - guess.y);
    const middle = this.#likeness.middleOf(picture, best, this.#warp);
    // what slides over a point takes it along with a jerk that no limb makes
    const jerk = leap > JERK * this.#near() && !isItself(best.correlation, middle.core);
    const astray = best.roundTrip === null || best.roundTrip > RETURNED;
    if (this.#velocityKnown && (jerk || (astray && leap > this.#near()))) this.#trust = FOUND_AGAIN;
    const evidence = {
      correlation: best.correlation,
      fall,
      covered,
      half,
      ...middle,
      roundTrip: this.#velocityKnown && astray && leap < FORESEEN ? null : best.roundTrip,
      spread: spreadOf(best.template, best.correlation),
      scale: scaleOf(best.warp),
    };
    if (isTorn(evidence)) this.#trust = Math.min(this.#trust, UNPROVED);
    const free = Math.min(this.#trust, confidenceOf(evidence) * best.within);
    const confidence = Math.min(this.#most, free);
    const state = stateOf(confidence);
    if (state === 'lost') return this.#lose();
    this.#take(best, picture, from);
    // where a hand has placed it, and as it looked there: no other dot
    const atHome = this.#fromHome(best) < NEAR && isItself(best.correlation, middle.core);
    const proved = this.#trust > FOUND_AGAIN && isBack(evidence);
    if (proved || atHome) this.#trust = Math.min(1, this.#trust + 0.05);
    if (stateOf(free) === 'sure' && fall < 0.03 && covered === 0)
      this.#likeness.refresh(picture, best);
    return { place: { x: best.warp.tx, y: best.warp.ty }, confidence, state };
  }

  /** Most often it is just where its velocity brings it: then nothing else need be tried. */
  #asExpected(picture: Plane, guess: Place): Candidate | null {
    if (!this.#velocityKnown) return null;
    const found = align(
      picture,
      this.#likeness.first,
      movedTo(this.#warp, guess.x, guess.y),
      EXPECTED,
    );
    if (!found) return null;
    const { core } = this.#likeness.middleOf(picture, found, this.#warp);
    return isUnmistakable(found.correlation, core)
      ? { ...found, template: this.#likeness.first, roundTrip: null }
      : null;
  }

  /** Steps on from the picture before; where that is doubtful, looks around. */
  #findFrom(picture: Plane, from: Place, guess: Place): Candidate | null {
    const after = pyramidAround(picture, guess.x, guess.y, REACH, LEVELS);
    let best = this.#stepFrom(after, from, guess);
    if (!best || best.correlation < DOUBTFUL) {
      const still = this.#stepFrom(after, from, from);
      if (still && still.correlation > (best?.correlation ?? 0)) best = still;
    }
    if (!best || best.correlation < DOUBTFUL) {
      const fetched = this.#likeness.fetch(after, guess, this.#velocityKnown ? 6 : 12, this.#warp);
      if (fetched && fetched.correlation > (best?.correlation ?? 0) + 0.05) best = fetched;
    }
    return best;
  }

  /** Steps there, goes back to see whether that leads home, and refines against the templates. */
  #stepFrom(after: Pyramid, from: Place, guess: Place): Candidate | null {
    const { stepRadius } = this.#settings;
    const before = this.#pyramidBefore(from);
    const there = flow(before, after, from, guess, stepRadius);
    if (!there) return null;
    const back = { x: there.x - (guess.x - from.x), y: there.y - (guess.y - from.y) };
    const home = flow(after, before, there, back, stepRadius, 2);
    const roundTrip = home ? Math.hypot(home.x - from.x, home.y - from.y) : Infinity;
    return this.#likeness.refine(after, there, roundTrip, this.#warp);
  }

  /** Along its way, where it was placed, and at last all around where it was seen. */
  #lookFor(picture: Plane): Seen {
    const about = { x: this.#warp.tx, y: this.#warp.ty };
    const found =
      this.#lookOn(picture, about) ??
      this.#lookNear(picture, this.#home, HOME_REACH, atPlace(this.#home.x, this.#home.y)) ??
      this.#lookNear(picture, about, Math.min(18, 8 + this.#lostFor));
    if (!found) return this.#lose();
    const leap = Math.hypot(found.warp.tx - about.x, found.warp.ty - about.y);
    this.#trust = leap > this.#near() ? FOUND_AGAIN : Math.min(this.#trust, UNPROVED);
    this.#take(found, picture, about);
    this.#velocity = { x: 0, y: 0 };
    this.#velocityKnown = false;
    const confidence = this.#trust;
    return {
      place: { x: found.warp.tx, y: found.warp.ty },
      confidence,
      state: stateOf(confidence),
    };
  }

  /** Where its velocity would have brought it by now, for a short while. */
  #lookOn(picture: Plane, { x, y }: Place): Candidate | null {
    if (this.#lostFor > ON_ITS_WAY || !this.#velocityKnown) return null;
    const pictures = this.#lostFor + 1;
    const guess = { x: x + pictures * this.#velocity.x, y: y + pictures * this.#velocity.y };
    const warp = movedTo(this.#warp, guess.x, guess.y);
    const found = align(picture, this.#likeness.first, warp, EXPECTED * pictures);
    return found && found.correlation >= BACK
      ? { ...found, template: this.#likeness.first, roundTrip: null }
      : null;
  }

  #lookNear(picture: Plane, at: Place, reach: number, shape = this.#warp): Candidate | null {
    const around = pyramidAround(picture, at.x, at.y, REACH, LEVELS);
    const found = this.#likeness.fetch(around, at, reach, shape);
    return found && found.correlation >= BACK ? found : null;
  }

  #fromHome({ warp }: Candidate): number {
    return Math.hypot(warp.tx - this.#home.x, warp.ty - this.#home.y);
  }

  /** The faster it went, the less is known of where it is now. */
  #near(): number {
    return NEAR + Math.hypot(this.#velocity.x, this.#velocity.y) / 2;
  }

  #take(best: Candidate, picture: Plane, from: Place): void {
    if (best.template === this.#likeness.first) this.#warp = best.warp;
    else this.#warp = movedTo(this.#warp, best.warp.tx, best.warp.ty);
    this.#likeness.moveTo(best);
    this.#velocity = { x: best.warp.tx - from.x, y: best.warp.ty - from.y };
    this.#velocityKnown = true;
    this.#picture = picture;
    this.#before = null;
    this.#correlation = best.correlation;
    this.#lostFor = 0;
  }

  #lose(): Seen {
    this.#lostFor += 1;
    return { place: null, confidence: 0, state: 'lost' };
  }
}
