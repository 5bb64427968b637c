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
    createdAt: madeAt(),
  },
});
export type User = InferEntity<typeof User>;
