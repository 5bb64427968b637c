/** Why a file is not taken, and what the person can do about it. */

/** Figures that the sentences need; each refusal carries its own. */
export interface RefusalFigures {
  empty: Record<never, never>;
  'not-a-video': Record<never, never>;
  'wrong-extension': { extension: string; found: string };
  'still-image': { found: string };
  playlist: { found: string };
  'unsupported-container': { found: string };
  'unsupported-codec': { codec: string };
  'header-missing': Record<never, never>;
  'only-header': Record<never, never>;
  truncated: { haveSeconds: number; expectedSeconds: number };
  damaged: { fromSeconds: number; lostFrames: number; frames: number };
  'sound-only': Record<never, never>;
  'cover-only': Record<never, never>;
  'one-frame': Record<never, never>;
  'no-timestamps': Record<never, never>;
  'absurd-size': { width: number; height: number; maxLongEdge: number; maxMegapixels: number };
  'too-large': { bytes: number; maxBytes: number };
  'too-long': { frames: number; maxFrames: number; seconds: number; maxSeconds: number };
  'part-outside': { from: number; to: number; seconds: number };
  'too-costly': Record<never, never>;
}

export type MediaRefusalCode = keyof RefusalFigures;
