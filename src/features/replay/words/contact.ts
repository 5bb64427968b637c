/** A practice's contact line as something to tap: an e-mail address or a telephone number; else null. */
export const contactLink = (contact: string): string | null => {
  const text = contact.trim();
  if (/^[^\s@]+@[^\s@]+\.[^\s@]+$/.test(text)) return `mailto:${text}`;
  const digits = text.replace(/[\s()./-]/g, '');
  return /^\+?\d{5,15}$/.test(digits) ? `tel:${digits}` : null;
};
