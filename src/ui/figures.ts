import { decimal } from '#shared/exports/figures.ts';
import { capital, inWords } from '#shared/exports/running-text.ts';

export { decimal, degrees, plusMinus, turn } from '#shared/exports/figures.ts';
export { capital, inWords };

/** `once`, `twice`, `three times`, `14 times` */
export const howOften = (count: number): string =>
  count === 1 ? 'once' : count === 2 ? 'twice' : `${inWords(count)} times`;

/** A file's size: `211 MB`, `1.8 GB`. */
export function fileSize(bytes: number): string {
  if (bytes < 1e3) return `${bytes} bytes`;
  if (bytes < 1e6) return `${Math.round(bytes / 1e3)} kB`;
  if (bytes < 1e9) return `${(bytes / 1e6).toFixed(bytes < 1e7 ? 1 : 0)} MB`;
  return `${(bytes / 1e9).toFixed(1)} GB`;
}

/** A short stretch of time left, rounded so that it does not jump about: `about 50 s`, `about 3 min`. */
export function roughly(seconds: number): string {
  if (seconds < 8) return 'a few seconds';
  if (seconds < 90) return `about ${Math.ceil(seconds / 10) * 10} s`;
  if (seconds < 3600) return `about ${Math.round(seconds / 60)} min`;
  return `about ${decimal(seconds / 3600)} h`;
}

/** A body height or a distance in metres: `1.74 m`. */
export const metres = (mm: number): string => `${(mm / 1000).toFixed(2)} m`;
