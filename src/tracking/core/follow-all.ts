import { type FrameIndex, frameIndex } from '#shared/timing/units.ts';
import type {
  Followed,
  FollowRequest,
  FollowResult,
  PointToFollow,
  RefusalCode,
} from '../types.ts';
import { blend } from './blend.ts';
import { Follower, type FollowSettings, type Seen, SETTINGS } from './follower.ts';
import { neighbours, type Way, wayBack, wayForward } from './plan.ts';
import type { Plane } from './plane.ts';
import { type Size, toPicture, toSource } from './scale.ts';
import { refusalAt } from './texture.ts';

/** Where the pictures come from, and who hears how it goes. */
export interface Surroundings {
  readonly source: Size;
  /** `next` will be wanted after this one: it may be made ready meanwhile. */
  picture(frame: FrameIndex, next: FrameIndex | null): Promise<Plane>;
  /** Between pictures: waits where it should give way, throws where it should end. */
  breathe(done: number, total: number): Promise<void>;
  places(id: string, places: readonly Followed[]): void;
}

type Refused = FollowResult['refused'][number];

/** One point while it is followed. */
interface Course {
  readonly point: PointToFollow;
  readonly keys: readonly FrameIndex[];
  readonly forward: Map<number, Seen>;
  readonly places: Map<number, Followed>;
  follower: Follower | null;
}

const NOT_FOLLOWED: Seen = { place: null, confidence: 0, state: 'lost' };

/** Follows all points of a request, forwards and then backwards, and joins both ways. */
export const followAll = async (
  request: FollowRequest,
  around: Surroundings,
  settings: FollowSettings = SETTINGS,
): Promise<FollowResult> => {
  const { from, to } = request;
  const refused = new Map<string, Refused>();
  const courses: Course[] = request.points.map((point) => ({
    point,
    keys: point.keyframes.map(({ frame }) => frame),
    forward: new Map(),
    places: new Map(),
    follower: null,
  }));

  const note = (course: Course, frame: FrameIndex, seen: Seen, picture: Size): void => {
    if (frame < from || frame > to) return;
    const { place, confidence, state } = seen;
    const point = place && toSource(place, around.source, picture);
    const followed = { frame, point, confidence, state };
    course.places.set(frame, followed);
    around.places(course.point.id, [followed]);
  };

  /** A keyframe holds from here on, in the direction that is being followed. */
  const beginAt = (course: Course, frame: FrameIndex, picture: Plane): boolean => {
    const key = course.point.keyframes.find((one) => one.frame === frame);
    if (!key) return false;
    const { x, y } = toPicture(key.point, around.source, picture);
    const code: RefusalCode | null = refusalAt(picture, x, y, settings.templateRadius);
    course.follower = code ? null : new Follower(picture, { x, y }, settings);
    const { id } = course.point;
    if (code) refused.set(`${id} ${frame}`, { id, frame, code });
    if (frame < from || frame > to || course.places.has(frame)) return true;
    const followed: Followed = { frame, point: key.point, confidence: 1, state: 'sure' };
    course.places.set(frame, followed);
    around.places(id, [followed]);
    return true;
  };

  const goForward = (course: Course, frame: FrameIndex, picture: Plane): void => {
    if (beginAt(course, frame, picture)) return;
    const seen = course.follower?.step(picture);
    if (!seen) return;
    course.forward.set(frame, seen);
    if (neighbours(course.keys, frame).after === null) note(course, frame, seen, picture);
  };

  const goBack = (course: Course, frame: FrameIndex, picture: Plane): void => {
    if (beginAt(course, frame, picture)) return;
    const { before, after } = neighbours(course.keys, frame);
    if (after === null) return;
    const back = course.follower?.step(picture) ?? NOT_FOLLOWED;
    if (before === null) {
      if (course.follower) note(course, frame, back, picture);
      return;
    }
    const there = course.forward.get(frame) ?? NOT_FOLLOWED;
    note(course, frame, blend(there, back, (frame - before) / (after - before)), picture);
  };

  const forwards = wayForward(request);
  const backwards = wayBack(request);
  const length = (way: Way | null): number => (way ? Math.abs(way.last - way.first) + 1 : 0);
  const total = length(forwards) + length(backwards);
  let done = 0;
  const walk = async (way: Way | null, go: typeof goForward): Promise<void> => {
    if (!way) return;
    const step = way.last >= way.first ? 1 : -1;
    for (const course of courses) course.follower = null;
    for (let frame = way.first as number; frame !== way.last + step; frame += step) {
      await around.breathe(done, total);
      const next = frame === way.last ? null : frameIndex(frame + step);
      const picture = await around.picture(frameIndex(frame), next);
      for (const course of courses) go(course, frameIndex(frame), picture);
      done += 1;
    }
  };
  await walk(forwards, goForward);
  await walk(backwards, goBack);
  await around.breathe(total, total);

  const placesOf = (course: Course): Followed[] =>
    Array.from({ length: to - from + 1 }, (_, k) => {
      const frame = frameIndex(from + k);
      const lost: Followed = { frame, point: null, confidence: 0, state: 'lost' };
      return course.places.get(frame) ?? lost;
    });
  return {
    tracks: courses.map((course) => ({ id: course.point.id, places: placesOf(course) })),
    refused: [...refused.values()],
  };
};
