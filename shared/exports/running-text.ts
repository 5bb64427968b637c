const SMALL = [
  'no',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
];
/** Counts up to twelve in words. */
export const inWords = (count: number): string => SMALL[count] ?? String(count);

export const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** The thigh at the upper gate as an eye sees it: `level`, or its lift. */
export const levelWords = (lift: number): string => (lift === 90 ? 'level' : `${lift}°`);
