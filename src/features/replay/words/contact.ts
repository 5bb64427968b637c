export interface ContactPart {
  readonly text: string;
  /** Where it leads when tapped; null for plain words. */
  readonly to: string | null;
}

/** An e-mail address, or a telephone number of at least six digits. */
const REACHABLE = /([^\s@,;:<>()]+@[^\s@,;:<>()]+\.[a-z]{2,}|\+?\d[\d ()/.-]{4,}\d)/gi;

/** A practice's contact line in parts, with what can be called or written to as something to tap. */
export const contactParts = (contact: string): ContactPart[] =>
  contact
    .trim()
    .split(REACHABLE)
    .filter((text) => text !== '')
    .map((text) => {
      if (text.match(REACHABLE)?.[0] !== text) return { text, to: null };
      return {
        text,
        to: text.includes('@') ? `mailto:${text}` : `tel:${text.replace(/[^+\d]/g, '')}`,
      };
    });
