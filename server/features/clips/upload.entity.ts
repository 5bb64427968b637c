import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { side, view } from '#shared/contracts/primitives.ts';
import { madeAt, ownedRow } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';
import { Visit } from '../visits/visit.entity.ts';

/** A resumable upload that is not complete yet; the clip it becomes takes over its id. */
export const Upload = defineEntity({
  name: 'Upload',
  properties: {
    ...ownedRow(),
    visit: p.manyToOne(Visit).ref(),
    name: p.text(),
    bytes: p.bigint('number'),
    received: p.bigint('number').default(0),
    view: p.enum(view.options),
    supportSide: p.enum(side.options).nullable(),
    mirrored: p.boolean(),
    openedBy: p.manyToOne(User).ref(),
    openedAt: madeAt(),
    lastByteAt: madeAt(),
  },
});
export type Upload = InferEntity<typeof Upload>;
