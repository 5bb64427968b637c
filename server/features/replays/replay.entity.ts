import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { side } from '#shared/contracts/primitives.ts';
import { madeAt, moment, ownedRow } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';
import { Head } from '../heads/head.entity.ts';
import { Rep } from '../reps/rep.entity.ts';
import { Visit } from '../visits/visit.entity.ts';

/** A link that shows one rep to the athlete. The token itself is kept nowhere. */
export const Replay = defineEntity({
  name: 'Replay',
  properties: {
    ...ownedRow(),
    visit: p.manyToOne(Visit).ref(),
    side: p.enum(side.options),
    rep: p.manyToOne(Rep).ref(),
    /** Both inclusive. */
    fromFrame: p.integer(),
    toFrame: p.integer(),
    showReading: p.boolean(),
    showCall: p.boolean(),
    /** Only a copy on which the head is hidden leaves by this link. */
    hideHead: p.boolean().default(false),
    /** The version of the box that the copy which lies there was made by; null: there is none. */
    hiddenHead: p.manyToOne(Head).ref().nullable(),
    /** How often making that copy was begun since a person last asked for it. */
    hideTries: p.integer().default(0),
    /** It was given up; a person can ask again. */
    hideFailed: p.boolean().default(false),
    message: p.text(),
    /** SHA-256 of the token, hex. */
    tokenHash: p.text().unique(),
    /** bcrypt; null where the link asks for none. */
    passPhraseHash: p.text().nullable().lazy(),
    expiresAt: moment(),
    revokedAt: moment().nullable(),
    openings: p.integer().default(0),
    lastOpenedAt: moment().nullable(),
    by: p.manyToOne(User).ref(),
    at: madeAt(),
  },
});
export type Replay = InferEntity<typeof Replay>;
