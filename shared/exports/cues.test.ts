import { WebVTTParser } from 'webvtt-parser';
import entities from 'webvtt-parser/html-entities.json' with { type: 'json' };
import { describe, expect, it } from 'vitest';
import { milliseconds } from '#shared/timing/units.ts';
import { type Cue, webVtt } from './cues.ts';

const cue = (changes: Partial<Cue> & { from?: number; to?: number | null }): Cue => ({
  id: 'a',
  speaker: 'Ines Holm',
  text: 'Watch the pelvis here.',
  ...changes,
  span: {
    from: milliseconds(changes.from ?? 1000),
    to: changes.to === null ? null : milliseconds(changes.to ?? 4000),
  },
});

/** The working group's own validator, which reports every fault. */
const read = (text: string) =>
  new WebVTTParser(entities).parse(text, 'subtitles/captions/descriptions');

describe('comments as WebVTT', () => {
  it('is valid, in the order of the clip, with who speaks', () => {
    const text = webVtt([cue({ id: 'b', from: 5000, to: 9000 }), cue({ id: 'a' })]);
    const { cues, errors } = read(text);
    expect(errors).toEqual([]);
    expect(cues.map(({ id, startTime, endTime }) => [id, startTime, endTime])).toEqual([
      ['a', 1, 4],
      ['b', 5, 9],
    ]);
    expect(cues[0]?.tree.children).toEqual([
      expect.objectContaining({ type: 'object', name: 'v', value: 'Ines Holm' }),
    ]);
  });

  it('keeps words that look like markup, arrows and blank lines as words', () => {
    const { cues, errors } = read(
      webVtt([cue({ text: 'lift <60° & hold\n\n00:01 --> 00:02\r\n\r\nthen >90°' })]),
    );
    expect(errors).toEqual([]);
    expect(cues).toHaveLength(1);
    const [voice] = cues[0]?.tree.children ?? [];
    expect(voice?.children?.map(({ value }) => value).join('')).toBe(
      'lift <60° & hold\n00:01 --> 00:02\nthen >90°',
    );
  });

  it('shows a comment on one frame, the last one too, long enough to be read', () => {
    const { cues } = read(webVtt([cue({ from: 1000, to: 1017 }), cue({ from: 6000, to: null })]));
    expect(cues.map(({ startTime, endTime }) => [startTime, endTime])).toEqual([
      [1, 3],
      [6, 8],
    ]);
  });

  it('writes hours, and the millisecond that the format has', () => {
    expect(webVtt([cue({ from: 3_723_004.4, to: 3_730_000 })])).toContain(
      '01:02:03.004 --> 01:02:10.000',
    );
  });

  it('is an empty track without comments', () => {
    expect(webVtt([])).toBe('WEBVTT\n');
    expect(read(webVtt([])).errors).toEqual([]);
  });
});
