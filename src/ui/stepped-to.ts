const TEN = 10;

/** Where a key of the slider pattern leads; null for other keys. */
export const steppedTo = (key: string, at: number, count: number): number | null => {
  const to = {
    ArrowLeft: at - 1,
    ArrowDown: at - 1,
    ArrowRight: at + 1,
    ArrowUp: at + 1,
    PageUp: at + TEN,
    PageDown: at - TEN,
    Home: 0,
    End: count - 1,
  }[key];
  return to === undefined ? null : Math.max(0, Math.min(count - 1, to));
};
