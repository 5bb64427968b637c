import { describe, expect, it } from 'vitest';
import { MADE_LIFTS, madeRep } from '#shared/evaluate/made-rep.ts';
import type { RepInput } from '#shared/course/types.ts';
import type { Mark } from '#shared/landmarks/types.ts';
import { ASSUMED_MARK_ERROR } from '#shared/measures/inputs.ts';
import { FRAME_COLUMNS, frameRows } from './frame-rows.ts';

const made = madeRep('left', (lift) => 0.2 * Math.max(0, lift - 60));

/** The rows of a rep, each a record of its columns. */
const rowsOf = (input: RepInput) =>
  frameRows({
    input,
    set: 'belt+thigh',
    markError: ASSUMED_MARK_ERROR,
    visitDay: '2026-11-02',
    clip: 'front.mp4',
    number: 2,
  }).map((row) => {
    expect(row).toHaveLength(FRAME_COLUMNS.length);
    return Object.fromEntries(FRAME_COLUMNS.map((name, i) => [name, row[i]]));
  });

const withMark = (id: 'kneecap', change: (mark: Mark) => Mark | undefined): RepInput => ({
  ...made,
  frames: made.frames.map((frame) => {
    const { [id]: mark, ...marks } = frame.marks;
    const changed = mark && change(mark);
    return { ...frame, marks: changed ? { ...marks, [id]: changed } : marks };
  }),
});

describe('the rows of a rep', () => {
  const rows = rowsOf(made);

  it('are one for each marked frame, with where it stands', () => {
    expect(rows).toHaveLength(made.frames.length);
    expect(new Set(FRAME_COLUMNS).size).toBe(FRAME_COLUMNS.length);
    expect(rows[5]).toMatchObject({
      visit_day: '2026-11-02',
      clip: 'front.mp4',
      rep: 2,
      support_side: 'left',
      view: 'front',
      landmark_set: 'belt+thigh',
      rep_left_out: null,
      frame: 15,
      time_s: 0.25,
      phase: 'quiet',
    });
  });

  it('hold each measure with its ± and, where it is unknown, why', () => {
    const row = rows[MADE_LIFTS.indexOf(90)];
    expect(Math.abs(Number(row?.lift_deg) - 90)).toBeLessThan(2);
    expect(Number(row?.lift_deg_pm)).toBeGreaterThan(2);
    expect(Math.abs(Number(row?.turn_deg) - 6)).toBeLessThan(1);
    expect(row?.turn_deg_missing).toBeNull();
    expect(row?.pelvic_tilt_deg).toBeNull();
    expect(row?.pelvic_tilt_deg_missing).toBe('view-cannot-show-it');
    expect(rows[0]?.lifted_shank_swing_deg_missing).toBe('only-between-lifts');
  });

  it('hold the marks in pixels and who placed them', () => {
    expect(rows[0]).toMatchObject({ kneecap_source: 'hand', psis_source: null, psis_u_px: null });
    const hidden = rowsOf(withMark('kneecap', () => ({ hidden: true })))[0];
    expect(hidden).toMatchObject({ kneecap_u_px: null, kneecap_source: 'hidden' });
    const tracked = (looked: boolean) =>
      rowsOf(
        withMark('kneecap', (mark) =>
          mark.hidden ? mark : { ...mark, source: 'tracked' as const, looked },
        ),
      )[0]?.kneecap_source;
    expect(tracked(false)).toBe('tracked-not-looked-at');
    expect(tracked(true)).toBe('tracked');
  });

  it('say why nothing is measured without a scale, and keep the marks', () => {
    const row = rowsOf({ ...made, camera: { ...made.camera, mmPerPx: null } })[0];
    expect(row).toMatchObject({ phase: null, lift_deg: null, lift_deg_missing: 'scale-missing' });
    expect(row?.kneecap_u_px).toBeTypeOf('number');
  });

  it('keep a rep that is left out, with its reason', () => {
    expect(rowsOf({ ...made, excluded: 'hopped' })[0]?.rep_left_out).toBe('hopped');
  });
});
