import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import type * as z from 'zod';
import {
  type clip,
  type clipGeometry,
  clipState,
  type FrameTable,
  troubleCode,
} from '#shared/contracts/clips.ts';
import { cameraStood, side, view } from '#shared/contracts/primitives.ts';
import { madeAt, moment, ownedRow, real } from '#server/db/columns.ts';
import type { ClipFacts, Part, Timestamp } from '#server/media/types.ts';
import { User } from '../accounts/user.entity.ts';
import { Visit } from '../visits/visit.entity.ts';

export type ClipGeometry = z.infer<typeof clipGeometry>;
type ClipShape = z.infer<typeof clip>;

/** Storage keys; a copy is named only once it lies there whole. */
export type ClipFiles = {
  original: string;
  bench: string | null;
  replay: string | null;
  poster: string | null;
  strip: string | null;
};

/** What preparation made, px and bytes. */
export type ClipCopies = {
  bench: NonNullable<ClipShape['copy']>;
  replay: { width: number; height: number; bytes: number };
  /** Frame index of each thumbnail, left to right, and the size of one. */
  strip: { frames: readonly number[]; width: number; height: number };
};

/** One uploaded video. `state` moves waiting → preparing → ready or refused. */
export const Clip = defineEntity({
  name: 'Clip',
  indexes: [{ properties: ['practiceId', 'uploadedAt'] }],
  properties: {
    ...ownedRow(),
    visit: p.manyToOne(Visit).ref(),
    name: p.text(),
    state: p.enum(clipState.options),
    refusalCode: p.text().nullable(),
    /** The figures of that refusal's sentence. */
    refusalFigures: p.json<Record<string, string | number>>().nullable(),
    view: p.enum(view.options),
    cameraStood: p.enum(cameraStood.options),
    supportSide: p.enum(side.options).nullable(),
    mirrored: p.boolean(),
    bytes: p.bigint('number'),
    files: p.json<ClipFiles>(),
    /** Upright source frame, px. */
    width: p.integer().nullable(),
    height: p.integer().nullable(),
    durationSeconds: real().$type<number>().nullable(),
    frameRate: p.json<NonNullable<ClipShape['frameRate']>>().nullable(),
    frameCount: p.integer().nullable(),
    /** Every frame's exact time: thousands of numbers, so loaded only where asked for. */
    frames: p.json<FrameTable>().nullable().lazy(),
    /** The probe's findings, for later readers. */
    facts: p.json<ClipFacts>().nullable().lazy(),
    copies: p.json<ClipCopies>().nullable(),
    /** The original's own instant of frame 0. */
    origin: p.json<Timestamp>().nullable(),
    /** The part that was asked for, seconds; null for the whole clip. */
    part: p.json<Part>().nullable(),
    /** A person agreed to use what is left of a cut or damaged file. */
    acceptRemains: p.boolean().default(false),
    geometry: p.json<ClipGeometry>(),
    /** Preparations begun since a person last asked for one. */
    tries: p.integer().default(0),
    /** Why the last one did not come to its end, for the machine's sake; null where nothing is wrong. */
    trouble: p.enum(troubleCode.options).nullable(),
    /** When it is tried again by itself; null with a trouble: not before a person asks. */
    nextTryAt: moment().nullable(),
    /** 0–100 while preparing. */
    progress: real().$type<number>().nullable(),
    secondsLeft: real().$type<number>().nullable(),
    /** How long the preparation took that made it ready; null before, and for clips made ready before this was noted. */
    preparedSeconds: real().$type<number>().nullable(),
    uploadedBy: p.manyToOne(User).ref(),
    uploadedAt: madeAt(),
    version: p.integer().version(),
  },
});
export type Clip = InferEntity<typeof Clip>;
