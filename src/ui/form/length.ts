/** Lengths are kept in millimetres and typed in the unit people use for them. */
export type LengthUnit = 'mm' | 'cm' | 'm';
const MM: Record<LengthUnit, number> = { mm: 1, cm: 10, m: 1000 };
/** Digits after the point, so that a whole millimetre is kept. */
const DIGITS: Record<LengthUnit, number> = { mm: 0, cm: 1, m: 3 };

/** What stands in the field; nothing for a length that is not known. */
export function writeLength(mm: number | null | undefined, unit: LengthUnit): string {
  if (mm === null || mm === undefined || Number.isNaN(mm)) return '';
  return String(Number((mm / MM[unit]).toFixed(DIGITS[unit])));
}

/** Millimetres; null for an empty field, NaN for what is no number. A decimal comma is read too. */
export function readLength(text: string, unit: LengthUnit): number | null {
  const trimmed = text.trim().replace(',', '.');
  if (trimmed === '') return null;
  if (!/^\d+(\.\d+)?$/.test(trimmed)) return Number.NaN;
  return Math.round(Number(trimmed) * MM[unit] * 10) / 10;
}

/** A contract speaks of millimetres; the field's fault in the field's unit: `At least 70 cm.` */
export const inUnit = (message: string, unit: LengthUnit): string =>
  message.replace(
    /(\d+(?:\.\d+)?) mm/g,
    (_, mm: string) => `${writeLength(Number(mm), unit)} ${unit}`,
  );
