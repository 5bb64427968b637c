import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { side } from '#shared/contracts/primitives.ts';
import { type Boundaries, exclusion } from '#shared/contracts/reps.ts';
import { madeAt, ownedRow } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';
import { Clip } from '../clips/clip.entity.ts';

/** Moments that a hand has moved, by frame; what is absent is found from the marks. */
export type HandBoundaries = Partial<Record<keyof Boundaries, number>>;

/** One lift inside a clip. Its number is its place in the clip and is not kept. */
export const Rep = defineEntity({
  name: 'Rep',
  properties: {
    ...ownedRow(),
    clip: p.manyToOne(Clip).ref(),
    supportSide: p.enum(side.options),
    /** Both inclusive. */
    startFrame: p.integer(),
    endFrame: p.integer(),
    handBoundaries: p.json<HandBoundaries>(),
    excluded: p.enum(exclusion.options).nullable(),
    excludedNote: p.text().default(''),
    /** The rep of the same clip and side whose quiet stance this one takes; a foreign key of the migration. */
    quietFrom: p.uuid().nullable(),
    /** The rep of a side clip that shows the same moment; a foreign key too. */
    liftFrom: p.uuid().nullable(),
    /** A clap near the rep that another clip shows too. */
    clapFrame: p.integer().nullable(),
    createdBy: p.manyToOne(User).ref(),
    createdAt: madeAt(),
    version: p.integer().version(),
  },
});
export type Rep = InferEntity<typeof Rep>;
