import { defineEntity, type InferEntity, p } from '@mikro-orm/core';
import { reportState } from '#shared/contracts/reports.ts';
import { madeAt, ownedRow } from '#server/db/columns.ts';
import { User } from '../accounts/user.entity.ts';
import { Visit } from '../visits/visit.entity.ts';
import type { ReportContent } from './report-content.ts';

/** A visit on paper. What it says is kept from the moment at which it was asked for. */
export const Report = defineEntity({
  name: 'Report',
  uniques: [{ properties: ['visit', 'number'] }],
  properties: {
    ...ownedRow(),
    visit: p.manyToOne(Visit).ref(),
    /** From 1. */
    number: p.integer(),
    state: p.enum(reportState.options).default('asked'),
    content: p.json<ReportContent>().lazy(),
    /** Times it was begun since a person asked for it. */
    tries: p.integer().default(0),
    pages: p.integer().nullable(),
    bytes: p.integer().nullable(),
    by: p.manyToOne(User).ref(),
    at: madeAt(),
  },
});
export type Report = InferEntity<typeof Report>;
