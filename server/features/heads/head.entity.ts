import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import type { DrawnHead, FollowedHead } from '#shared/head/head-track.ts';
import { madeAt, moment, ownedRow, real } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';
import { Clip } from '../clips/clip.entity.ts';

/** One version of the box around the head of a clip. The product may add one and note who looked, and no more. */
export const Head = defineEntity({
  name: 'Head',
  uniques: [{ properties: ['clip', 'version'] }],
  properties: {
    ...ownedRow(),
    clip: p.manyToOne(Clip).ref(),
    version: p.integer(),
    /** Both inclusive. */
    fromFrame: p.integer(),
    toFrame: p.integer(),
    drawn: p.json<readonly DrawnHead[]>(),
    followed: p.json<readonly FollowedHead[]>(),
    growth: real(),
    by: p.manyToOne(User).ref(),
    at: madeAt(),
    lookedBy: p.manyToOne(User).ref().nullable(),
    lookedAt: moment().nullable(),
  },
});
export type Head = InferEntity<typeof Head>;
