import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import type { Shape } from '#shared/contracts/comments.ts';
import { madeAt, moment, ownedRow } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';
import { Clip } from '../clips/clip.entity.ts';

/** Words at a frame or a span of a clip. */
export const Comment = defineEntity({
  name: 'Comment',
  properties: {
    ...ownedRow(),
    clip: p.manyToOne(Clip).ref(),
    /** The comment that this one answers. */
    answerTo: p.uuid().nullable(),
    body: p.text(),
    /** Both inclusive. */
    fromFrame: p.integer(),
    toFrame: p.integer(),
    shape: p.json<Shape>().nullable(),
    shared: p.boolean(),
    by: p.manyToOne(User).ref(),
    at: madeAt(),
    editedAt: moment().nullable(),
    resolvedBy: p.manyToOne(User).ref().nullable(),
    resolvedAt: moment().nullable(),
  },
});
export type Comment = InferEntity<typeof Comment>;
