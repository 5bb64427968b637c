import * as z from 'zod';
import {
  cameraStood,
  day,
  framePoint,
  id,
  millimetres,
  moment,
  personRef,
  side,
  version,
  view,
} from './primitives.ts';

export const clipState = z
  .enum(['waiting', 'preparing', 'ready', 'refused'])
  .meta({ id: 'ClipState', description: 'waiting and preparing turn into ready or refused.' });
export type ClipState = z.infer<typeof clipState>;

/** Exact times of the prepared frames: frame n is shown at ticks[n] × num/den seconds. */
export const frameTable = z
  .object({
    count: z.int(),
    timeBase: z.object({ num: z.int(), den: z.int() }),
    ticks: z.array(z.int()),
  })
  .meta({ id: 'FrameTable' });
export type FrameTable = z.infer<typeof frameTable>;

/**
 * How millimetres per pixel are known: two points on a thing of known length that stands where the athlete
 * stands (a rod, or crown and floor for body height), or typed in.
 */
export const scale = z
  .discriminatedUnion('from', [
    z.object({
      from: z.literal('rod'),
      a: framePoint,
      b: framePoint,
      lengthMm: millimetres(100, 4000),
    }),
    z.object({
      from: z.literal('body-height'),
      a: framePoint,
      b: framePoint,
      lengthMm: millimetres(700, 2400),
    }),
    z.object({ from: z.literal('typed'), mmPerPx: z.number().min(0.05).max(20) }),
  ])
  .meta({ id: 'Scale' });
export type Scale = z.infer<typeof scale>;

/**
 * How long the shutter stood open: as the camera tells it, one part of a second, or by the two ends of what
 * it drew out of one dot on the fastest frame.
 */
export const shutter = z
  .discriminatedUnion('from', [
    z.object({ from: z.literal('typed'), perSecond: z.number().min(8).max(20_000) }),
    z.object({ from: z.literal('smear'), a: framePoint, b: framePoint }),
  ])
  .meta({ id: 'Shutter' });
export type Shutter = z.infer<typeof shutter>;

/** What the measurement needs to know of the camera. Null is unknown, and what needs it is not measured. */
export const clipGeometry = z
  .object({
    scale: scale.nullable(),
    distanceMm: millimetres(500, 20_000).nullable(),
    lensHeightMm: millimetres(0, 3000).nullable(),
    /** From the line between both ASIS to the tip. */
    beltPointerMm: millimetres(30, 600).nullable(),
    /** From the skin to the tip; the engine adds the way to the femur's axis. */
    thighPointerMm: millimetres(30, 600).nullable(),
    /** Two points of a plumb line, top and bottom; null takes the picture as upright. */
    plumb: z.object({ top: framePoint, bottom: framePoint }).nullable(),
    /** Both heels, or the two ends of the floor line they stand on; null where nobody drew it. */
    floorLine: z.object({ a: framePoint, b: framePoint }).nullable(),
    shutter: shutter.nullable(),
  })
  .meta({ id: 'ClipGeometry' });
export type ClipGeometry = z.infer<typeof clipGeometry>;

export const refusal = z
  .object({ code: z.string(), sentence: z.string(), usablePartSeconds: z.number().nullable() })
  .meta({ id: 'Refusal', description: 'Why a clip was refused, and what to do.' });

export const troubleCode = z
  .enum(['no-space', 'tool-missing', 'interrupted', 'machine'])
  .meta({ id: 'TroubleCode' });
export type TroubleCode = z.infer<typeof troubleCode>;

export const trouble = z
  .object({
    code: troubleCode,
    /** What happened; the clip itself is kept. */
    sentence: z.string(),
    /** When it is tried again by itself; null: not before a person asks for it. */
    nextTryAt: moment.nullable(),
  })
  .meta({
    id: 'PreparationTrouble',
    description:
      'Why a waiting clip could not be prepared, for the machine’s sake and not its own.',
  });

export const clip = z
  .object({
    id,
    visitId: id,
    name: z.string(),
    state: clipState,
    /** 0–100 while preparing; null where it is not known. */
    progress: z.number().nullable(),
    secondsLeft: z.number().nullable(),
    /** How long the machine worked until it was ready; null before, and where nobody took the time. */
    preparedSeconds: z.number().nullable(),
    refusal: refusal.nullable(),
    /** Only while waiting. */
    trouble: trouble.nullable(),
    view,
    cameraStood,
    /** The clip's default; every rep has its own. */
    supportSide: side.nullable(),
    mirrored: z.boolean(),
    bytes: z.int(),
    /** Of the upright source frame, px; null until probed. */
    width: z.int().nullable(),
    height: z.int().nullable(),
    durationSeconds: z.number().nullable(),
    frameRate: z
      .object({
        /** Median over the clip; the exact times stand in the frame table. */
        perSecond: z.number(),
        variable: z.boolean(),
        minPerSecond: z.number(),
        maxPerSecond: z.number(),
      })
      .nullable(),
    /** Of the prepared copy that the Bench plays, px. */
    copy: z
      .object({ width: z.int(), height: z.int(), allIntra: z.boolean(), bytes: z.int() })
      .nullable(),
    geometry: clipGeometry,
    /** Derived from `geometry.scale`; null where the scale is unknown. */
    mmPerPx: z.number().nullable(),
    repCount: z.int(),
    uploadedBy: personRef,
    uploadedAt: moment,
    version,
  })
  .meta({ id: 'Clip' });
export type Clip = z.infer<typeof clip>;

export const clipWithFrames = clip
  .extend({ frames: frameTable.nullable() })
  .meta({ id: 'ClipWithFrames' });
export type ClipWithFrames = z.infer<typeof clipWithFrames>;

/** The fields that travel beside the file of a form upload; form fields are text. */
export const clipUploadFields = z
  .object({
    view,
    supportSide: side.optional(),
    mirrored: z
      .enum(['true', 'false'])
      .default('false')
      .transform((value) => value === 'true'),
  })
  .refine((value) => value.view === 'front' || value.view === 'back' || value.supportSide, {
    path: ['supportSide'],
    message: 'A side view needs to know which leg the athlete stands on.',
  })
  .meta({ id: 'ClipUpload' });

/** What opens a resumable upload; the bytes then follow by the tus protocol at `uploadUrl`. */
export const uploadBody = z
  .object({
    name: z.string().trim().min(1).max(255),
    bytes: z.int().min(1, 'The file is empty. Film it again, or choose another file.'),
    view,
    supportSide: side.nullable().default(null),
    mirrored: z.boolean().default(false),
  })
  .refine((value) => value.view === 'front' || value.view === 'back' || value.supportSide, {
    path: ['supportSide'],
    message: 'A side view needs to know which leg the athlete stands on.',
  })
  .meta({ id: 'UploadBody' });

export const upload = z
  .object({ id, uploadUrl: z.string(), bytes: z.int(), received: z.int() })
  .meta({ id: 'Upload' });

export const clipEdit = z
  .object({
    view,
    supportSide: side.nullable(),
    mirrored: z.boolean(),
    geometry: clipGeometry,
    version,
  })
  .partial()
  .required({ version: true })
  .meta({ id: 'ClipEdit' });

/** One line of the practice's list of clips. */
export const clipRow = z
  .object({
    id,
    visitId: id,
    athlete: personRef,
    visitDay: day,
    name: z.string(),
    state: clipState,
    view,
    supportSide: side.nullable(),
    durationSeconds: z.number().nullable(),
    repCount: z.int(),
    markedFrames: z.int(),
    uploadedAt: moment,
  })
  .meta({ id: 'ClipRow' });
export type ClipRow = z.infer<typeof clipRow>;
