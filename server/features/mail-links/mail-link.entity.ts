import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { role } from '#shared/contracts/accounts.ts';
import { mailLinkKind } from '#shared/contracts/mail-links.ts';
import { madeAt, moment, ownedRow, ownPractice } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';

/** A link in a letter: it works once, until it expires. The token itself stands in the letter alone. */
export const MailLink = defineEntity({
  name: 'MailLink',
  properties: {
    ...ownedRow(),
    /** Null for who asks without a sign-in: a forgotten password, a new practice. */
    practiceId: ownPractice().nullable(),
    kind: p.enum(mailLinkKind.options),
    /** SHA-256 of the token, hex; null until the letter is written. */
    tokenHash: p.text().unique().nullable(),
    /** Where the letter goes, lower case. */
    email: p.text(),
    /** Of a new practice: who starts it, and its name. */
    personName: p.text().default(''),
    practiceName: p.text().default(''),
    /** Of an invitation. */
    role: p.enum(role.options).nullable(),
    /** Whose address changes; of both its links. */
    user: p.manyToOne(User).ref().nullable(),
    /** The two links of one change of address share it. */
    changeId: p.uuid().nullable(),
    newEmail: p.text().nullable(),
    by: p.manyToOne(User).ref().nullable(),
    createdAt: madeAt(),
    expiresAt: moment(),
    sentAt: moment().nullable(),
    usedAt: moment().nullable(),
    revokedAt: moment().nullable(),
  },
});
export type MailLink = InferEntity<typeof MailLink>;
