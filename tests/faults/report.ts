import assert from 'node:assert/strict';
import { product } from '#server/db/in-practice.ts';
import { Report } from '#server/features/reports/report.entity.ts';
import { patiently } from './client.ts';
import { call } from './post.ts';
import type { Task } from './task.ts';

/** A report of a visit is asked for, and written by a job. */
export const report: Task = {
  name: 'report',
  within: 800,
  prepare: async (place) => {
    const { visit } = await place.newVisit();
    await call(place, visit.id, 'left');
    const path = `/api/visits/${visit.id}/reports`;
    return {
      act: async () => {
        const asked = await patiently(() => place.ask('POST', path, { json: {} }));
        // one whose answer was lost is being made all the same
        const isMade = asked.status === 409 && asked.body.code === 'report-being-made';
        assert.ok(asked.status < 300 || isMade, JSON.stringify(asked.body));
      },
      kept: async () => {
        const reports = await place.inPractice(product(place.practiceId), ({ em }) =>
          em.find(Report, { visit: visit.id }),
        );
        assert.ok(reports.length > 0, 'a report that was asked for is listed');
        for (const { state, bytes } of reports) {
          assert.equal(state, 'ready', 'a report that was asked for is written');
          assert.ok(bytes, 'it has pages');
        }
      },
    };
  },
};
