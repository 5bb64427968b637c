import { readingLabel } from '#shared/contracts/readings.ts';
import type {
  SetUp as SetUpShape,
  Visit as VisitShape,
  VisitRow,
} from '#shared/contracts/visits.ts';
import { degrees } from '#shared/geometry/units.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import { isMinor } from '../athletes/days.ts';
import { plusMinus } from '../readings/plus-minus.ts';
import { reviewStateOf } from '../reviews/reviews.presenter.ts';
import { mayFilm } from './safety.ts';
import type { SetUp } from './set-up.entity.ts';
import { filmingOf } from './set-ups.service.ts';
import type { HistoryRow, HistorySide } from './visit-history.ts';
import type { VisitInSight } from './visit-in-sight.ts';

export const presentVisit = ({ visit, athlete, coach }: VisitInSight): VisitShape => {
  const minor = isMinor(athlete.birthDate);
  return {
    id: visit.id,
    day: visit.day,
    note: visit.note,
    athlete: {
      id: athlete.id,
      name: `${athlete.givenName} ${athlete.familyName}`,
      minor,
      heightMm: athlete.heightMm ?? null,
    },
    coach: presentPerson(coach),
    safety: visit.safety ? { ...visit.safety, mayFilm: mayFilm(visit.safety, minor) } : null,
    filming: visit.filming,
    setUpName: visit.setUpName ?? null,
    version: visit.version,
  };
};

const presentSide = (row: HistorySide): VisitRow['sides'][number] => ({
  side: row.side,
  call: row.call,
  review: row.review
    ? reviewStateOf(row.review, { reading: row.review.readingNow, call: row.review.callNow })
    : 'none',
  reading:
    row.code === null
      ? null
      : {
          code: row.code,
          label: readingLabel(row.code, row.before60, row.gateFrom),
          gates: { from: degrees(row.gateFrom), to: degrees(row.gateTo) },
          change: row.change,
          plusMinus: plusMinus(row.u),
          u: row.u,
          provisional: row.provisional,
        },
});

export const presentVisitRow = (row: HistoryRow): VisitRow => ({
  id: row.id,
  day: row.day,
  coach: { id: row.coach_id, name: row.coach_name },
  clipCount: row.clip_count,
  sides: row.sides.map(presentSide),
});

export const presentSetUp = (setUp: SetUp): SetUpShape => ({
  id: setUp.id,
  name: setUp.name,
  ...filmingOf(setUp),
  distanceMm: setUp.distanceMm,
  lastUsed: setUp.lastUsed ?? null,
});
