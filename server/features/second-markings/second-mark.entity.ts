import { defineEntity, p } from '@mikro-orm/core';
import { moment, ownPractice, real } from '#server/db/columns.ts';

/**
 * One landmark on one frame, placed by hand a second time. Read and written in bulk by raw SQL; this is its shape.
 * A removed mark stays as a row with `present` false, so that `revision` goes on counting.
 */
export const SecondMark = defineEntity({
  name: 'SecondMark',
  properties: {
    secondMarkingId: p.uuid().primary(),
    frame: p.integer().primary(),
    landmark: p.text().primary(),
    practiceId: ownPractice(),
    present: p.boolean(),
    hidden: p.boolean(),
    /** Pixels of the upright source frame; null where hidden or removed. */
    u: real().nullable(),
    v: real().nullable(),
    /** Long edge, px, of the picture on which it was placed; 0 where it was never placed. */
    pictureLongEdge: p.integer(),
    revision: p.integer(),
    at: moment(),
  },
});
