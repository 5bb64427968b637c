import { degrees, plusMinus } from '#shared/exports/figures.ts';
import { LIMITS } from '#shared/measures/method-limits.ts';
import { REFERENCE_VALUES } from '#shared/measures/reference-values.ts';
import { WEDGE } from '#shared/plots/course-shapes.ts';
import type { Paper } from '#server/pdf/paper.ts';
import type { ReportContent, ReportPlan } from '../report-content.ts';
import { capital, dayWords, doseWords } from './report-words.ts';

export const writeCompared = (paper: Paper, { compared }: ReportContent): void => {
  if (!compared) return;
  const { difference, plusMinus: pm, differ } = compared;
  paper.heading('Both sides');
  paper.says(
    `Left less right, turn from gate to gate: ${degrees(difference)} ${plusMinus(pm)}°. ${
      differ ? 'The sides differ beyond the error.' : 'No difference that this test can show.'
    } The sides are never averaged.`,
  );
};

const writePlan = (paper: Paper, plan: ReportPlan): void => {
  const { side, givenAt, givenBy, retestOn, note, items } = plan;
  paper.subheading(`For the ${side} hip`);
  paper.says(
    `Given to the athlete on ${dayWords(givenAt)} by ${givenBy}. Retest on ${dayWords(retestOn)}.`,
  );
  if (items.length > 0)
    paper.table(
      [
        { title: 'Exercise', share: 24 },
        { title: 'For', share: 9 },
        { title: 'Dose', share: 27 },
        { title: 'What it is for', share: 40 },
      ],
      items.map((item) => [
        item.name,
        `${item.side} leg`,
        doseWords(item.dose),
        [item.purpose, item.cue === '' ? '' : `Cue: ${item.cue}`]
          .filter((part) => part !== '')
          .join(' '),
      ]),
    );
  if (note !== '') paper.says(`Note: ${note}`);
};

export const writePlans = (paper: Paper, { plans }: ReportContent): void => {
  paper.heading('Plan');
  if (plans.length === 0) paper.says('No plan is given to the athlete from this visit.');
  for (const plan of plans) writePlan(paper, plan);
};

const [least, most] = WEDGE.in;

/** Published values stand beside a person's own, never as a pass mark. */
export const writeReferences = (paper: Paper): void => {
  paper.heading('Reference values');
  paper.says(
    `The green wedge of a course is the expected turn-in from gate to gate, ${degrees(least, 0)} to ${degrees(most, 0)} (from our model, no source). No published range of the standing hip’s turn against lift was found, so none is set against the values above. The following are other measures of the hip, to be read beside them and not as a pass mark.`,
  );
  paper.table(
    [
      { title: 'Measure', share: 25 },
      { title: 'Mean ± SD', share: 11, align: 'right' },
      { title: 'Source', share: 64 },
    ],
    REFERENCE_VALUES.map(({ label, mean, sd, source, mark }) => [
      label,
      `${degrees(mean)}${sd === null ? '' : ` ${plusMinus(sd)}°`}`,
      mark === 'seen' ? source : `${source} (from memory)`,
    ]),
    8,
  );
};

export const writeLimits = (paper: Paper): void => {
  paper.heading('Limits');
  for (const { says, source } of LIMITS)
    paper.says(source === '' ? says : `${says} [${capital(source)}]`, { size: 8.5 });
};
