const BROWSERS: readonly [RegExp, string][] = [
  [/Edg(A|iOS)?\//, 'Edge'],
  [/OPR\//, 'Opera'],
  [/SamsungBrowser\//, 'Samsung Internet'],
  [/(Firefox|FxiOS)\//, 'Firefox'],
  [/(Chrome|CriOS)\//, 'Chrome'],
  [/Safari\//, 'Safari'],
];
const SYSTEMS: readonly [RegExp, string][] = [
  [/iPhone/, 'iPhone'],
  [/iPad/, 'iPad'],
  [/Android/, 'Android'],
  [/Windows/, 'Windows'],
  [/Mac OS X/, 'Mac'],
  [/CrOS/, 'ChromeOS'],
  [/Linux/, 'Linux'],
];

const named = (list: readonly [RegExp, string][], text: string): string | undefined =>
  list.find(([pattern]) => pattern.test(text))?.[1];

/** 'Safari on iPhone': enough to tell one's own devices apart, and no more is kept of the user agent. */
export const deviceName = (userAgent: string | undefined): string => {
  const browser = named(BROWSERS, userAgent ?? '');
  const system = named(SYSTEMS, userAgent ?? '');
  if (browser === undefined) return 'A program';
  return system === undefined ? browser : `${browser} on ${system}`;
};
