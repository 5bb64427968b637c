import { createHash } from 'node:crypto';

/** The same id for the same place in the story, so that a demo cut short is completed and not doubled. */
export const storyId = (practiceId: string, ...place: readonly (string | number)[]): string => {
  const hex = createHash('sha256')
    .update([practiceId, ...place].join('\n'))
    .digest('hex');
  // shaped as a UUID of version 8, which is free for own schemes (RFC 9562)
  const variant = '89ab'[Number.parseInt(hex.charAt(16), 16) % 4] ?? '8';
  return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-8${hex.slice(13, 16)}-${variant}${hex.slice(17, 20)}-${hex.slice(20, 32)}`;
};
