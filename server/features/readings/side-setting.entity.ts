import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { side } from '#shared/contracts/primitives.ts';
import { moment, ownedRow } from '#server/db/columns.ts';
import { Visit } from '../visits/visit.entity.ts';
import { Reading } from './reading.entity.ts';

/** What is kept for one support side of one visit beside its calls and readings. */
export const SideSetting = defineEntity({
  name: 'SideSetting',
  uniques: [{ properties: ['visit', 'side'] }],
  properties: {
    ...ownedRow(),
    visit: p.manyToOne(Visit).ref(),
    side: p.enum(side.options),
    /** 'The planted thigh turns little'. */
    assumption: p.boolean().default(false),
    /** What the reading rests on has changed since, and a job that makes it anew is asked for. */
    stale: p.boolean().default(false),
    /** When a figure of this side was first shown to anyone. */
    figuresShownAt: moment().nullable(),
    /** The reading of the marks as they stand; undoing a change finds an older one again. */
    reading: p.manyToOne(Reading).ref().nullable(),
  },
});
export type SideSetting = InferEntity<typeof SideSetting>;
