import type { Clip as ClipShape, ClipWithFrames } from '#shared/contracts/clips.ts';
import { mmPerPxOf } from '#shared/records/scale.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import type { Clip } from './clip.entity.ts';
import { presentRefusal } from './refusal.ts';
import { presentTrouble } from './trouble.ts';

/** @param clip with `uploadedBy` loaded */
export const presentClip = (clip: Clip, repCount: number): ClipShape => ({
  id: clip.id,
  visitId: clip.visit.id,
  name: clip.name,
  state: clip.state,
  progress: clip.progress ?? null,
  secondsLeft: clip.secondsLeft ?? null,
  preparedSeconds: clip.preparedSeconds ?? null,
  refusal: presentRefusal(clip.refusalCode ?? null, clip.refusalFigures ?? null),
  trouble: presentTrouble(clip),
  view: clip.view,
  cameraStood: clip.cameraStood,
  supportSide: clip.supportSide ?? null,
  mirrored: clip.mirrored,
  bytes: clip.bytes,
  width: clip.width ?? null,
  height: clip.height ?? null,
  durationSeconds: clip.durationSeconds ?? null,
  frameRate: clip.frameRate ?? null,
  copy: clip.copies?.bench ?? null,
  geometry: clip.geometry,
  mmPerPx: mmPerPxOf(clip.geometry.scale),
  repCount,
  uploadedBy: presentPerson(clip.uploadedBy.unwrap()),
  uploadedAt: clip.uploadedAt.toISOString(),
  version: clip.version,
});

/** @param clip with `uploadedBy` and the lazy `frames` loaded */
export const presentClipWithFrames = (clip: Clip, repCount: number): ClipWithFrames => ({
  ...presentClip(clip, repCount),
  frames: clip.frames.unwrap() ?? null,
});
