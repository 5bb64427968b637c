import { courseOfRep, isCourse } from '#shared/course/course-of-rep.ts';
import type { CourseFrame, RepInput } from '#shared/course/types.ts';
import { LANDMARK_IDS, type LandmarkSetId } from '#shared/landmarks/types.ts';
import { frameValues } from '#shared/measures/frame-values.ts';
import type { FrameInput, MarkError } from '#shared/measures/inputs.ts';
import type { Measure, Setting } from '#shared/measures/measure.ts';
import { MEASURES } from '#shared/measures/registry.ts';

/** A cell: text, a number, or unknown. */
export type Cell = string | number | null;

/** One rep to be written, with what it is called. */
export interface ExportedRep {
  readonly input: RepInput;
  readonly set: LandmarkSetId;
  readonly markError: MarkError;
  readonly visitDay: string;
  readonly clip: string;
  readonly number: number;
}

const UNITS = { degrees: 'deg', millimetres: 'mm' } as const;

const column = ({ id, unit }: Measure): string => `${id.replaceAll('-', '_')}_${UNITS[unit]}`;

const LEAD = [
  'visit_day',
  'clip',
  'rep',
  'support_side',
  'view',
  'landmark_set',
  'rep_left_out',
  'frame',
  'time_s',
  'phase',
] as const;

/**
 * The columns: where the frame stands, every measure of the registry with its ± (95 %) and, where it
 * is not known, why; then the marks, in pixels of the upright source frame, u right and v down.
 */
export const FRAME_COLUMNS: readonly string[] = [
  ...LEAD,
  ...MEASURES.flatMap((measure) => {
    const name = column(measure);
    return [name, `${name}_pm`, `${name}_missing`];
  }),
  ...LANDMARK_IDS.flatMap((id) => {
    const name = id.replaceAll('-', '_');
    return [`${name}_u_px`, `${name}_v_px`, `${name}_source`];
  }),
];

/** Digits beyond any error that a phone's picture has. */
const rounded = (value: number | null, digits: number): number | null =>
  value === null ? null : Number(value.toFixed(digits));

const measureCells = (
  frame: FrameInput,
  setting: Setting | null,
  why: string | null,
  error: MarkError,
): Cell[] => {
  const values = setting ? frameValues(frame, setting, error) : [];
  return MEASURES.flatMap((measure): Cell[] => {
    const found = values.find((each) => each.measure.id === measure.id)?.value;
    if (!found) return [null, null, why ?? 'view-cannot-show-it'];
    return [
      rounded(found.value, 3),
      rounded(found.halfWidth, 3),
      found.missing ? found.missing.code : null,
    ];
  });
};

const markCells = ({ marks }: FrameInput): Cell[] =>
  LANDMARK_IDS.flatMap((id): Cell[] => {
    const mark = marks[id];
    if (!mark) return [null, null, null];
    if (mark.hidden) return [null, null, 'hidden'];
    const source =
      mark.source === 'tracked' && !mark.looked ? 'tracked-not-looked-at' : mark.source;
    return [rounded(mark.point.u, 2), rounded(mark.point.v, 2), source];
  });

/** Every marked frame of a rep as a row of `FRAME_COLUMNS`; an unknown value is an empty cell. */
export const frameRows = (rep: ExportedRep): Cell[][] => {
  const { input, set, markError } = rep;
  const course = courseOfRep(input, set, markError, { halfWidths: false });
  const setting = isCourse(course) ? course.setting : null;
  const why = isCourse(course) ? null : course.code;
  const frames: readonly (CourseFrame | undefined)[] = isCourse(course) ? course.frames : [];
  return input.frames.map((frame, i) => [
    rep.visitDay,
    rep.clip,
    rep.number,
    input.supportSide,
    input.camera.view,
    set,
    input.excluded,
    frame.frame,
    rounded(frame.time / 1000, 6),
    frames[i]?.phase ?? null,
    ...measureCells(frame, setting, why, markError),
    ...markCells(frame),
  ]);
};
