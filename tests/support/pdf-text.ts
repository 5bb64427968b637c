import { inflateSync } from 'node:zlib';

/**
 * The text of a document that this product wrote, page by page, by what the file itself says its glyphs mean
 * (ISO 32000-2, 9.10). Reads no more of the format than such documents use.
 */
interface Part {
  readonly dictionary: string;
  readonly stream: string;
}

const partsOf = (pdf: Buffer): Map<string, Part> => {
  const text = pdf.toString('latin1');
  const parts = new Map<string, Part>();
  for (const [, id = '', body = ''] of text.matchAll(/(\d+) 0 obj\n([\s\S]*?)\nendobj/g)) {
    const at = body.indexOf('\nstream\n');
    const dictionary = at < 0 ? body : body.slice(0, at);
    const raw = at < 0 ? '' : body.slice(at + 8, body.lastIndexOf('\nendstream'));
    const packed = dictionary.includes('/FlateDecode') && !/FontFile|Length1/.test(dictionary);
    const bytes = Buffer.from(raw, 'latin1');
    parts.set(id, { dictionary, stream: packed ? inflateSync(bytes).toString('latin1') : raw });
  }
  return parts;
};

const referred = (dictionary: string, key: string): string | undefined =>
  new RegExp(`/${key} (\\d+) 0 R`).exec(dictionary)?.[1];

const letters = (hex: string): string =>
  Buffer.from(hex.replaceAll(/\s/g, ''), 'hex').swap16().toString('utf16le');

/** Glyph to text, by the map that goes with a font. */
const glyphsOf = (map: string): Map<number, string> => {
  const glyphs = new Map<number, string>();
  for (const [, from = '', to = '', list = ''] of map.matchAll(
    /<([0-9a-f]+)>\s*<([0-9a-f]+)>\s*\[([^\]]*)\]/gi,
  )) {
    const texts = [...list.matchAll(/<([^>]*)>/g)].map(([, hex = '']) => letters(hex));
    const first = Number.parseInt(from, 16);
    for (let n = first; n <= Number.parseInt(to, 16); n += 1) glyphs.set(n, texts[n - first] ?? '');
  }
  return glyphs;
};

export const pdfPages = (pdf: Buffer): string[] => {
  const parts = partsOf(pdf);
  const part = (id: string | undefined): Part =>
    parts.get(id ?? '') ?? { dictionary: '', stream: '' };
  const fonts = new Map<string, Map<number, string>>();
  for (const { dictionary } of parts.values())
    for (const [, name = '', id = ''] of dictionary.matchAll(/\/(F\d+) (\d+) 0 R/g))
      fonts.set(name, glyphsOf(part(referred(part(id).dictionary, 'ToUnicode')).stream));
  const pages = [...parts.values()].filter(({ dictionary }) => /\/Type \/Page\n/.test(dictionary));
  return pages.map(({ dictionary }) => {
    let glyphs = new Map<number, string>();
    const lines: string[] = [];
    const { stream } = part(referred(dictionary, 'Contents'));
    for (const [, font, shown] of stream.matchAll(/\/(F\d+) [\d.]+ Tf|\[([^\]]*)\] TJ/g)) {
      if (font !== undefined) glyphs = fonts.get(font) ?? new Map<number, string>();
      const codes = [...(shown ?? '').matchAll(/<([0-9a-f]*)>/gi)]
        .map(([, hex = '']) => hex)
        .join('');
      const line = (codes.match(/.{4}/g) ?? []).map(
        (code) => glyphs.get(Number.parseInt(code, 16)) ?? '',
      );
      if (line.length > 0) lines.push(line.join('').trim());
    }
    return lines.join(' ').replaceAll('\u00a0', ' ');
  });
};
