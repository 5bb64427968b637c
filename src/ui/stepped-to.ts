const TEN = 10;

/**
 * Where a key of the slider pattern leads; null for other keys.
 * @param bounds where Home and End lead; the ends of the slider unless told
 */
export const steppedTo = (
  key: string,
  at: number,
  count: number,
  bounds: { readonly start: number; readonly end: number } = { start: 0, end: count - 1 },
): number | null => {
  const to = {
    ArrowLeft: at - 1,
    ArrowDown: at - 1,
    ArrowRight: at + 1,
    ArrowUp: at + 1,
    PageUp: at + TEN,
    PageDown: at - TEN,
    Home: bounds.start,
    End: bounds.end,
  }[key];
  return to === undefined ? null : Math.max(0, Math.min(count - 1, to));
};
