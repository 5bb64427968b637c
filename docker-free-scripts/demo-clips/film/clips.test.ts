import { execFileSync } from 'node:child_process';
import { readdirSync, statSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { CLIP_NAMES, loadTruth, parseTruth } from '#tests/fixtures/clips/truth.ts';
import { CLIPS } from '../clips.ts';
import { makeTake } from '../model/take.ts';
import { clipTruth } from '../model/truth.ts';
import { extendRuns, type Runs } from './film-clip.ts';
import { probedTimes } from './probe.ts';
import { INVENTED_PLACE } from './recipes.ts';

const home = fileURLToPath(new URL('../../../tests/fixtures/clips/', import.meta.url));

describe.each(CLIPS.map((clip) => [clip.name, clip] as const))(
  'committed clip %s',
  { timeout: 60_000 },
  (_name, clip) => {
    const truth = loadTruth(CLIP_NAMES.find((name) => name === clip.name) ?? 'right-early');

    it('has the truth that the model gives today', () => {
      const { frames, ...facts } = parseTruth(clipTruth(makeTake(clip)));
      const { frames: stored, ...storedFacts } = truth;
      expect(storedFacts).toEqual(facts);
      expect(stored.map((frame) => ({ ...frame, hidden: [] }))).toEqual(frames);
    });

    it('shows each frame at the time the truth gives', async () => {
      const times = await probedTimes(`${home}${clip.file}`);
      expect(times).toHaveLength(truth.frames.length);
      const apart = times.map((time, index) => Math.abs(time - (truth.frames[index]?.tMs ?? NaN)));
      expect(Math.max(...apart)).toBeLessThan(0.002);
    });
  },
);

describe('the phone’s file', () => {
  const said = execFileSync(
    'ffprobe',
    ['-v', 'error', '-show_streams', '-show_format', '-of', 'json', `${home}right-early.mov`],
    { encoding: 'utf8' },
  );

  it('lies on its side, is turned by its matrix, sounds, and names a place', () => {
    const file = JSON.parse(said);
    const [picture, sound] = file.streams;
    expect(picture).toMatchObject({ codec_name: 'hevc', width: 1920, height: 1080 });
    expect(picture.side_data_list[0].rotation).toBe(-90);
    expect(picture.r_frame_rate).not.toBe(picture.avg_frame_rate);
    expect(sound.codec_name).toBe('aac');
    expect(file.format.tags.location).toBe(INVENTED_PLACE);
  });
});

describe('all clips together', () => {
  it('stay under 8 MB', () => {
    const size = readdirSync(home)
      .filter((name) => /\.(mov|mp4|webm)$/.test(name))
      .reduce((sum, name) => sum + statSync(`${home}${name}`).size, 0);
    expect(size).toBeLessThan(8_000_000);
  });
});

describe('extendRuns', () => {
  it('joins frames in a row and begins anew after a gap', () => {
    const runs: Runs = {};
    for (const frame of [3, 4, 7]) extendRuns(runs, frame, ['belt-tip']);
    extendRuns(runs, 8, ['belt-tip', 'kneecap']);
    expect(runs).toEqual({
      'belt-tip': [
        [3, 4],
        [7, 8],
      ],
      kneecap: [[8, 8]],
    });
  });
});
