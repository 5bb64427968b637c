import { randomUUID } from 'node:crypto';
import type { MarkCommand } from '#shared/contracts/reps.ts';
import type { SecondMarkingDocument } from '#shared/contracts/second-markings.ts';
import type { Api } from './api.ts';
import { goldenClip } from './golden.ts';
import { markedTrial } from './marked-trial.ts';

export type Agent = Awaited<ReturnType<Api['as']>>;
export type Points = ReturnType<typeof pointsOf>;

/** A clip of three reps, marked by the coach of the athlete, and the first of its reps. */
export const trialToMarkAgain = async (api: Api, coach: Agent) => {
  const golden = goldenClip('g02_early_mid_3rep');
  const made = await markedTrial(api, coach, golden);
  const { body } = await coach.get(`/api/clips/${made.clip.id}/reps`).expect(200);
  const reps: { id: string }[] = body.items;
  return { ...made, golden, reps, repId: reps[0]?.id ?? '' };
};

/** Asks for a second marking; answers its id. */
export const askAgain = async (agent: Agent, repId: string, body: object = {}): Promise<string> => {
  const answer = await agent.post(`/api/reps/${repId}/second-markings`).send(body).expect(201);
  return answer.body.id;
};

export const openAgain = async (agent: Agent, id: string): Promise<SecondMarkingDocument> =>
  (await agent.get(`/api/second-markings/${id}`).expect(200)).body;

/** The points of some commands, by `frame landmark`. */
export const pointsOf = (commands: readonly MarkCommand[] = []) =>
  new Map(
    commands.flatMap(({ frame, landmark, set }) =>
      set.to === 'point' ? [[`${frame} ${landmark}`, set] as const] : [],
    ),
  );

/** Commands that mark everything that is asked, this far beside the first marks. */
export const commandsBeside = ({ frames }: SecondMarkingDocument, first: Points, off: number) =>
  frames.flatMap(({ frame, landmarks }) =>
    landmarks.map((landmark) => {
      const before = first.get(`${frame} ${landmark}`);
      return {
        id: randomUUID(),
        frame,
        landmark,
        baseRevision: 0,
        set: before
          ? {
              to: 'point',
              u: before.u + off,
              v: before.v - off,
              pictureLongEdge: before.pictureLongEdge,
            }
          : { to: 'hidden' },
      };
    }),
  );

/** Marks everything that is asked. */
export const markAllAgain = async (agent: Agent, id: string, first: Points, off = 2) => {
  const commands = commandsBeside(await openAgain(agent, id), first, off);
  await agent.post(`/api/second-markings/${id}/marks`).send({ commands }).expect(200);
  return commands;
};
