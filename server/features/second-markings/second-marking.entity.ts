import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import type { AskedFrame } from '#shared/reliability/asked-frames.ts';
import type { PhasesByFrame, SecondResult } from '#shared/reliability/compare-markings.ts';
import type { FirstMark } from '#shared/reliability/marked-twice.ts';
import { madeAt, moment, ownedRow } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';
import { Rep } from '../reps/rep.entity.ts';

/** Some frames of a rep, marked a second time without sight of the first marks. */
export const SecondMarking = defineEntity({
  name: 'SecondMarking',
  properties: {
    ...ownedRow(),
    rep: p.manyToOne(Rep).ref(),
    /** Who marks again. */
    marker: p.manyToOne(User).ref(),
    askedBy: p.manyToOne(User).ref(),
    askedAt: madeAt(),
    openedAt: moment().nullable(),
    finishedAt: moment().nullable(),
    /** In the order in which they are marked, which is shuffled. */
    frames: p.json<readonly AskedFrame[]>(),
    /** The first marks as they stood when this was asked for. Never leaves the server while it is open. */
    first: p.json<readonly FirstMark[]>().lazy(),
    /** The part of the rep that each frame belongs to, by all first marks: both markings are divided alike. */
    phases: p.json<PhasesByFrame>().lazy(),
    /** What came of it; null until it is finished. */
    result: p.json<SecondResult>().nullable(),
  },
});
export type SecondMarking = InferEntity<typeof SecondMarking>;
