import { randomUUID } from 'node:crypto';
import type { EntityManager, RequiredEntityData } from '@mikro-orm/postgresql';
import type { User } from '../accounts/user.entity.ts';
import type { Visit } from '../visits/visit.entity.ts';
import { Clip, type ClipGeometry } from './clip.entity.ts';

export const GEOMETRY_FROM_ROD: ClipGeometry = {
  scale: { from: 'rod', a: { u: 100, v: 400 }, b: { u: 100, v: 1400 }, lengthMm: 1000 },
  distanceMm: 3000,
  lensHeightMm: 950,
  beltPointerMm: 150,
  thighPointerMm: 120,
  plumb: null,
  floorLine: null,
  shutter: null,
};

/** A prepared front clip of ten seconds at 60 frames per second, upright 1080 × 1920; its files do not exist. */
export const makeClip = (
  em: EntityManager,
  given: { visit: Visit; uploadedBy: User } & Partial<RequiredEntityData<Clip>>,
): Clip => {
  const id = given.id ?? randomUUID();
  const frameCount = 600;
  return em.create(Clip, {
    id,
    name: 'knee-lift.mp4',
    state: 'ready',
    view: 'front',
    cameraStood: 'front',
    supportSide: 'right',
    mirrored: false,
    bytes: 12_345_678,
    files: {
      original: `test/clips/${id}/original`,
      bench: `test/clips/${id}/bench.mp4`,
      replay: `test/clips/${id}/replay.mp4`,
      poster: `test/clips/${id}/poster.jpg`,
      strip: `test/clips/${id}/strip.jpg`,
    },
    width: 1080,
    height: 1920,
    durationSeconds: 10,
    frameRate: { perSecond: 60, variable: false, minPerSecond: 60, maxPerSecond: 60 },
    frameCount,
    frames: {
      count: frameCount,
      timeBase: { num: 1, den: 60 },
      ticks: Array.from({ length: frameCount }, (_, index) => index),
    },
    facts: null,
    copies: {
      bench: { width: 1080, height: 1920, allIntra: true, bytes: 9_000_000 },
      replay: { width: 540, height: 960, bytes: 1_000_000 },
      strip: { frames: [0, 300], width: 90, height: 160 },
    },
    geometry: GEOMETRY_FROM_ROD,
    ...given,
  });
};
