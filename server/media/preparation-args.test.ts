import { describe, expect, it } from 'vitest';
import { commandLine } from './ffmpeg-job.ts';
import { planCopies } from './plan-copies.ts';
import { preparationJob, type PreparationPlan } from './preparation-args.ts';

const plan: PreparationPlan = {
  source: { path: '/clips/a', demuxer: 'mov', streamIndex: 1 },
  traits: { turned: { width: 1080, height: 1920 }, dynamicRange: 'standard', fullRange: false },
  timeBase: { num: 1, den: 600 },
  copies: planCopies({ width: 1080, height: 1920 }, 300, 60),
  span: null,
  threads: 1,
  paths: { bench: '/o/b.mp4', replay: '/o/r.mp4', poster: '/o/p.jpg', strip: '/o/s.jpg' },
};
const after = (words: readonly string[], flag: string) => words[words.indexOf(flag) + 1];
const [bench, replay] = preparationJob(plan).outputs.map((output) => output.args);

describe('preparation', () => {
  it('opens only local files, by the demuxer that the content calls for', () => {
    const words = commandLine(preparationJob(plan));
    const input = words.slice(0, words.indexOf('-i'));
    expect(after(input, '-protocol_whitelist')).toBe('file');
    expect(after(input, '-format_whitelist')).toBe('mov,matroska');
    expect(after(input, '-f')).toBe('mov');
    expect(after(words, '-i')).toBe('/clips/a');
    expect(input).toContain('-nostdin');
    // an option that holds a space would be split by the package behind the adapter
    expect(words.some((word) => word.includes(' '))).toBe(false);
  });

  it('decodes once and scales each picture from the next larger one', () => {
    const { graph, outputs } = preparationJob(plan);
    expect(graph.split(';')).toEqual([
      '[0:1]setpts=PTS-STARTPTS,format=yuv420p,setsar=1,split=2[bench][r]',
      '[r]scale=540:960:flags=bilinear,setsar=1,split=3[replay][p][s]',
      `[p]select='eq(n,0)+eq(n,150)',scale=360:640,setsar=1,settb=1/1,setpts=N[poster]`,
      expect.stringMatching(
        /^\[s\]select='eq\(n,0\)\+eq\(n,6\)\+.*tile=24x1:overlap=23:init_padding=23,select='eq\(n,0\)\+eq\(n,24\)'\[strip\]$/,
      ),
    ]);
    expect(outputs.map((output) => output.path)).toEqual([
      '/o/b.mp4',
      '/o/r.mp4',
      '/o/p.jpg',
      '/o/s.jpg',
    ]);
  });

  it('keeps every frame on the original’s own clock, in both copies', () => {
    for (const args of [bench ?? [], replay ?? []]) {
      expect(after(args, '-fps_mode')).toBe('passthrough');
      expect(after(args, '-enc_time_base')).toBe('1:600');
      expect(after(args, '-bf')).toBe('0');
      expect(after(args, '-movflags')).toBe('+faststart');
      expect(after(args, '-map_metadata')).toBe('-1');
      expect(after(args, '-map_chapters')).toBe('-1');
    }
  });

  it('makes short clips all intra and longer ones with a key frame in five', () => {
    expect(after(bench ?? [], '-g')).toBe('1');
    const long = { ...plan, copies: planCopies({ width: 1080, height: 1920 }, 601, 60) };
    const args = preparationJob(long).outputs[0]?.args ?? [];
    expect(after(args, '-g')).toBe('5');
    expect(after(args, '-sc_threshold')).toBe('0');
    expect(after(replay ?? [], '-g')).toBe('60');
  });

  it('cuts a part by whole ticks of the original', () => {
    const job = preparationJob({ ...plan, span: { from: 1200, to: 1800 } });
    expect(job.graph).toMatch(/^\[0:1\]trim=start_pts=1200:end_pts=1800,setpts=PTS-STARTPTS,/);
    expect(after(job.input.args, '-ss')).toBe('1.990000');
    expect(job.input.args).toContain('-copyts');
    expect(job.input.args).toContain('-noaccurate_seek');
    const start = preparationJob({ ...plan, span: { from: 0, to: 600 } });
    expect(start.input.args).not.toContain('-ss');
  });

  it('maps high dynamic range after scaling and says so in the copies', () => {
    const job = preparationJob({
      ...plan,
      traits: { turned: { width: 2160, height: 3840 }, dynamicRange: 'pq', fullRange: false },
    });
    expect(job.graph).toMatch(
      /scale=1080:1920,zscale=tin=smpte2084:.*tonemap=.*format=yuv420p,setsar=1,split/,
    );
    expect(after(job.outputs[0]?.args ?? [], '-color_trc')).toBe('bt709');
  });

  it('brings the full range back to the one that players expect', () => {
    const job = preparationJob({ ...plan, traits: { ...plan.traits, fullRange: true } });
    expect(job.graph).toContain('scale=1080:1920:in_range=pc:out_range=tv');
    expect(after(job.outputs[0]?.args ?? [], '-color_range')).toBe('tv');
  });

  it('bounds the threads of decoding and of each copy', () => {
    const job = preparationJob({ ...plan, threads: 2 });
    expect(after(job.input.args, '-threads')).toBe('2');
    expect(job.outputs.slice(0, 2).map(({ args }) => after(args, '-threads'))).toEqual(['2', '2']);
  });
});

describe('the plan of the copies', () => {
  it.each([
    [{ width: 2160, height: 3840 }, 300, { width: 1080, height: 1920, gop: 1 }],
    [{ width: 640, height: 480 }, 300, { width: 640, height: 480, gop: 1 }],
    [{ width: 1081, height: 721 }, 300, { width: 1080, height: 720, gop: 1 }],
    [{ width: 1080, height: 1920 }, 600, { width: 1080, height: 1920, gop: 1 }],
    [{ width: 1080, height: 1920 }, 601, { width: 1080, height: 1920, gop: 5 }],
    // 7,200 frames of 1080p would weigh some 500 MB
    [{ width: 1080, height: 1920 }, 7200, { width: 720, height: 1280, gop: 5 }],
  ])('%o with %i frames', (upright, frames, bench) => {
    expect(planCopies(upright, frames, 60).bench).toEqual(bench);
  });

  it('shows each frame of a very short clip once in the strip', () => {
    const { strip, poster } = planCopies({ width: 1080, height: 1920 }, 3, 30);
    expect(strip.frames).toEqual([0, 1, 2]);
    expect(poster.frame).toBe(1);
    expect(strip.tile).toEqual({ width: 68, height: 120 });
  });
});
