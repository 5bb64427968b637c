import { Readable } from 'node:stream';
import { product } from '../../../db/in-practice.ts';
import { tell } from '../../../events/tell.ts';
import { handles, type JobContext } from '../../../jobs/job.ts';
import { afterError, withNextTry } from '../../../jobs/tries.ts';
import type { Ground } from '../../../main/ground.ts';
import type { Visit } from '../../visits/visit.entity.ts';
import { makePictures } from '../make-pictures.ts';
import { reportKey } from '../report-files.ts';
import { Report } from '../report.entity.ts';
import { writeReport } from '../write/write-report.ts';
import { MAKE_REPORT } from './make-report-type.ts';

type Outcome = Partial<Pick<Report, 'state' | 'pages' | 'bytes' | 'tries'>>;

/** Says how it went; false where the report is gone, or somebody else has said so meanwhile. */
const say = ({ inPractice }: Ground, practiceId: string, id: string, outcome: Outcome) =>
  inPractice(product(practiceId), async (unit) => {
    const { em } = unit;
    const report = await em.findOne(Report, { id }, { populate: ['visit.athlete'] });
    if (report?.state !== 'asked') return false;
    em.assign(report, outcome);
    const visit = report.visit.unwrap() as Visit;
    await em.flush();
    const coachId = visit.athlete.unwrap().coach.id;
    await tell(unit, { coachId }, { type: 'report', visitId: visit.id });
    return true;
  });

/** Counts a try and hands over what is to be written; null where nothing is. */
const begin = (ground: Ground, practiceId: string, id: string) =>
  ground.inPractice(product(practiceId), async ({ em }) => {
    const report = await em.findOne(Report, { id }, { populate: ['content', 'by', 'visit'] });
    if (report?.state !== 'asked') return null;
    const tries = withNextTry(report.tries);
    report.tries = tries ?? report.tries;
    const { content, number, at } = report;
    const visit = report.visit.unwrap() as Visit;
    return {
      key: reportKey(practiceId, visit.athlete.id, id),
      givenUp: tries === null,
      content: content.unwrap(),
      of: { number, at: at.toISOString(), by: report.by.unwrap().name },
    };
  });

/** Killed at any instant it leaves at most a file that is written over; run again it writes the same. */
const run = async ({
  ground,
  practiceId,
  payload: { reportId },
  signal,
}: JobContext<{ reportId: string }>): Promise<void> => {
  const asked = await begin(ground, practiceId, reportId);
  if (!asked) return;
  const { key, givenUp, content, of } = asked;
  if (givenUp || !content) {
    await say(ground, practiceId, reportId, { state: 'failed' });
    return;
  }
  try {
    const pictures = await makePictures(ground, practiceId, content, signal);
    const { pdf, pages } = await writeReport(content, of, pictures);
    signal.throwIfAborted();
    await ground.storage.putStream(key, Readable.from([pdf]), 'application/pdf');
    const kept = await say(ground, practiceId, reportId, {
      state: 'ready',
      pages,
      bytes: pdf.length,
    });
    // erased meanwhile: the file must not outlive the person
    if (!kept && !(await isReady(ground, practiceId, reportId))) await ground.storage.delete(key);
  } catch (error) {
    if (!(await endedBadly(ground, practiceId, reportId, signal))) throw error;
    ground.log.error({ err: error, reportId }, 'a report could not be made');
  }
};

/** After an error: true where that was the last try, and the list says so. */
const endedBadly = async (
  ground: Ground,
  practiceId: string,
  id: string,
  signal: AbortSignal,
): Promise<boolean> => {
  const wasLast = await ground.inPractice(product(practiceId), async ({ em }) => {
    const report = await em.findOne(Report, { id, state: 'asked' });
    if (!report) return true;
    const after = afterError(report.tries, signal);
    report.tries = after.tries;
    return after.wasLast;
  });
  if (wasLast) await say(ground, practiceId, id, { state: 'failed' });
  return wasLast;
};

const isReady = ({ inPractice }: Ground, practiceId: string, id: string): Promise<boolean> =>
  inPractice(
    product(practiceId),
    async ({ em }) => (await em.count(Report, { id, state: 'ready' })) === 1,
  );

export const makeReportJob = handles({
  type: MAKE_REPORT,
  lockKey: ({ reportId }) => reportId,
  run,
  // pictures of a long clip are decoded up to their frame
  expireInMinutes: 30,
  retryLimit: 5,
  retryDelaySeconds: 10,
  unfinished: {
    sql: 'select report_id, practice_id from reports_to_make()',
    read: (row) => ({
      practiceId: String(row.practice_id),
      payload: { reportId: String(row.report_id) },
    }),
  },
});
