import type { RepCourse } from '#shared/course/course-of-rep.ts';
import { substitutionsOf } from '#shared/course/substitutions.ts';
import type { CourseFrame } from '#shared/course/types.ts';
import { type Degrees, degrees } from '#shared/geometry/units.ts';
import { liftHalfWidth } from '#shared/measures/lift.ts';
import type { Gates } from '#shared/protocol/protocol.ts';
import type { Assessed } from './assess.ts';
import { courseCurve, type DrawnFit } from './band.ts';
import { type Systematic, systematicVariance } from './figures.ts';
import type { UsedRep } from './fit-rep.ts';
import type { Change, RepFit, RepResult } from './types.ts';

/** What a used rep needs of the reading it belongs to. */
interface Standing {
  readonly share: number;
  readonly systematic: Systematic;
  readonly gates: Gates;
}

export const drawnFit = ({ data, fitted }: UsedRep, share: number): DrawnFit => ({
  thigh: fitted.fit.thigh,
  pelvis: fitted.fit.pelvis,
  sFit: fitted.fit.sFit,
  draws: fitted.draws,
  share,
  lifts: Array.from(data.lifts, degrees),
});

const change = (value: Degrees, u: Degrees): Change => ({ value, u });

const repFit = ({ fitted }: UsedRep, share: number): RepFit => ({
  beta: fitted.fit.turn,
  change: change(fitted.d, fitted.u),
  pelvis: change(fitted.dPelvis, fitted.uPelvis),
  thigh: change(fitted.dThigh, fitted.uThigh),
  pre: change(fitted.pre, fitted.uPre),
  sFit: fitted.fit.sFit,
  used: fitted.fit.used,
  nu: fitted.fit.nu,
  share,
});

const withHalfWidths = (course: RepCourse): readonly CourseFrame[] =>
  course.frames.map((frame, i) => {
    const marks = course.level[i];
    return frame.lift === null || !marks
      ? frame
      : { ...frame, liftHalfWidth: liftHalfWidth(marks, course.setting) };
  });

export const repResult = (
  { rep, shown, used, faults }: Assessed,
  standing: Standing | null,
): RepResult => {
  const base = { id: rep.id, used: used !== null, why: faults };
  if (!shown)
    return {
      ...base,
      set: 'bare',
      phases: null,
      frames: [],
      fMax: null,
      fit: null,
      curve: [],
      substitutions: [],
    };
  const alone = used && standing;
  return {
    ...base,
    set: shown.set,
    phases: shown.phases,
    frames: withHalfWidths(shown),
    fMax: shown.fMax,
    fit: alone ? repFit(used, standing.share) : null,
    curve: alone
      ? courseCurve(
          [drawnFit(used, 1)],
          {
            uR: used.fitted.u,
            uS: degrees(
              Math.sqrt(
                systematicVariance(standing.systematic, 1, standing.gates) +
                  (standing.systematic.q * used.fitted.d) ** 2,
              ),
            ),
            lambda: 1,
          },
          standing.gates,
        )
      : [],
    substitutions: substitutionsOf(shown),
    ...(rep.liftFrom && { liftFrom: rep.liftFrom.from }),
  };
};
