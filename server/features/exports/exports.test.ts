import { parse } from 'csv-parse/sync';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { goldenClip } from '#tests/support/golden.ts';
import { markedTrial } from '#tests/support/marked-trial.ts';
import { AuditEntry } from '../audit/audit-entry.entity.ts';
import { csvText } from './csv.ts';

describe('a CSV file', () => {
  // RFC 4180, section 2, rules 5 to 7: its own examples of quoting
  it('quotes line breaks, commas and quotes, and ends lines with CRLF', () => {
    expect(
      csvText(
        ['aaa', 'bbb'],
        [
          ['b\r\nbb', 'b"bb'],
          ['x,y', null],
        ],
      ),
    ).toBe('aaa,bbb\r\n"b\r\nbb","b""bb"\r\n"x,y",\r\n');
  });

  it('defuses text that a spreadsheet would run, and leaves numbers alone', () => {
    const rows = [['=1+1', '+x', '-x', '@x', ' =1', '\t=1', '＝1', -3.5]];
    expect(parse(csvText(['a', 'b', 'c', 'd', 'e', 'f', 'g', 'h'], rows), { from: 2 })).toEqual([
      ["'=1+1", "'+x", "'-x", "'@x", "' =1", "'\t=1", "'＝1", '-3.5'],
    ]);
  });
});

let api: Api;
let coach: Awaited<ReturnType<Api['as']>>;
let made: Awaited<ReturnType<typeof markedTrial>>;
let repId: string;
const golden = goldenClip('g01_early_big_thigh');

beforeAll(async () => {
  api = await startApi();
  coach = await api.as(api.world.coach);
  made = await markedTrial(api, coach, golden);
  const { body } = await coach.get(`/api/clips/${made.clip.id}/reps`).expect(200);
  repId = body.items[0].id;
  const add = (body: object) => coach.post(`/api/clips/${made.clip.id}/comments`).send(body);
  const first = await add({
    body: '=look here,\nat the "pelvis" <now>',
    fromFrame: golden.reps[0]?.startFrame,
    toFrame: golden.reps[0]?.startFrame,
    shape: { kind: 'ring', u: 500, v: 600, radius: 40 },
  }).expect(201);
  await add({ body: 'Yes.', fromFrame: 0, toFrame: 0, answerTo: first.body.id }).expect(201);
});
afterAll(() => api.close());

describe('the frames of a rep as a table', () => {
  it('are kept until somebody has said what they saw', async () => {
    for (const path of [`/api/reps/${repId}/frames.csv`, `/api/visits/${made.visit.id}/frames.csv`])
      expect((await coach.get(path).expect(409)).body.code).toBe('call-first');
  });

  it('hold every marked frame with its values, their ±, and the marks as they were placed', async () => {
    await coach.post(`${made.side}/call`).send({ seen: 'early', confidence: 'sure' }).expect(201);
    const answer = await coach.get(`/api/reps/${repId}/frames.csv`).expect(200);
    expect(answer.get('content-type')).toBe('text/csv; charset=utf-8');
    expect(answer.get('content-disposition')).toMatch(
      /^attachment; filename=\d{4}-\d\d-\d\d-rep-1\.csv$/,
    );
    const rows = parse<Record<string, string>>(answer.text, { columns: true });
    const trialRep = golden.trial.reps[0];
    expect(rows).toHaveLength(trialRep?.frames.length ?? NaN);
    const [row] = rows;
    const mark = golden.reps[0]?.commands.find(({ landmark }) => landmark === 'asis-support');
    expect(row).toMatchObject({
      rep: '1',
      support_side: golden.trial.supportSide,
      landmark_set: 'belt+thigh',
      phase: 'quiet',
      asis_support_source: 'hand',
      asis_support_u_px: String(mark?.set.to === 'point' ? Number(mark.set.u.toFixed(2)) : NaN),
    });
    expect(Number(row?.time_s)).toBeCloseTo(Number(row?.frame) / 60, 5);
    // quiet stance is where the turn is counted from
    const quiet = rows
      .filter(({ phase }) => phase === 'quiet')
      .map((each) => Number(each.turn_deg));
    expect(quiet.reduce((sum, turn) => sum + turn, 0) / quiet.length).toBeCloseTo(0, 1);
    const highest = Math.max(...rows.map((each) => Number(each.lift_deg)));
    expect(highest).toBeGreaterThan(85);
    expect(Number(row?.turn_deg_pm)).toBeGreaterThan(0);
    // unknown is an empty cell with its reason
    expect(row).toMatchObject({
      pelvic_tilt_deg: '',
      pelvic_tilt_deg_missing: 'view-cannot-show-it',
    });
  });

  it('of a visit are those of its reps, one after the other', async () => {
    const answer = await coach.get(`/api/visits/${made.visit.id}/frames.csv`).expect(200);
    const rows = parse<Record<string, string>>(answer.text, { columns: true });
    expect(new Set(rows.map(({ rep }) => rep)).size).toBe(golden.trial.reps.length);
    expect(rows).toHaveLength(
      golden.trial.reps.reduce((sum, { frames }) => sum + frames.length, 0),
    );
  });
});

describe('annotations', () => {
  it('of a rep name it, each of its marks, and the comments on it', async () => {
    const answer = await coach.get(`/api/reps/${repId}/annotations.jsonld`).expect(200);
    expect(answer.get('content-type')).toBe('application/ld+json; charset=utf-8');
    const collection = JSON.parse(answer.text);
    const items: { motivation: string; id: string }[] = collection.first.items;
    const count = (motivation: string) =>
      items.filter((item) => item.motivation === motivation).length;
    expect(collection.total).toBe(items.length);
    expect(count('describing')).toBe(1);
    expect(count('identifying')).toBe(golden.reps[0]?.commands.length);
    expect(count('commenting')).toBe(1);
    expect(count('replying')).toBe(1);
    expect(new Set(items.map(({ id }) => id)).size).toBe(items.length);
    expect(answer.text).toContain(
      `"source": "http://redshank.test/api/clips/${made.clip.id}/video"`,
    );
  });

  it('of a visit hold those of all its clips', async () => {
    const answer = await coach.get(`/api/visits/${made.visit.id}/annotations.jsonld`).expect(200);
    const marks = golden.reps.reduce((sum, { commands }) => sum + commands.length, 0);
    expect(JSON.parse(answer.text).total).toBe(golden.reps.length + marks + 2);
  });
});

describe('the comment track', () => {
  it('has a cue for each comment', async () => {
    const answer = await coach.get(`/api/clips/${made.clip.id}/comments.vtt`).expect(200);
    expect(answer.get('content-type')).toBe('text/vtt; charset=utf-8');
    expect(answer.text).toMatch(/^WEBVTT\n/);
    expect(answer.text.match(/-->/g)).toHaveLength(2);
    expect(answer.text).toContain('=look here,\nat the "pelvis" &lt;now&gt;');
  });
});

it('each export is written down without a name', async () => {
  const entries = await api.ground.inPractice(api.world.owner, ({ em }) =>
    em.find(AuditEntry, { action: { $like: '%.export' } }),
  );
  expect(new Set(entries.map(({ action }) => action))).toEqual(
    new Set(['rep.export', 'visit.export', 'clip.export']),
  );
  expect(JSON.stringify(entries.map(({ detail }) => detail))).not.toContain('Robin');
});
