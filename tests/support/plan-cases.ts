import { randomUUID } from 'node:crypto';
import type { Seen } from '#shared/contracts/calls.ts';
import type { ReadingCode } from '#shared/contracts/readings.ts';
import type { Side } from '#shared/contracts/primitives.ts';
import { makeAthlete, makeConsent } from '#server/features/athletes/athlete.factory.ts';
import { Call } from '#server/features/calls/call.entity.ts';
import { makeClip } from '#server/features/clips/clip.factory.ts';
import { currentProtocol } from '#server/features/protocol/current-protocol.ts';
import { Reading } from '#server/features/readings/reading.entity.ts';
import { SideSetting } from '#server/features/readings/side-setting.entity.ts';
import { Replay } from '#server/features/replays/replay.entity.ts';
import { makeRep } from '#server/features/reps/rep.factory.ts';
import type { SafetyAnswers } from '#server/features/visits/visit.entity.ts';
import { makeVisit, wellAndReady } from '#server/features/visits/visit.factory.ts';
import { newToken, tokenHash } from '#server/http/token-hash.ts';
import type { Api } from './api.ts';

/** What a side has been found to do. */
export interface CaseOf {
  readonly side?: Side;
  readonly seen?: Seen | null;
  readonly reading?: {
    readonly code: ReadingCode;
    readonly provisional?: boolean;
    readonly result?: object;
  };
  /** Answers that are yes; null: the questions were never asked. */
  readonly yes?: readonly (keyof SafetyAnswers['answers'])[] | null;
  readonly clearedBy?: string | null;
}

export interface PlanCase {
  readonly athleteId: string;
  readonly visitId: string;
  readonly side: Side;
  /** Of a link that shows this side. */
  readonly token: string;
}

/** A new athlete of the world's coach, tested on one side, with a link that shows it. */
export const makePlanCase = (
  { ground, world }: Api,
  { side = 'right', seen = 'early', reading, yes = [], clearedBy = null }: CaseOf = {},
): Promise<PlanCase> =>
  ground.inPractice(world.coach, async ({ em }) => {
    const { coach } = world;
    const athlete = makeAthlete(em, { coach, givenName: 'Wren' });
    makeConsent(em, {
      athlete,
      recordedBy: coach,
      purposes: ['assessment', 'supervision', 'sharing-by-link'],
    });
    const well = wellAndReady(coach);
    const answers = { ...well.answers };
    for (const question of yes ?? []) answers[question] = true;
    const visit = makeVisit(em, {
      athlete,
      coach,
      safety: yes === null ? null : { ...well, answers, clearedBy },
    });
    if (seen !== null)
      em.create(Call, {
        visit,
        side,
        seen,
        substitutions: [],
        confidence: 'sure',
        handsFelt: '',
        by: coach,
        beforeFigures: true,
      });
    if (reading)
      em.create(SideSetting, {
        visit,
        side,
        reading: em.create(Reading, {
          visit,
          side,
          engine: 3,
          inputHash: randomUUID(),
          seed: 1,
          inputs: {} as never,
          result: { set: 'bare', figures: null, ...reading.result } as never,
          code: reading.code,
          before60: false,
          provisional: reading.provisional ?? false,
          assumption: false,
          protocol: await currentProtocol(em),
          by: coach,
        }),
      });
    const clip = makeClip(em, { visit, uploadedBy: coach });
    const rep = makeRep(em, { clip, createdBy: coach });
    const token = newToken();
    em.create(Replay, {
      visit,
      rep,
      side,
      fromFrame: 0,
      toFrame: 9,
      showReading: true,
      showCall: true,
      message: '',
      tokenHash: tokenHash(token),
      passPhraseHash: null,
      expiresAt: new Date(Date.now() + 1e8),
      by: coach,
    });
    await em.flush();
    return { athleteId: athlete.id, visitId: visit.id, side, token };
  });
