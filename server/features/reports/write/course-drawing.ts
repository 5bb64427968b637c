import { turn } from '#shared/exports/figures.ts';
import { courseScale, type CourseScale } from '#shared/plots/course-scale.ts';
import {
  bandPath,
  linePath,
  runsOf,
  turnsToHold,
  WEDGE,
  wedgePath,
} from '#shared/plots/course-shapes.ts';
import { turnAt } from '#shared/reading/at-lift.ts';
import { INK, type Pen, RULE, SOFT } from '#server/pdf/paper.ts';
import type { ReportReading } from '../report-content.ts';

const SHANK = '#B83A14';
const REED = '#566321';
const REED_PALE = '#E8ECD0';
const SMALL = { size: 7.5, colour: SOFT } as const;

const axes = ({ doc, word }: Pen, { x, y, ...scale }: CourseScale): void => {
  const { left, right, top, bottom, gates, xTicks, yTicks, width } = scale;
  for (const tick of yTicks) {
    doc.moveTo(left, y(tick)).lineTo(right, y(tick));
    doc
      .lineWidth(tick === 0 ? 0.9 : 0.4)
      .strokeColor(tick === 0 ? SOFT : RULE)
      .stroke();
    word(turn(tick, 0), 0, y(tick) - 5, { ...SMALL, align: 'right', width: left - 5 });
  }
  for (const gate of [gates.from, gates.to]) {
    doc.moveTo(x(gate), top - 6).lineTo(x(gate), bottom);
    doc.lineWidth(0.9).dash(3, { space: 2 }).strokeColor(INK).stroke().undash();
  }
  for (const tick of xTicks)
    word(`${tick}°`, x(tick) - 20, bottom + 3, { ...SMALL, align: 'center', width: 40 });
  word('lift of the other thigh', left, bottom + 15, { ...SMALL, width: width - left });
  word('turn: outwards is up', left, top - 18, { ...SMALL, width: width - left });
};

const wedge = ({ doc }: Pen, atFrom: number, scale: CourseScale): void => {
  doc
    .path(wedgePath(atFrom, WEDGE.in, scale))
    .lineWidth(0.5)
    .fillAndStroke(REED_PALE, REED);
  doc
    .path(wedgePath(atFrom, WEDGE.still, scale))
    .lineWidth(0.5)
    .strokeColor(SOFT)
    .stroke();
};

/** Turn against lift with its 95 % band, the lines of the gates and what is expected between them. */
export const drawCourse = (
  pen: Pen,
  { course, repCourses, gates }: ReportReading,
  width: number,
  height: number,
): void => {
  const { doc } = pen;
  const atFrom = turnAt(course, gates.from);
  const turns = [...repCourses.flat().map(({ turn }) => turn), ...turnsToHold(course, gates)];
  const scale = courseScale(width, height, turns, gates);
  if (atFrom !== null) wedge(pen, atFrom, scale);
  axes(pen, scale);
  doc.rect(scale.left, scale.top, scale.right - scale.left, scale.bottom - scale.top).clip();
  doc.path(bandPath(course, scale)).fillOpacity(0.16).fill(SHANK).fillOpacity(1);
  for (const each of repCourses)
    doc.path(linePath(each, scale)).lineWidth(0.5).strokeOpacity(0.6).strokeColor(SHANK).stroke();
  doc.strokeOpacity(1);
  for (const { carried, points } of runsOf(course)) {
    doc.path(linePath(points, scale)).lineWidth(1.6).strokeColor(SHANK);
    if (!carried) doc.dash(1, { space: 3 });
    doc.stroke().undash();
  }
};
