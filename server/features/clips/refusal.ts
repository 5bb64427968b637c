import type { ClipWithFrames } from '#shared/contracts/clips.ts';
import { MediaRefusal, type MediaRefusalCode, refusalSentences } from '#server/media/refusals.ts';

const isCode = (code: string): code is MediaRefusalCode => code in refusalSentences;

/** The sentence of a stored refusal, told anew from its code and figures. */
export const presentRefusal = (
  code: string | null,
  figures: Record<string, string | number> | null,
): ClipWithFrames['refusal'] => {
  if (code === null || !isCode(code)) return null;
  const refusal = new MediaRefusal(code, figures ?? {});
  return { code, sentence: refusal.sentence, usablePartSeconds: refusal.usableSeconds };
};
