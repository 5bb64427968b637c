import type { Mail } from './mailer.ts';

/** What a letter says, before it is known whom it goes to. */
export type Letter = Omit<Mail, 'to'>;

export const written = (subject: string, ...paragraphs: readonly string[]): Letter => ({
  subject,
  text: `${paragraphs.join('\n\n')}\n`,
});

/** The server does not know where the reader is. */
export const momentInWords = (moment: string | Date): string => {
  const words = new Intl.DateTimeFormat('en-GB', {
    dateStyle: 'long',
    timeStyle: 'short',
    timeZone: 'UTC',
  });
  return `${words.format(new Date(moment))} (UTC)`;
};
