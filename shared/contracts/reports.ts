import * as z from 'zod';
import { id, moment, personRef } from './primitives.ts';
import { bytes, json, route } from './route.ts';

export const reportState = z.enum(['asked', 'ready', 'failed']).meta({
  id: 'ReportState',
  description: '`asked`: being made. `failed`: given up until a person asks again.',
});

/** A visit on paper for the referring clinician, as it stood when it was asked for. */
export const report = z
  .object({
    id,
    visitId: id,
    /** From 1; a later one stands beside the ones before. */
    number: z.int().positive(),
    state: reportState,
    /** Null until it is made. */
    pages: z.int().positive().nullable(),
    bytes: z.int().positive().nullable(),
    by: personRef,
    at: moment,
  })
  .meta({ id: 'Report' });
export type Report = z.infer<typeof report>;

const params = z.object({ id });

export const reportRoutes = {
  listReports: route({
    method: 'get',
    path: '/api/visits/:id/reports',
    summary: 'The reports of a visit, newest first.',
    audience: 'staff',
    params,
    status: 200,
    answer: json(z.object({ items: z.array(report) }).meta({ id: 'Reports' })),
    problems: ['not-found'],
  }),
  makeReport: route({
    method: 'post',
    path: '/api/visits/:id/reports',
    summary: 'Ask for a report of the visit as it stands now; earlier ones stay as they are.',
    audience: 'staff',
    params,
    status: 202,
    answer: json(report),
    problems: ['not-found', 'not-allowed', 'consent-missing', 'call-first', 'report-being-made'],
  }),
  makeReportAgain: route({
    method: 'post',
    path: '/api/reports/:id/again',
    summary: 'Try once more to make a report that failed, with what it was asked for.',
    audience: 'staff',
    params,
    status: 202,
    answer: json(report),
    problems: ['not-found', 'not-allowed', 'not-as-it-stands'],
  }),
  reportFile: route({
    method: 'get',
    path: '/api/reports/:id/file',
    summary: 'The report itself, PDF.',
    audience: 'staff',
    params,
    status: 200,
    answer: bytes(['application/pdf']),
    problems: ['not-found', 'not-as-it-stands', 'report-missing-in-storage'],
  }),
};
