import type { ReadMail } from './read-mail.ts';

const MARKS: Record<string, string> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};
const escaped = (text: string): string =>
  text.replaceAll(/[&<>"']/g, (mark) => MARKS[mark] ?? mark);

/** Text with its addresses as links; they open beside the inbox. */
const linked = (text: string): string =>
  text
    .split(/(https?:\/\/[^\s<>"']+)/)
    .map((part, n) =>
      n % 2 === 1
        ? `<a href="${escaped(part)}" target="_blank" rel="noreferrer">${escaped(part)}</a>`
        : escaped(part),
    )
    .join('');

const STYLE = `
  body { margin: 0 auto; max-width: 46rem; padding: 2rem 1rem 4rem; background: #f5f3ec; color: #1d2521;
    font: 1rem/1.6 system-ui, sans-serif; }
  h1 { font-size: 1.6rem; } h2 { font-size: 1.1rem; margin: 0; } a { color: inherit; }
  article { border-top: 1px solid #d8d4c7; padding: 1rem 0; }
  pre { white-space: pre-wrap; overflow-wrap: anywhere; font: inherit; margin: .75rem 0 0; }
  .note { color: #56605a; margin: 0; overflow-wrap: anywhere; }
`;

const letter = ({ to, subject, date, text }: ReadMail): string => `<article>
<h2>${escaped(subject)}</h2>
<p class="note">to ${escaped(to)}${date === '' ? '' : ` · ${escaped(date)}`}</p>
<pre>${linked(text.trim())}</pre>
</article>`;

/** The kept letters, newest first, as one page without scripts. */
export const inboxPage = (letters: readonly ReadMail[], more: number): string => `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>Letters · Redshank</title>
<style>${STYLE}</style>
</head>
<body>
<main>
<h1>Letters that were not sent</h1>
<p>No mail server is set, so letters are kept in a folder of this instance. This page shows them, on this machine alone. <a href="">Look again</a></p>
${letters.length === 0 ? '<p>None yet. Invite somebody, or ask for a new password.</p>' : letters.map(letter).join('\n')}
${more > 0 ? `<p class="note">${more} older ones are in the folder.</p>` : ''}
</main>
</body>
</html>
`;
