import { pipeline } from 'node:stream/promises';
import { routes } from '#shared/contracts/routes.ts';
import type { Feature } from '../../main/feature.ts';
import { readReport } from './report-files.ts';
import { presentReport } from './reports.presenter.ts';
import { listReports, makeReport, makeReportAgain, openReport } from './reports.service.ts';

export const reportsFeature: Feature = ({ serve, ground: { storage } }) => {
  serve(routes.listReports, async ({ params, work }) => ({
    items: (await work((unit) => listReports(unit, params.id))).map(presentReport),
  }));
  serve(routes.makeReport, async ({ params, work }) =>
    presentReport(await work((unit) => makeReport(unit, params.id))),
  );
  serve(routes.makeReportAgain, async ({ params, work }) =>
    presentReport(await work((unit) => makeReportAgain(unit, params.id))),
  );
  serve(routes.reportFile, async ({ params, work, res }) => {
    const { key, name } = await work((unit) => openReport(unit, params.id));
    const { bytes, stream } = await readReport(storage, key);
    res.attachment(name);
    res.set({
      'Content-Type': 'application/pdf',
      'Content-Length': String(bytes),
      'Cache-Control': 'private, no-store',
    });
    await pipeline(stream, res);
  });
};
