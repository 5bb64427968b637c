import type { Report as ReportShape } from '#shared/contracts/reports.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import type { Report } from './report.entity.ts';

/** @param report with `by` loaded */
export const presentReport = (report: Report): ReportShape => ({
  id: report.id,
  visitId: report.visit.id,
  number: report.number,
  state: report.state,
  pages: report.pages ?? null,
  bytes: report.bytes ?? null,
  by: presentPerson(report.by.unwrap()),
  at: report.at.toISOString(),
});
