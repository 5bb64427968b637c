import { defineEntity, p } from '@mikro-orm/core';
import { waitingMailKind } from '#shared/contracts/waiting-mail.ts';
import { moment, ownPractice } from '#server/db/columns.ts';

/** Whether somebody is written to about one kind of thing that waits for them. Written by raw SQL; this is its shape. */
export const MailChoice = defineEntity({
  name: 'MailChoice',
  properties: {
    userId: p.uuid().primary(),
    kind: p.enum(waitingMailKind.options).primary(),
    practiceId: ownPractice(),
    off: p.boolean().default(false),
    /** When the last letter of this kind was asked for. */
    askedAt: moment().nullable(),
  },
});
