/** `Ada, Bo and Cy` */
export const listed = (names: readonly string[], word: 'and' | 'or' = 'and'): string => {
  const [last = '', ...before] = names.toReversed();
  return before.length === 0 ? last : `${before.toReversed().join(', ')} ${word} ${last}`;
};
