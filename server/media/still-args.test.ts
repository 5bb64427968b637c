import { describe, expect, it } from 'vitest';
import { sheetJob, sheetTile, stillJob, type StillPlan } from './still-args.ts';

const plan: StillPlan = {
  source: { path: '/clips/a', demuxer: 'matroska', streamIndex: 0 },
  traits: { turned: { width: 1440, height: 1080 }, dynamicRange: 'standard', fullRange: false },
  timeBase: { num: 1, den: 1000 },
  upright: { width: 1920, height: 1080 },
  tick: 5033,
  format: 'jpeg',
  path: '/o/still.jpg',
  seek: true,
};

describe('an exact still', () => {
  it('takes the one frame that stands at the tick, at full size with square pixels', () => {
    const job = stillJob(plan);
    expect(job.graph).toBe(
      '[0:0]trim=start_pts=5033:end_pts=5034,scale=1920:1080,format=yuvj420p,setsar=1[still]',
    );
    expect(job.input.args.join(' ')).toContain(
      '-copyts -noaccurate_seek -seek_timestamp 1 -ss 5.023',
    );
    expect(job.outputs[0]?.args.join(' ')).toMatch(/-frames:v 1 .*-c:v mjpeg -q:v 2/);
  });

  it('reads from the start where seeking has not found the frame', () => {
    const { args } = stillJob({ ...plan, seek: false }).input;
    expect(args).toContain('-copyts');
    expect(args).not.toContain('-ss');
  });

  it('keeps every pixel as it is in a PNG', () => {
    const job = stillJob({ ...plan, format: 'png', upright: plan.traits.turned });
    expect(job.graph).toMatch(/,format=rgb24,setsar=1\[still\]$/);
    expect(job.graph).not.toContain('scale=');
    expect(job.outputs[0]?.args).toContain('png');
  });
});

describe('a sheet', () => {
  it('stays small enough for a phone to paint', () => {
    for (const copy of [
      { width: 1080, height: 1920 },
      { width: 1920, height: 1440 },
      { width: 1920, height: 1920 },
      { width: 320, height: 240 },
    ]) {
      const tile = sheetTile(copy);
      expect(tile.width * tile.height * 30).toBeLessThanOrEqual(16e6);
      expect(tile.width).toBeLessThanOrEqual(copy.width);
      expect(tile.width / tile.height).toBeCloseTo(copy.width / copy.height, 1);
    }
    expect(sheetTile({ width: 1080, height: 1920 })).toEqual({ width: 540, height: 960 });
  });

  it('cuts thirty frames out of the copy', () => {
    const job = sheetJob({
      benchCopy: '/o/bench.mp4',
      size: { width: 1080, height: 1920 },
      timeBase: { num: 1, den: 15360 },
      span: { from: 0, to: 14849 },
      path: '/o/sheet.jpg',
    });
    expect(job.graph).toBe('[0:0]trim=start_pts=0:end_pts=14849,scale=540:960,tile=6x5[sheet]');
  });
});
