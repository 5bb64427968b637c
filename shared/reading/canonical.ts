/**
 * One text for one value: object keys sorted, absent and undefined members alike left out, −0 as 0,
 * numbers in their shortest exact form, and numbers that are not finite by name (plain JSON would
 * make them null, which means unknown).
 */
export const canonicalText = (value: unknown): string => {
  if (typeof value === 'number') {
    if (Number.isFinite(value)) return JSON.stringify(value === 0 ? 0 : value);
    return `"${String(value)}"`;
  }
  if (Array.isArray(value))
    return `[${value.map((each) => canonicalText(each ?? null)).join(',')}]`;
  if (typeof value === 'object' && value !== null) {
    const members = Object.entries(value)
      .filter(([, member]) => member !== undefined)
      .sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0))
      .map(([key, member]) => `${JSON.stringify(key)}:${canonicalText(member)}`);
    return `{${members.join(',')}}`;
  }
  return JSON.stringify(value ?? null);
};
