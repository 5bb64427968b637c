import { describe, expect, it } from 'vitest';
import { CLIP_NAMES, loadTruth } from '../../../tests/fixtures/clips/truth.ts';
import { stillOf, takeOf } from '../../../tests/fixtures/takes/film.ts';
import { dotsOn } from './dots.ts';
import { seeTake } from './judge-take.ts';

/** Decoding the films waits its turn on a busy machine. */
const PATIENCE_MS = 300_000;
/** Trusts that a picture lies up to a tenth of a second off on each side. */
const PICTURE_S = 0.1;

describe('every demo film will do', { timeout: PATIENCE_MS }, () => {
  it.each(CLIP_NAMES)('%s: body, floor, still stance, rise and dots', async (name) => {
    const truth = loadTruth(name);
    const { judged, movement } = seeTake(await takeOf(truth.file));
    const { head, feet, still, rise } = judged;
    expect([head.told, feet.told, still.told, rise.told]).toEqual(['yes', 'yes', 'yes', 'yes']);

    const [rep] = truth.reps;
    const secondsAt = (frame = NaN): number => (truth.frames[frame]?.tMs ?? NaN) / 1000;
    const stood = secondsAt(rep?.quietFrames[1]);
    const rose = secondsAt(rep?.topFrame) - stood;
    if (still.told === 'cannot-tell' || rise.told === 'cannot-tell') throw new Error('not told');
    expect(Math.abs(still.seconds - stood)).toBeLessThanOrEqual(1.5 * PICTURE_S);
    expect(Math.abs(rise.seconds - rose)).toBeLessThanOrEqual(3 * PICTURE_S);

    if (!movement) throw new Error('nobody moves');
    const dots = dotsOn(movement, await stillOf(truth.file));
    expect(dots.told).toBe('yes');
  });
});

describe('takes that were spoiled on purpose', { timeout: PATIENCE_MS }, () => {
  const told = async (...filters: string[]) => {
    const { head, feet, still, rise } = seeTake(await takeOf('right-still.mp4', ...filters)).judged;
    return [head, feet, still, rise].map((answer) => answer.told);
  };

  it('feet cut off', async () => {
    expect(await told('crop=864:1536:108:0')).toEqual(['yes', 'no', 'yes', 'yes']);
  });

  it('head cut off', async () => {
    expect(await told('crop=740:1316:170:600')).toEqual(['no', 'yes', 'yes', 'yes']);
  });

  it('filming began in the middle of the first lift', async () => {
    const { still } = seeTake(
      await takeOf('right-still.mp4', 'trim=start=2.2', 'setpts=PTS-STARTPTS'),
    ).judged;
    expect(still).toEqual({ told: 'no', seconds: 0 });
  });

  it('still for half a second only', async () => {
    const { still } = seeTake(
      await takeOf('right-still.mp4', 'trim=start=1.1', 'setpts=PTS-STARTPTS'),
    ).judged;
    expect(still.told).toBe('no');
    expect(still.told === 'no' && still.seconds).toBeCloseTo(0.5, 0);
  });

  it('swung up in a quarter of the time', async () => {
    const quick = "setpts='if(lt(T,1.5),PTS,(1.5+(T-1.5)/4)/TB)'";
    const { rise } = seeTake(await takeOf('right-still.mp4', quick)).judged;
    expect(rise.told).toBe('no');
    expect(rise.told === 'no' && rise.seconds).toBeLessThan(0.9);
  });

  it('no dots', async () => {
    const { movement } = seeTake(await takeOf('bare-still.webm'));
    if (!movement) throw new Error('nobody moves');
    const bare = await stillOf('../takes/no-stickers.jpg');
    expect(dotsOn(movement, bare)).toEqual({ told: 'no', dots: 0 });
  });
});

describe('what cannot be told is not guessed', { timeout: PATIENCE_MS }, () => {
  it('a phone held by hand', async () => {
    const shake = 'crop=1000:1778:40+30*sin(t*7):70+30*sin(t*9)';
    const { judged } = seeTake(await takeOf('right-still.mp4', shake));
    for (const answer of Object.values(judged))
      expect(answer).toEqual({ told: 'cannot-tell', why: 'camera-moved' });
  });

  it('the tips of pointers alone, which are as round as dots', async () => {
    const { movement } = seeTake(await takeOf('right-still.mp4'));
    if (!movement) throw new Error('nobody moves');
    const pointers = await stillOf('../takes/pointers-only.jpg');
    expect(dotsOn(movement, pointers)).toEqual({ told: 'cannot-tell', why: 'few-round' });
  });

  it('a picture too small for stickers', async () => {
    const { movement } = seeTake(await takeOf('right-still.mp4'));
    const small = await stillOf('right-still.mp4');
    const half = {
      ...small,
      width: 540,
      height: 960,
      data: small.data.slice(0, 540 * 960),
      stride: 540,
    };
    if (!movement) throw new Error('nobody moves');
    expect(dotsOn(movement, half)).toEqual({ told: 'cannot-tell', why: 'too-coarse' });
  });

  it('a still room, and too few pictures', async () => {
    const pictures = await takeOf('right-still.mp4');
    expect(seeTake(pictures.slice(0, 14)).judged.rise).toEqual({
      ...{ told: 'cannot-tell', why: 'no-lift' },
    });
    expect(seeTake(pictures.slice(0, 5)).judged.rise).toEqual({
      ...{ told: 'cannot-tell', why: 'too-few-pictures' },
    });
  });

  it('noise and a flicker of the light change no answer', async () => {
    const noisy = ['noise=alls=20:allf=t', "eq=eval=frame:brightness='0.04*sin(9*t)'"];
    const { judged } = seeTake(await takeOf('right-still.mp4', ...noisy));
    expect(Object.values(judged).map((answer) => answer.told)).toEqual([
      ...['yes', 'yes', 'yes', 'yes'],
    ]);
  });
});
