import { describe, expect, it } from 'vitest';
import {
  age,
  dayOf,
  daysUntil,
  distance,
  longDay,
  moment,
  shortDay,
  today,
  weekday,
  yearsOn,
} from './days.ts';

const now = new Date(2026, 2, 3, 17, 45);

describe('days', () => {
  it('writes days out', () => {
    expect(today(now)).toBe('2026-03-03');
    expect(weekday(now)).toBe('Tuesday, 3 March');
    expect(longDay('2026-03-03')).toBe('3 March 2026');
    expect(shortDay('2026-02-09', now)).toBe('9 February');
    expect(shortDay('2025-02-09', now)).toBe('9 February 2025');
  });
  it('counts whole calendar days, over a change of the clocks too', () => {
    expect(daysUntil('2026-03-03', now)).toBe(0);
    expect(daysUntil('2026-04-03', now)).toBe(31);
    expect(daysUntil('2026-03-01', now)).toBe(-2);
  });
  it('says how far a day is', () => {
    expect(
      ['2026-03-03', '2026-03-04', '2026-03-02', '2026-03-09', '2026-03-01'].map((day) =>
        distance(day, now),
      ),
    ).toEqual(['today', 'tomorrow', 'yesterday', 'in 6 days, 9 March', '2 days ago, 1 March']);
  });
  it('says a moment as near as it is', () => {
    expect(moment(new Date(2026, 2, 3, 16, 20).toISOString(), now)).toBe('16:20');
    expect(moment(new Date(2026, 2, 2, 18, 10).toISOString(), now)).toBe('yesterday, 18:10');
    expect(moment(new Date(2026, 1, 9, 8, 5).toISOString(), now)).toBe('9 February, 08:05');
    expect(dayOf(new Date(2026, 2, 3, 16, 20).toISOString(), now)).toBe('3 March');
  });
  it('ends a year on the day before', () => {
    expect(yearsOn('2026-01-12', 1)).toBe('2027-01-11');
  });
  it('counts a birthday from its own day on', () => {
    expect([age('2008-03-03', now), age('2008-03-04', now)]).toEqual([18, 17]);
  });
});
