import { SEEN_WORDS, CONFIDENCE_WORDS, SUBSTITUTION_WORDS } from '#shared/exports/call-words.ts';
import { decimal, degrees, plusMinus, turn } from '#shared/exports/figures.ts';
import { otherSide } from '#shared/landmarks/types.ts';
import type { Paper } from '#server/pdf/paper.ts';
import type { ReportReading, ReportSide } from '../report-content.ts';
import { drawCourse } from './course-drawing.ts';
import { counted, dayWords, hipWords, inHundred, listed, SET_WORDS } from './report-words.ts';

const callWords = ({ calls, calledBy }: ReportSide): string[] =>
  calls.map(({ seen, confidence, substitutions, gates, at, beforeFigures }, n) => {
    const also = substitutions.map((each) => SUBSTITUTION_WORDS[each].toLowerCase());
    return [
      `${SEEN_WORDS[seen]} between ${gates.from}° and ${gates.to}° of lift (${CONFIDENCE_WORDS[confidence].toLowerCase()}).`,
      also.length > 0 ? `Also seen: ${listed(also)}.` : '',
      `Seen by ${calledBy[n] ?? ''}, ${dayWords(at)}, ${beforeFigures ? 'before any figure was shown' : 'after figures had been shown'}; not measured.`,
    ]
      .filter((part) => part !== '')
      .join(' ');
  });

const reviewWords = ({ review: { state, by, at, about } }: ReportSide): string => {
  const when = `${by ?? ''}${at === null ? '' : `, ${dayWords(at)}`}`;
  const what = about === 'call' ? 'The call by eye' : 'The reading';
  switch (state) {
    case 'none':
      return 'Not reviewed: nobody else has looked at this side.';
    case 'waits':
      return `Waits for a reviewer; handed in by ${when}. Not signed off.`;
    case 'sent-back':
      return `Sent back by ${when}. Not signed off.`;
    case 'signed-off':
      return `${what} is signed off by ${when}.`;
    case 'changed':
      return `Signed off once, and changed since; the last word was ${when}. What stands here is not signed off.`;
  }
};

const madeOf = (reading: ReportReading): string => {
  const { reps, marks, set, markError, engine, protocol, assumption } = reading;
  return [
    `From ${reps.used} of ${counted(reps.of, 'marked rep')} and ${counted(marks, 'mark')}${set === null ? '' : `, with ${SET_WORDS[set]}`}.`,
    `Marking error ${decimal(markError.px)} px, ${markError.frames === 0 ? 'assumed' : `from ${counted(markError.frames, 'frame')} marked twice`}.`,
    assumption ? 'Taken with the assumption that the planted thigh turns little.' : '',
    `Protocol version ${protocol}, calculation ${engine}.`,
  ]
    .filter((part) => part !== '')
    .join(' ');
};

const figureRows = ({ figures, gates }: ReportReading): string[][] => {
  if (!figures) return [];
  const { change, pelvis, thigh, pEarly, smallestFound } = figures;
  const value = ({ value: of, plusMinus: pm }: typeof change) => `${turn(of)} ${plusMinus(pm)}°`;
  return [
    [`Turn of the hip, ${gates.from}° to ${gates.to}° of lift`, value(change)],
    ['of it, pelvis over the planted thigh', value(pelvis)],
    ['of it, thigh itself', value(thigh)],
    ['Probability that it turns out by more than 1°', inHundred(pEarly)],
    ['Smallest early turn found 9 times in 10', degrees(smallestFound)],
  ];
};

const altOf = ({ figures, gates, label }: ReportReading, side: string): string =>
  `Course of the ${side} hip: turn against lift with its 95 % band. ${label}.${
    figures
      ? ` From ${gates.from}° to ${gates.to}° of lift the hip turns ${turn(figures.change.value)} ${plusMinus(figures.change.plusMinus)}°.`
      : ''
  }`;

const writeReading = (paper: Paper, reading: ReportReading, side: string): void => {
  paper.subheading(`Reading: ${reading.label}`);
  if (reading.provisional)
    paper.says(
      'Provisional: it rests on marks that the computer followed and nobody has looked at.',
      { weight: 'strong' },
    );
  const rows = figureRows(reading);
  const drawn = reading.course.length > 1;
  const [wide, high] = [290, 178];
  if (drawn) paper.room(high + 10);
  const top = paper.y;
  let end = top;
  if (drawn) {
    paper.figure(altOf(reading, side), wide, high, (pen) => drawCourse(pen, reading, wide, high));
    end = paper.y;
    paper.y = top;
  }
  const from = drawn ? wide + 12 : 0;
  paper.within(from, paper.width - from, () => {
    if (rows.length > 0)
      paper.table(
        [
          { title: 'Value', share: 3 },
          { title: '± 95 %', share: 2, align: 'right' },
        ],
        rows,
      );
    else paper.says('No figure can be told from these marks.');
    paper.note(madeOf(reading));
  });
  paper.y = Math.max(end, paper.y) + 4;
  writeChanges(paper, reading);
};

const UNITS = { degrees: '°', millimetres: ' mm' } as const;

const writeChanges = (paper: Paper, { changes }: ReportReading): void => {
  const rows = changes.flatMap(({ label, sign, unit, change, smallest, beyond }) =>
    change === null
      ? []
      : [
          [
            label,
            `${change > 0 ? '+' : ''}${decimal(change)}${UNITS[unit]}`,
            smallest === null ? 'not known' : `${decimal(smallest)}${UNITS[unit]}`,
            beyond ? 'yes' : 'no change that this test can show',
            sign,
          ],
        ],
  );
  if (rows.length === 0) return;
  paper.table(
    [
      { title: 'From quiet stance to the top', share: 24 },
      { title: 'Change', share: 10, align: 'right' },
      { title: 'Smallest told', share: 12, align: 'right' },
      { title: 'Beyond it', share: 22 },
      { title: 'Sign', share: 32 },
    ],
    rows,
    8,
  );
};

/** One hip: what was seen, what was measured, and who answers for it. */
export const writeSide = (paper: Paper, side: ReportSide, pictures: () => void): void => {
  paper.heading(hipWords(side.side), 120);
  paper.subheading('Call by eye');
  for (const line of callWords(side)) paper.says(line);
  if (side.reading) writeReading(paper, side.reading, side.side);
  else
    paper.says(
      `Nothing was measured on this side: no rep with the ${otherSide(side.side)} leg lifted carries a mark.`,
    );
  pictures();
  paper.subheading('Sign-off');
  paper.says(reviewWords(side));
};
