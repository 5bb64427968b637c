import type { OverlayRole } from './types.ts';

/**
 * Sizes in pixels of the output, the same at any zoom. A painter multiplies them by its own scale
 * (device pixel ratio, or the output's height over 900 for a burned-in clip).
 */
export const OVERLAY_SIZES = {
  line: 1.5,
  tracked: 1.25,
  mark: 2.4,
  /** Dark edge on each side of a stroke: orange on skin alone is 1.2 : 1. */
  halo: 2.25,
  ringRadius: 6.25,
  diamondHalf: 7.5,
  bracketHalf: 6.5,
  /** How far a bracket's ends turn in. */
  bracketLip: 3.5,
  dot: 1.6,
  nextRadius: 14,
  text: 16,
  textGap: 14,
} as const;

/** Dash and gap, output pixels. */
export const OVERLAY_DASHES = { tracked: [3, 2.5], next: [4, 3.5] } as const;

/** Colours on the dusk around and over the clip. Shape always doubles colour. */
export const OVERLAY_COLOURS = {
  support: '#FF8A5E',
  lifted: '#6CC6D4',
  midline: '#EDEBE2',
  note: '#FFFFFF',
} as const satisfies Record<OverlayRole, string>;
export const OVERLAY_HALO = 'rgba(18, 23, 21, 0.82)';
export const OVERLAY_NEXT = '#FFFFFF';
