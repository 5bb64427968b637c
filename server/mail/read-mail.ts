/** A letter as it was sent. */
export interface ReadMail {
  readonly to: string;
  readonly subject: string;
  /** When it was sent, as its header says; '' where it does not. */
  readonly date: string;
  /** The text part, decoded. */
  readonly text: string;
}

/** Enough of RFC 5322 and MIME for what the product writes: one text part, alone or among alternatives. */
export const readMail = (raw: string): ReadMail => {
  const { headers, body } = partOf(raw);
  const boundary = /boundary="?([^";]+)"?/i.exec(headers.get('content-type') ?? '')?.[1];
  const parts =
    boundary === undefined ? [raw] : body.split(`--${boundary}`).map((part) => part.trim());
  const text = parts
    .map(partOf)
    .find((part) => (part.headers.get('content-type') ?? '').startsWith('text/plain'));
  return {
    to: headers.get('to') ?? '',
    subject: decodedWords(headers.get('subject') ?? ''),
    date: headers.get('date') ?? '',
    text: text ? decodedBody(text.body, text.headers.get('content-transfer-encoding')) : '',
  };
};

const partOf = (raw: string) => {
  const text = raw.replaceAll('\r\n', '\n');
  const end = text.indexOf('\n\n');
  const head = end === -1 ? text : text.slice(0, end);
  const headers = new Map<string, string>();
  for (const line of head.replaceAll(/\n[ \t]+/g, ' ').split('\n')) {
    const colon = line.indexOf(':');
    if (colon > 0) headers.set(line.slice(0, colon).toLowerCase(), line.slice(colon + 1).trim());
  }
  return { headers, body: end === -1 ? '' : text.slice(end + 2) };
};

const decodedBody = (body: string, encoding = '7bit'): string => {
  if (encoding.toLowerCase() === 'base64') return Buffer.from(body, 'base64').toString('utf8');
  if (encoding.toLowerCase() === 'quoted-printable')
    return decodedQuoted(body.replaceAll('=\n', ''));
  return body;
};

const decodedQuoted = (text: string): string => {
  const bytes = text.replaceAll(/=([0-9A-F]{2})/gi, (_all, hex: string) =>
    String.fromCharCode(Number.parseInt(hex, 16)),
  );
  return Buffer.from(bytes, 'latin1').toString('utf8');
};

/** RFC 2047 words in a subject that is not plain ASCII. */
const decodedWords = (subject: string): string =>
  subject.replaceAll(/=\?utf-8\?([bq])\?([^?]*)\?=\s*/gi, (_all, kind: string, word: string) =>
    kind.toLowerCase() === 'b'
      ? Buffer.from(word, 'base64').toString('utf8')
      : decodedQuoted(word.replaceAll('_', ' ')),
  );
