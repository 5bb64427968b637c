import { execFile } from 'node:child_process';
import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { promisify } from 'node:util';
import { type APIRequestContext, request as requests } from '@playwright/test';
import { routes } from '#shared/contracts/routes.ts';
import type { View } from '#shared/contracts/primitives.ts';
import type { MarkCommand, Rep } from '#shared/contracts/reps.ts';
import { SAFETY_QUESTIONS } from '#shared/contracts/visits.ts';
import type { Side } from '#shared/landmarks/types.ts';
import type { App } from '../support/app.ts';
import { ask } from '../journeys/steps/ask.ts';

export const COACH = 'coach@greywater-row.example';
export const OWNER = 'owner@greywater-row.example';

/** Upright source frame of the clip that is made here: more pixels than its prepared copy has. */
export const PICTURE = { width: 1440, height: 2560 };
export const FRAMES = 40;

/** A session of its own for somebody of the demo. */
export const sessionOf = async (app: App, email: string): Promise<APIRequestContext> => {
  const context = await requests.newContext({ baseURL: app.url });
  await ask(context, routes.signIn, { body: { email, password: app.demoPassword } });
  return context;
};

const render = async (): Promise<Buffer> => {
  const folder = await mkdtemp(join(tmpdir(), 'bench-clip-'));
  const file = join(folder, 'clip.mp4');
  try {
    await promisify(execFile)('ffmpeg', [
      ...['-nostdin', '-y', '-v', 'error', '-f', 'lavfi', '-i'],
      `testsrc2=s=${PICTURE.width}x${PICTURE.height}:r=30,trim=end_frame=${FRAMES}`,
      ...['-c:v', 'libx264', '-preset', 'ultrafast', '-pix_fmt', 'yuv420p', file],
    ]);
    return await readFile(file);
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
};

let rendered: Promise<Buffer> | null = null;
/** The film of every clip that is made here. */
const picture = (): Promise<Buffer> => (rendered ??= render());

export interface MadeClip {
  readonly clipId: string;
  readonly visitId: string;
}

/** A clip to send: a film of its own, and the leg stood on in it. */
export interface Footage {
  readonly film: Buffer;
  readonly supportSide: Side;
}

/** A visit of an athlete with consent, its safety check answered with no throughout; today unless told. */
export const safeVisit = async (coach: APIRequestContext, athleteId: string, day?: string) => {
  const visit = await ask(coach, routes.addVisit, {
    params: { id: athleteId },
    body: day === undefined ? {} : { day },
  });
  const answers = Object.fromEntries(SAFETY_QUESTIONS.map((question) => [question, false]));
  return ask(coach, routes.answerSafety, {
    params: { id: visit.id },
    body: {
      answers: answers as Record<(typeof SAFETY_QUESTIONS)[number], boolean>,
      supportWithinReach: true,
      knowsWhenToStop: true,
    },
  });
};

/** An athlete with consent, a visit with its safety check, and one clip that is ready. */
export const makeClip = async (
  coach: APIRequestContext,
  name: string,
  footage?: Footage,
): Promise<MadeClip> => {
  // before any request: the server closes a connection that idles meanwhile
  if (!footage) await picture();
  const athlete = await ask(coach, routes.addAthlete, {
    body: { givenName: 'Bo', familyName: name, birthDate: '1998-05-04' },
  });
  const params = { id: athlete.id };
  const validUntil = `${new Date().getFullYear() + 1}-01-31`;
  await ask(coach, routes.recordConsent, {
    params,
    body: { givenBy: 'athlete', purposes: ['assessment', 'supervision'], validUntil },
  });
  const visit = await safeVisit(coach, athlete.id);
  return {
    visitId: visit.id,
    clipId: await sendClip(coach, visit.id, 'clip.mp4', 'front', footage),
  };
};

/** A further clip of a visit, standing on the right leg unless told; answers its id once it is ready. */
export const sendClip = async (
  coach: APIRequestContext,
  visitId: string,
  name: string,
  view: View,
  footage?: Footage,
): Promise<string> => {
  const { film, supportSide } = footage ?? { film: await picture(), supportSide: 'right' };
  const sent = await coach.post(`/api/visits/${visitId}/clips`, {
    multipart: {
      view,
      supportSide,
      clip: { name, mimeType: 'video/mp4', buffer: film },
    },
  });
  if (!sent.ok()) throw new Error(`the clip was not taken: ${await sent.text()}`);
  const { id } = routes.uploadClip.answer.schema.parse(await sent.json());
  for (;;) {
    const clip = await ask(coach, routes.clip, { params: { id } });
    if (clip.state === 'ready') return id;
    if (clip.state === 'refused') throw new Error(clip.refusal?.sentence);
    await pause(500);
  }
};

export const addRep = (coach: APIRequestContext, clipId: string): Promise<Rep> =>
  ask(coach, routes.addRep, {
    params: { id: clipId },
    body: { supportSide: 'right', startFrame: 0, endFrame: FRAMES - 1 },
  });

/** One mark of a rep as it is stored. */
export const storedMark = async (
  who: APIRequestContext,
  repId: string,
  frame: number,
  landmark: string,
) => {
  const { items } = await ask(who, routes.listMarks, { params: { id: repId } });
  return items.find((mark) => mark.frame === frame && mark.landmark === landmark) ?? null;
};

/** Places a mark without a page, as another person's page would. */
export const placeMark = async (
  who: APIRequestContext,
  repId: string,
  mark: { frame: number; landmark: string; u: number; v: number; baseRevision: number },
) => {
  const { u, v, ...rest } = mark;
  const command: MarkCommand = {
    ...rest,
    id: crypto.randomUUID(),
    set: {
      to: 'point',
      u,
      v,
      source: 'hand',
      looked: true,
      confidence: null,
      pictureLongEdge: 1920,
    },
  };
  const { outcomes } = await ask(who, routes.saveMarks, {
    params: { id: repId },
    body: { commands: [command] },
  });
  return outcomes[0]?.outcome;
};
