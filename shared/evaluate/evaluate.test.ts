import { execFile } from 'node:child_process';
import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { degrees } from '#shared/geometry/units.ts';
import { type ReadingRules, STANDARD_RULES } from '#shared/protocol/protocol.ts';
import { deriveReading } from '#shared/reading/derive.ts';
import { goldenFiles } from './golden-files.ts';
import { linesOf } from './lines.ts';
import { readingInputOf, trialOf } from './trial.ts';

const golden = goldenFiles().find(({ id }) => id.startsWith('g09'));
if (!golden) throw new Error('g09 is missing');
const { reference: _reference, ...plain } = golden;
type Loose = Record<string, unknown>;
const changed = (change: (trial: Loose) => void): Loose => {
  const copy = JSON.parse(JSON.stringify(plain)) as Loose;
  change(copy);
  return copy;
};
const inputs = (trial: Loose) => trial.app_inputs as Loose;

describe('a trial', () => {
  const trial = trialOf(plain);

  it('takes its landmarks’ names by the side stood on', () => {
    expect(trial.supportSide).toBe('left');
    const marks = trial.reps[0]?.frames[0]?.marks;
    const raw = golden.reps[0]?.frames[0]?.marks;
    expect(marks?.['asis-support']).toMatchObject({
      point: { u: raw?.asisL?.[0], v: raw?.asisL?.[1] },
    });
    expect(Object.keys(marks ?? {})).toHaveLength(18);
  });

  it('keeps the file’s phases and adds nothing to the thigh pointer', () => {
    expect(trial.reps[0]?.labels?.filter((label) => label === 'quiet')).toHaveLength(5);
    expect(trial.reps[0]?.camera.thighPointerMm).toBe(182.52);
  });

  it('turns a set into an input of the engine', () => {
    expect(readingInputOf(trial, 'belt+prior', 1)).toMatchObject({
      set: 'belt',
      thighTurnsLittle: true,
      markError: { anatomicalPx: 3 },
    });
    expect(readingInputOf(trial, 'bare')).toMatchObject({ set: 'bare', thighTurnsLittle: false });
  });

  it('needs no reference and leaves unknown lengths unknown', () => {
    const without = trialOf(changed((copy) => delete inputs(copy).tip_len_mm));
    expect(without.reps[0]?.camera.beltPointerMm).toBeNull();
    const result = deriveReading(readingInputOf(without, 'belt'));
    expect(result.reps[0]?.why.map(({ code }) => code)).toContain('belt-pointer-length-missing');
  });

  it('takes a mark without a place as hidden', () => {
    const hidden = changed((copy) => {
      const [rep] = copy.reps as { frames: { marks: Loose }[] }[];
      const frame = rep?.frames[0];
      if (frame) frame.marks.tip = null;
    });
    expect(trialOf(hidden).reps[0]?.frames[0]?.marks['belt-tip']).toEqual({ hidden: true });
  });

  it.each([
    ['schema', (copy: Loose) => (copy.schema = 'other/1'), /schema must be 'redshank-trial\/1'/],
    ['stance', (copy: Loose) => (copy.stance = 'both'), /stance must be 'L' or 'R'/],
    ['reps', (copy: Loose) => delete copy.reps, /lacks 'reps'/],
    [
      'lens',
      (copy: Loose) => (inputs(copy).lens_h_mm = 'high'),
      /lens_h_mm must be a finite number/,
    ],
    ['view', (copy: Loose) => (inputs(copy).view = 'back'), /view must be 'front'/],
    [
      'marks',
      (copy: Loose) =>
        (copy.reps = [{ frames: [{ frame: 0, t_ms: 0, phase: 'rise', marks: { nose: [1, 2] } }] }]),
      /reps\[0\]\.frames\[0\]\.marks: 'nose' is not a mark/,
    ],
    [
      'phase',
      (copy: Loose) => (copy.reps = [{ frames: [{ frame: 0, t_ms: 0, phase: 'top', marks: {} }] }]),
      /phase must be 'quiet', 'rise' or 'lower'/,
    ],
    [
      'point',
      (copy: Loose) =>
        (copy.reps = [{ frames: [{ frame: 0, t_ms: 0, phase: 'rise', marks: { tip: [1] } }] }]),
      /marks\.tip must be \[u, v\]/,
    ],
  ])('that is wrong in its %s is named', (_name, change, message) => {
    expect(() => trialOf(changed(change))).toThrow(message);
    expect(linesOf(JSON.stringify(changed(change))).error).toMatch(message);
  });
});

