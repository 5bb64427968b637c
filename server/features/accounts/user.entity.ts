import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { role } from '#shared/contracts/accounts.ts';
import { madeAt, moment, ownedRow } from '#server/db/columns.ts';

/** A person with an account; the table is `account`, because `user` is a word of SQL. */
export const User = defineEntity({
  name: 'User',
  tableName: 'account',
  properties: {
    ...ownedRow(),
    /** Lower case; one account per address over all practices. */
    email: p.text().unique(),
    name: p.text(),
    role: p.enum(role.options),
    /** bcrypt. */
    passwordHash: p.text().lazy(),
    disabledAt: moment().nullable(),
    /** The secret of one-time codes, sealed; there from its set-up on. */
    codeSecret: p.text().nullable().lazy().default(null),
    /** Since when a sign-in asks for a code; null: it asks for none. */
    codesSince: moment().nullable(),
    /** The last time step whose code was taken: no code is taken twice. */
    lastCodeStep: p.integer().nullable(),
    createdAt: madeAt(),
  },
});
export type User = InferEntity<typeof User>;
