import { defineEntity, p } from '@mikro-orm/core';
import { moment, ownPractice } from '#server/db/columns.ts';

/** A command that was done, so that sending it again does nothing. `id` is made by the client. */
export const MarkCommand = defineEntity({
  name: 'MarkCommand',
  properties: {
    repId: p.uuid().primary(),
    id: p.uuid().primary(),
    practiceId: ownPractice(),
    frame: p.integer(),
    landmark: p.text(),
    /** The revision that it made. */
    revision: p.integer(),
    at: moment(),
  },
});
