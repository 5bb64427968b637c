import { defineEntity, p } from '@mikro-orm/core';
import { moment, ownPractice } from '#server/db/columns.ts';

/** A command that was done, so that sending it again does nothing. `id` is made by the client. */
export const SecondMarkCommand = defineEntity({
  name: 'SecondMarkCommand',
  properties: {
    secondMarkingId: p.uuid().primary(),
    id: p.uuid().primary(),
    practiceId: ownPractice(),
    at: moment(),
  },
});
