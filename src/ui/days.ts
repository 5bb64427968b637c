/** Days and moments as people read them. Days are calendar days (`2026-03-03`), moments ISO 8601. */
const LOCALE = 'en-GB';

/** A calendar day at noon here, so that no time zone moves it. */
const atNoon = (day: string) => new Date(`${day}T12:00:00`);

const format = (date: Date, options: Intl.DateTimeFormatOptions) =>
  new Intl.DateTimeFormat(LOCALE, options).format(date);

/** Today here as a calendar day. */
export function today(now = new Date()): string {
  const two = (n: number) => String(n).padStart(2, '0');
  return `${now.getFullYear()}-${two(now.getMonth() + 1)}-${two(now.getDate())}`;
}

/** The calendar day so many days ago, here. */
export function dayBack(count: number): string {
  const day = new Date();
  day.setDate(day.getDate() - count);
  return today(day);
}

/** `3 March 2026` */
export const longDay = (day: string): string =>
  format(atNoon(day), { day: 'numeric', month: 'long', year: 'numeric' });

/** `3 March`, with the year where it is not this one. */
export const shortDay = (day: string, now = new Date()): string =>
  atNoon(day).getFullYear() === now.getFullYear()
    ? format(atNoon(day), { day: 'numeric', month: 'long' })
    : longDay(day);

/** `Tuesday, 3 March` */
export const weekday = (now = new Date()): string =>
  format(now, { weekday: 'long', day: 'numeric', month: 'long' }).replace(/^(\w+) /, '$1, ');

/** Whole calendar days from today; negative where the day has passed. */
export const daysUntil = (day: string, now = new Date()): number =>
  Math.round((atNoon(day).getTime() - atNoon(today(now)).getTime()) / 86_400_000);

/** A moment as near as it is: `16:20` today, `yesterday, 18:10`, `9 February, 18:10`. */
export function moment(at: string, now = new Date()): string {
  const date = new Date(at);
  const time = format(date, { hour: '2-digit', minute: '2-digit' });
  const days = -daysUntil(today(date), now);
  if (days === 0) return time;
  if (days === 1) return `yesterday, ${time}`;
  return `${shortDay(today(date), now)}, ${time}`;
}

/** The day of a moment here: `3 March`, with the year where it is not this one. */
export const dayOf = (at: string, now = new Date()): string => shortDay(today(new Date(at)), now);

/** `in 6 days, 9 March`, `tomorrow`, `today`, `2 days ago, 1 March`. */
export function distance(day: string, now = new Date()): string {
  const days = daysUntil(day, now);
  if (days === 0) return 'today';
  if (days === 1) return 'tomorrow';
  if (days === -1) return 'yesterday';
  return `${days > 0 ? `in ${days} days` : `${-days} days ago`}, ${shortDay(day, now)}`;
}

/** The day so many years on, one day short: a consent given on 12 January lasts until 11 January. */
export function yearsOn(day: string, years: number): string {
  const date = atNoon(day);
  date.setFullYear(date.getFullYear() + years);
  date.setDate(date.getDate() - 1);
  return today(date);
}

/** Whole years of age. */
export function age(birthDate: string, now = new Date()): number {
  const born = atNoon(birthDate);
  const years = now.getFullYear() - born.getFullYear();
  const had =
    now.getMonth() > born.getMonth() ||
    (now.getMonth() === born.getMonth() && now.getDate() >= born.getDate());
  return had ? years : years - 1;
}
