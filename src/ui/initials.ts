/** First letters of the first and the last name: what a person's tag shows. */
export function initials(name: string): string {
  const words = name
    .trim()
    .split(/\s+/)
    .filter((word) => word !== '');
  const first = words[0] ?? '';
  const last = words.length > 1 ? (words.at(-1) ?? '') : '';
  return [first, last].map((word) => [...word][0]?.toLocaleUpperCase('en') ?? '').join('');
}
