import { randomUUID } from 'node:crypto';
import { type APIRequestContext } from '@playwright/test';
import { routes } from '#shared/contracts/routes.ts';
import type { RepInput } from '#shared/course/types.ts';
import { madeFront, type MadeMotion } from '#shared/evaluate/made-pair.ts';
import { ask } from '../journeys/steps/ask.ts';
import { addRep, FRAMES, PICTURE } from './made.ts';

/** Time between two frames of the clip that is made here, ms. */
export const STEP = 1000 / 30;

/** A quick lift that fits into the clip, standing on the right; the leg turns out from 60° on. */
export const MOTION: MadeMotion = {
  side: 'right',
  stillMs: 300,
  upMs: 500,
  holdMs: 100,
  highest: 106,
  turnAt: (lift) => Math.max(0, lift - 60) / 3,
};

/** Adds a rep and marks it as the made body says, whose picture is narrower than the clip's; answers the rep's id. */
export const markAs = async (
  coach: APIRequestContext,
  clipId: string,
  made: RepInput,
): Promise<string> => {
  const { id } = await addRep(coach, clipId);
  const commands = made.frames
    .filter(({ frame }) => frame < FRAMES)
    .flatMap(({ frame, marks }) =>
      Object.entries(marks).flatMap(([landmark, mark]) =>
        mark.hidden
          ? []
          : [
              {
                id: randomUUID(),
                frame,
                landmark,
                baseRevision: 0,
                set: {
                  to: 'point' as const,
                  u: mark.point.u + (PICTURE.width - made.camera.width) / 2,
                  v: mark.point.v,
                  source: 'hand' as const,
                  looked: true,
                  confidence: null,
                  pictureLongEdge: PICTURE.height,
                },
              },
            ],
      ),
    );
  for (let from = 0; from < commands.length; from += 200)
    await ask(coach, routes.saveMarks, {
      params: { id },
      body: { commands: commands.slice(from, from + 200) },
    });
  return id;
};

/** Writes down how the made body was filmed, and its pointers. */
export const giveGeometry = async (coach: APIRequestContext, clipId: string): Promise<void> => {
  const { version, geometry } = await ask(coach, routes.clip, { params: { id: clipId } });
  const { mmPerPx, distanceMm, lensHeightMm, beltPointerMm } = madeFront(MOTION, {
    startMs: 0,
    stepMs: STEP,
    scatterPx: 0,
    seed: 1,
  }).camera;
  await ask(coach, routes.editClip, {
    params: { id: clipId },
    body: {
      version,
      geometry: {
        ...geometry,
        scale: { from: 'typed', mmPerPx: mmPerPx ?? NaN },
        distanceMm,
        lensHeightMm,
        beltPointerMm,
        thighPointerMm: 115,
      },
    },
  });
};
