import { milliseconds, type Milliseconds } from '#shared/timing/units.ts';
import type { ClipSpan } from './media-fragment.ts';

/** One comment as a cue. */
export interface Cue {
  readonly id: string;
  readonly span: ClipSpan;
  readonly speaker: string;
  readonly text: string;
}

const padded = (value: number, places: number): string => String(value).padStart(places, '0');

/** Rounded to the millisecond that the format has. */
const timestamp = (time: Milliseconds): string => {
  const all = Math.round(time);
  const ms = all % 1000;
  const seconds = Math.floor(all / 1000);
  const [h, m, s] = [Math.floor(seconds / 3600), Math.floor(seconds / 60) % 60, seconds % 60];
  return `${padded(h, 2)}:${padded(m, 2)}:${padded(s, 2)}.${padded(ms, 3)}`;
};

/** A comment on one frame would flash by: it stays as long as it takes to read. */
export const LEAST_SHOWN_MS = 2000;

const escaped = (text: string): string =>
  text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;');

/** A blank line would end the cue. */
const block = (text: string): string =>
  escaped(text)
    .split(/\r\n|\n|\r/)
    .map((line) => line.trim())
    .filter((line) => line !== '')
    .join('\n');

/** WebVTT (W3C): cues by where they start; who speaks stands in a voice tag. */
export const webVtt = (cues: readonly Cue[]): string => {
  const blocks = [...cues]
    .sort((a, b) => a.span.from - b.span.from)
    .map(({ id, span, speaker, text }) => {
      const end = milliseconds(Math.max(span.to ?? span.from, span.from + LEAST_SHOWN_MS));
      const who = escaped(speaker.replace(/\s+/g, ' ').trim());
      return `${id}\n${timestamp(span.from)} --> ${timestamp(end)}\n<v ${who}>${block(text)}</v>\n`;
    });
  return ['WEBVTT\n', ...blocks].join('\n');
};
