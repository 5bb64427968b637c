/** A calendar day, ISO 8601, as the server's clock has it in UTC; clients send the day they mean. */
export const dayOf = (moment: Date): string => moment.toISOString().slice(0, 10);
export const today = (): string => dayOf(new Date());

const ADULT_AT = 18;

/** Whoever was born on this day or before, compared as text, is of age. */
export const adultIfBornBy = (on: string): string =>
  `${String(Number(on.slice(0, 4)) - ADULT_AT).padStart(4, '0')}${on.slice(4)}`;

/** Under 18 on this day. Born on 29 February, a person comes of age on 1 March of a common year. */
export const isMinor = (birthDate: string, on: string = today()): boolean =>
  birthDate > adultIfBornBy(on);

/** Whole days later. */
export const daysLater = (day: string, count: number): string =>
  dayOf(new Date(Date.parse(`${day}T00:00:00Z`) + count * 86_400_000));
