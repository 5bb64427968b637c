import type { Action } from '#shared/access/actions.ts';
import type { UserActor } from '#shared/access/actors.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { tell } from '../../events/tell.ts';
import { found } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import { enqueue } from '../../jobs/job.ts';
import { User } from '../accounts/user.entity.ts';
import { needConsent } from '../athletes/consent-check.ts';
import { audit } from '../audit/audit.ts';
import { type VisitInSight, visitInSight } from '../visits/visit-in-sight.ts';
import { gatherReport } from './gather-report.ts';
import { MAKE_REPORT } from './jobs/make-report-type.ts';
import { reportKey } from './report-files.ts';
import { Report } from './report.entity.ts';

type Of = Unit<UserActor>;

/** The reports of a visit, newest first. */
export const listReports = async (unit: Of, visitId: string): Promise<Report[]> => {
  await visitInSight(unit, visitId, 'athlete.read');
  return unit.em.find(
    Report,
    { visit: visitId },
    { populate: ['by'], orderBy: { number: 'desc' } },
  );
};

const tellReport = (unit: Of, { visit, athlete }: VisitInSight): Promise<void> =>
  tell(unit, { coachId: athlete.coach.id }, { type: 'report', visitId: visit.id });

/**
 * Asks for a report of the visit as it stands.
 * @throws Problem 'consent-missing', 'call-first' or 'report-being-made'
 */
export const makeReport = async (unit: Of, visitId: string): Promise<Report> => {
  const { em, actor } = unit;
  const sight = await visitInSight(unit, visitId, 'report.make');
  await needConsent(em, sight.athlete.id, 'assessment');
  // two who ask at once ask one after the other
  await em.execute('select 1 from visit where id = ? for update', [visitId]);
  const last = await em.findOne(Report, { visit: visitId }, { orderBy: { number: 'desc' } });
  if (last?.state === 'asked') throw new Problem('report-being-made');
  const report = em.create(Report, {
    visit: sight.visit,
    number: (last?.number ?? 0) + 1,
    content: await gatherReport(unit, sight),
    by: await em.findOneOrFail(User, { id: actor.id }),
  });
  await enqueue(unit, MAKE_REPORT, { reportId: report.id });
  audit(unit, 'report.make', report.id, {
    athlete: sight.athlete.id,
    visit: visitId,
    version: report.number,
  });
  await em.flush();
  await tellReport(unit, sight);
  return report;
};

const reportInSight = async (unit: Of, id: string, action: Action) => {
  const report = found(await unit.em.findOne(Report, { id }, { populate: ['by'] }));
  return { report, sight: await visitInSight(unit, report.visit.id, action) };
};

/** @throws Problem 'not-as-it-stands' where it did not fail */
export const makeReportAgain = async (unit: Of, id: string): Promise<Report> => {
  const { report, sight } = await reportInSight(unit, id, 'report.make');
  await needConsent(unit.em, sight.athlete.id, 'assessment');
  if (report.state !== 'failed')
    throw new Problem('not-as-it-stands', 'Only a report that failed can be tried again.');
  unit.em.assign(report, { state: 'asked', tries: 0 });
  await enqueue(unit, MAKE_REPORT, { reportId: id });
  await unit.em.flush();
  await tellReport(unit, sight);
  return report;
};

/**
 * Where the file lies and what it is called: nothing of the person.
 * @throws Problem 'not-as-it-stands' until it is made
 */
export const openReport = async (unit: Of, id: string): Promise<{ key: string; name: string }> => {
  const { report, sight } = await reportInSight(unit, id, 'athlete.read');
  if (report.state !== 'ready')
    throw new Problem('not-as-it-stands', 'This report is not made yet.');
  const { visit, athlete } = sight;
  audit(unit, 'report.open', id, { athlete: athlete.id, visit: visit.id });
  return {
    key: reportKey(report.practiceId, athlete.id, id),
    name: `${visit.day}-report-${report.number}.pdf`,
  };
};
