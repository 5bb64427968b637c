import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { madeAt, moment, ownedRow } from '#server/db/columns.ts';
import { User } from '../../accounts/user.entity.ts';
import { Head } from '../../heads/head.entity.ts';
import { Replay } from '../replay.entity.ts';

/** The film of a link with drawing and reading in its picture, for the athlete to keep. */
export const KeptFilm = defineEntity({
  name: 'KeptFilm',
  properties: {
    ...ownedRow(),
    replay: p.oneToOne(Replay).ref().owner(),
    state: p.enum(['asked', 'ready', 'failed']).default('asked'),
    /** Times it was begun since a person asked for it. */
    tries: p.integer().default(0),
    /** The version of the box that hides the head in it; null where the link shows the head. */
    head: p.manyToOne(Head).ref().nullable(),
    bytes: p.integer().nullable(),
    madeAt: moment().nullable(),
    /** How often it was taken by the link. */
    taken: p.integer().default(0),
    lastTakenAt: moment().nullable(),
    by: p.manyToOne(User).ref(),
    at: madeAt(),
  },
});
export type KeptFilm = InferEntity<typeof KeptFilm>;
