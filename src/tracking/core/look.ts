import type { FramePoint } from '#shared/geometry/points.ts';
import type { Touch } from '../types.ts';
import { dotAt } from './dot.ts';
import { SETTINGS } from './follower.ts';
import type { Plane } from './plane.ts';
import { type Size, toPicture, toSource } from './scale.ts';
import { refusalAt } from './texture.ts';

/** What is known of a place before it is followed. */
export const lookAtPlace = (picture: Plane, point: FramePoint, source: Size): Touch => {
  const touch = toPicture(point, source, picture);
  const refusal = refusalAt(picture, touch.x, touch.y, SETTINGS.templateRadius);
  const dot = refusal === 'outside' ? null : dotAt(picture, touch);
  return {
    refusal,
    dot: dot && {
      centre: toSource(dot.centre, source, picture),
      radius: (dot.radius * source.width) / picture.width,
      tone: dot.tone,
    },
  };
};