describe('the lines', () => {
  it('give four sets of each trial, null where there is no usable rep', () => {
    const { lines, error } = linesOf(JSON.stringify(plain));
    expect(error).toBeNull();
    expect(lines.map(({ set }) => set)).toEqual(['bare', 'belt', 'belt+prior', 'belt+thigh']);
    for (const line of lines)
      expect(line).toMatchObject({
        id: 'g09_range_not_reached',
        reading: 'lift-stops-short',
        d: null,
        u: null,
        pEarly: null,
        mdt90: null,
      });
  });

  it('give figures where there is one', () => {
    const g05 = goldenFiles().find(({ id }) => id.startsWith('g05'));
    // the golden results are engine 1's
    const { lines } = linesOf(JSON.stringify(g05), 1);
    const line = lines.find(({ set }) => set === 'belt+thigh');
    expect(line?.reading).toBe('expected-turn-in');
    expect(Math.abs((line?.d ?? NaN) + 10.896)).toBeLessThan(0.3);
    expect(Math.abs((line?.u ?? NaN) / 2.628 - 1)).toBeLessThan(0.1);
    expect(line?.pEarly).toBeLessThan(0.03);
  });

  it('are read with the gates that are given', () => {
    const g05 = JSON.stringify(goldenFiles().find(({ id }) => id.startsWith('g05')));
    const changeOf = (rules?: ReadingRules) =>
      linesOf(g05, 1, rules).lines.find(({ set }) => set === 'belt+thigh')?.d ?? NaN;
    const narrower = changeOf({ ...STANDARD_RULES, gateFrom: degrees(65) });
    // it turns in all the way: over less lift by less
    expect(narrower).toBeLessThan(-5);
    expect(narrower).toBeGreaterThan(changeOf() + 0.5);
  });

  it('name what is not JSON', () => {
    expect(linesOf('{"id":').error).toMatch(/not JSON/);
    expect(linesOf('3').error).toMatch(/must be an object/);
  });
});

describe('the command', () => {
  let folder = '';
  const root = fileURLToPath(new URL('../../', import.meta.url));
  const run = (...args: readonly string[]) =>
    new Promise<{ readonly status: number; readonly out: string; readonly err: string }>(
      (resolve) => {
        execFile(
          process.execPath,
          ['--import', 'tsx', 'shared/evaluate/cli.ts', ...args],
          { cwd: root },
          (error, out, err) => {
            const code: unknown = error?.code ?? 0;
            resolve({ status: typeof code === 'number' ? code : -1, out, err });
          },
        );
      },
    );

  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), 'evaluate-'));
  });
  afterAll(() => rm(folder, { recursive: true }));

  it('does the rest of a file with a bad line, names it, and ends with status 1', async () => {
    const file = join(folder, 'trials.jsonl');
    const good = JSON.stringify(plain);
    await writeFile(file, `${good}\nnot a trial\n\n${good}\n`);
    const { status, out, err } = await run(file);
    const lines = out
      .trim()
      .split('\n')
      .map((line) => JSON.parse(line) as Loose);
    expect(lines).toHaveLength(9);
    expect(lines[4]).toMatchObject({ line: 2 });
    expect(lines[8]).toMatchObject({ set: 'belt+thigh', reading: 'lift-stops-short' });
    expect(err).toMatch(/^Line 2: /);
    expect(status).toBe(1);
  }, 60_000);

  it('ends with status 0 after good lines and says how it is called', async () => {
    const file = join(folder, 'good.jsonl');
    await writeFile(file, JSON.stringify(plain));
    expect((await run(file)).status).toBe(0);
    const none = await run();
    expect(none.status).toBe(2);
    expect(none.err).toMatch(/Usage/);
    expect((await run('--engine', '9', file)).status).toBe(2);
    expect((await run('--engine', '1', file)).status).toBe(0);
    const absent = await run(join(folder, 'absent.jsonl'));
    expect(absent.status).toBe(2);
    expect(absent.err).toMatch(/Cannot read the file/);
  }, 60_000);

  it('reads with a protocol’s file, and says what is wrong with one', async () => {
    const file = join(folder, 'one.jsonl');
    await writeFile(file, JSON.stringify(plain));
    const protocol = join(folder, 'own.json');
    // the trial stops at 80°: short of 90°, but not of 75°
    await writeFile(protocol, '{"gateFrom": 50, "gateTo": 75, "liftShort": 70}');
    const { status, out } = await run('--protocol', protocol, file);
    expect(status).toBe(0);
    expect(out).not.toContain('lift-stops-short');
    await writeFile(protocol, '{"gateFrom": 20}');
    const bad = await run('--protocol', protocol, file);
    expect(bad).toMatchObject({ status: 2, out: '' });
    expect(bad.err).toBe(`The protocol ${protocol}: gateFrom: Choose 45° to 80°.\n`);
    const absent = await run('--protocol', join(folder, 'absent.json'), file);
    expect(absent).toMatchObject({ status: 2, out: '' });
    expect(absent.err).toMatch(/^The protocol .*absent\.json: /);
  }, 60_000);
});
