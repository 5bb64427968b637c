import { letters } from '#server/pdf/letters.ts';
import { Paper } from '#server/pdf/paper.ts';
import type { Pictures } from '../make-pictures.ts';
import type { ReportContent } from '../report-content.ts';
import { writeCompared, writeLimits, writePlans, writeReferences } from './closing-part.ts';
import { type Cut, cutShort } from './cut-short.ts';
import { writeKeyFrames } from './key-frames-part.ts';
import { counted, dayWords, listed, VIEW_WORDS } from './report-words.ts';
import { writeSide } from './side-part.ts';

export interface Edition {
  readonly number: number;
  readonly at: string;
  readonly by: string;
}

interface Way {
  readonly scale: number;
  readonly cut: Cut;
  /** False leaves the key frames out. */
  readonly pictures?: boolean;
}

/** Smaller type, then fewer words, where the report would take more pages than a letter should. */
const WAYS = [
  { scale: 1, cut: 'whole' },
  { scale: 0.88, cut: 'whole' },
  { scale: 0.78, cut: 'whole' },
  { scale: 0.78, cut: 'short' },
  { scale: 0.78, cut: 'shortest' },
  { scale: 0.78, cut: 'shortest', pictures: false },
] as const satisfies readonly Way[];
export const MOST_PAGES = 3;

const metres = (mm: number): string => `${(mm / 1000).toFixed(2)} m`;

const filmedWords = ({ visit: { clips, views, filming } }: ReportContent): string => {
  if (clips === 0) return 'No clip was filmed or kept; what was seen is told below.';
  const { distanceMm, lensHeightMm, beltPointerMm, thighPointerMm } = filming;
  const from = listed(views.map((view) => VIEW_WORDS[view]));
  const set = [
    distanceMm === null ? '' : `camera at ${metres(distanceMm)}`,
    lensHeightMm === null ? '' : `lens ${metres(lensHeightMm)} above the floor`,
    beltPointerMm === null ? '' : 'belt pointer',
    thighPointerMm === null ? '' : 'thigh pointer',
  ].filter((part) => part !== '');
  return `${counted(clips, 'clip')}, filmed from ${from}${set.length > 0 ? `; ${set.join(', ')}` : ''}.`;
};

const writeHead = (paper: Paper, content: ReportContent, { number, at, by }: Edition): void => {
  const { practice, athlete, visit } = content;
  const { name, contact } = practice;
  paper.note(
    contact.startsWith(name) ? contact : [name, contact].filter((part) => part !== '').join(' · '),
  );
  paper.title('One-leg stance with knee lift: report of a visit');
  paper.says(
    `${athlete.name}, born ${dayWords(athlete.birthDate)}. Visit of ${dayWords(visit.day)}, ${visit.coach}.`,
    {
      size: 11,
    },
  );
  paper.note(`Report ${number}, made ${dayWords(at)} by ${by}. It says what stood then.`);
};

const writeTest = (paper: Paper, content: ReportContent): void => {
  const gates = content.sides.map(
    ({ reading, calls }) => reading?.gates ?? calls.at(-1)?.gates ?? null,
  )[0];
  paper.heading('What was tested and how');
  paper.says(
    `The athlete stands on one leg and lifts the other knee. Looked at is whether the hip stood on turns in, holds still or swings outwards while the lifted thigh passes ${gates ? `${gates.from}° and ${gates.to}°` : 'the gates'} from the vertical. Turn is counted from this person’s own quiet stance, outwards positive. First it was judged by eye; where landmarks were marked on frames of the clip, the turn was worked out from them.`,
  );
  paper.says(filmedWords(content));
};

const NO_ROOM = 'there is no room for them beside what had to be said';

const write = async (whole: ReportContent, of: Edition, all: Pictures, way: Way) => {
  const { scale, cut, pictures: shown = true } = way;
  const { content, leftOut } = cutShort(whole, cut);
  const { strong } = await letters();
  const { athlete, visit, practice } = content;
  const paper = await Paper.open(
    {
      title: `Report ${of.number}: ${athlete.name}, visit of ${dayWords(visit.day)}`,
      author: practice.name,
      made: new Date(of.at),
    },
    scale,
  );
  writeHead(paper, content, of);
  if (leftOut.length > 0)
    paper.note(`Shortened to fit on ${MOST_PAGES} pages; left out: ${listed(leftOut)}.`);
  writeTest(paper, content);
  for (const [n, side] of content.sides.entries()) {
    const stills = all.get(n);
    const told = typeof stills === 'object' && !shown ? NO_ROOM : stills;
    writeSide(paper, side, () => {
      if (side.reading && side.keyFrames && told !== undefined)
        writeKeyFrames(paper, side.reading, side.keyFrames, told, strong);
    });
  }
  writeCompared(paper, content);
  writePlans(paper, content);
  writeReferences(paper);
  writeLimits(paper);
  return paper.close(
    (page, pages) =>
      `${athlete.name} · visit of ${dayWords(visit.day)} · report ${of.number} · page ${page} of ${pages} · an aid to trained judgement, not a diagnosis`,
  );
};

/**
 * The report as a document of one to three pages.
 * @throws Error where even the shortest takes more
 */
export const writeReport = async (
  content: ReportContent,
  of: Edition,
  pictures: Pictures = new Map(),
): Promise<{ readonly pdf: Buffer; readonly pages: number }> => {
  for (const way of WAYS) {
    const made = await write(content, of, pictures, way);
    if (made.pages <= MOST_PAGES) return made;
  }
  throw new Error(`A report takes more than ${MOST_PAGES} pages at its shortest.`);
};
