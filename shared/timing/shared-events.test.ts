import { describe, expect, it } from 'vitest';
import { type EventTimes, isTie, tieClocks } from './shared-events.ts';
import { milliseconds } from './units.ts';

const at = (time: number, u = 6) => ({
  time: milliseconds(time),
  step: milliseconds(8),
  u: milliseconds(u),
});
const tied = (own: EventTimes, other: EventTimes) => {
  const tie = tieClocks(own, other);
  if (!isTie(tie)) throw new Error(tie.code);
  return (time: number) => tie.onOther(milliseconds(time));
};

describe('two clips of one lift', () => {
  const own = { 'foot-off': at(1000), top: at(3000), 'foot-down': at(5000) };
  const other = { 'foot-off': at(400), top: at(2420), 'foot-down': at(4400) };
  const map = tied(own, other);

  it('are mapped exactly at the moments both show, and straight between them', () => {
    expect(map(1000).time).toBe(400);
    expect(map(3000).time).toBe(2420);
    expect(map(5000).time).toBe(4400);
    expect(map(2000).time).toBe(1410);
    expect(map(4000).time).toBe(3410);
  });

  it('run alike before the first moment and after the last', () => {
    expect(map(250).time).toBe(-350);
    expect(map(6000).time).toBe(5400);
  });

  it('carry the uncertainty of each moment, less between two than at them', () => {
    const surer = tied({ ...own, top: at(3000, 8) }, { ...other, 'foot-off': at(400, 8) });
    const [off, top, down] = [10, 10, Math.hypot(6, 6)];
    expect(surer(1000).byEvent).toEqual([off, 0, 0]);
    expect(surer(3000).byEvent).toEqual([0, top, 0]);
    expect(surer(2000).byEvent).toEqual([off / 2, top / 2, 0]);
    expect(surer(3500).byEvent).toEqual([0, 0.75 * top, 0.25 * down]);
    expect(surer(9000).byEvent).toEqual([0, 0, down]);
    expect(surer(-9).byEvent).toEqual([off, 0, 0]);
  });

  it('may be tied by a clap and one moment, in whichever order they come', () => {
    const late = tied(
      { 'foot-off': at(0), clap: at(5000) },
      { 'foot-off': at(70), clap: at(5060) },
    );
    expect(late(5000).time).toBe(5060);
    const early = tied({ 'foot-off': at(900), clap: at(0) }, { 'foot-off': at(970), clap: at(60) });
    expect(early(0).time).toBe(60);
  });
});

describe('what cannot be tied', () => {
  it('has fewer than two moments in both clips', () => {
    expect(tieClocks({}, {})).toEqual({ code: 'few-shared-events', have: [] });
    expect(tieClocks({ top: at(1), clap: at(0) }, { top: at(1), 'foot-off': at(0) })).toEqual({
      code: 'few-shared-events',
      have: ['top'],
    });
    const nan = { ...at(0), time: milliseconds(NaN) };
    expect(tieClocks({ top: nan, clap: at(0) }, { top: at(1), clap: at(0) })).toMatchObject({
      have: ['clap'],
    });
  });

  it('shows its moments in another order, or two at once', () => {
    const own = { clap: at(0), 'foot-off': at(1000) };
    for (const time of [-500, 0])
      expect(tieClocks(own, { clap: at(0), 'foot-off': at(time) })).toEqual({
        code: 'events-out-of-order',
        events: ['clap', 'foot-off'],
      });
    expect(tieClocks({ clap: at(5), top: at(5) }, { clap: at(5), top: at(9) })).toMatchObject({
      code: 'events-out-of-order',
    });
  });

  it('takes longer in one clip than the steps of the frames explain: another lift', () => {
    const own = { 'foot-off': at(0), top: at(2000) };
    // one step of each clip, and 1.96 times the joint uncertainty of the four times
    const allowed = 16 + 1.96 * Math.hypot(6, 6, 6, 6);
    expect(isTie(tieClocks(own, { 'foot-off': at(0), top: at(2039) }))).toBe(true);
    expect(tieClocks(own, { 'foot-off': at(0), top: at(2040) })).toEqual({
      code: 'durations-differ',
      events: ['foot-off', 'top'],
      own: 2000,
      other: 2040,
      allowed,
    });
    expect(isTie(tieClocks(own, { 'foot-off': at(0), top: at(1960) }))).toBe(false);
  });
});
