import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { ownedRow } from '#server/db/columns.ts';
import { Head } from '../../heads/head.entity.ts';
import { Rep } from '../../reps/rep.entity.ts';
import { Replay } from '../replay.entity.ts';

/** An earlier rep that a link shows beside its own. It goes with its clip; the link itself stays. */
export const ReplayBefore = defineEntity({
  name: 'ReplayBefore',
  properties: {
    ...ownedRow(),
    replay: p.oneToOne(Replay).ref().owner(),
    rep: p.manyToOne(Rep).ref(),
    /** Both inclusive. */
    fromFrame: p.integer(),
    toFrame: p.integer(),
    /** As the link's own: it hides the head on both films or on neither. */
    hideHead: p.boolean(),
    hiddenHead: p.manyToOne(Head).ref().nullable(),
    hideTries: p.integer().default(0),
    hideFailed: p.boolean().default(false),
  },
});
export type ReplayBefore = InferEntity<typeof ReplayBefore>;
