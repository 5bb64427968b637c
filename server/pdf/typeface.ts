import type { FontFile, Script, Weight } from './fonts.ts';

/** What a font of pdfkit says of itself; its types leave it out. */
interface OpenFont {
  readonly font: { hasGlyphForCodePoint(code: number): boolean };
}

export interface Run {
  readonly font: string;
  readonly text: string;
}

/** Stands for a letter that no file has. */
const UNKNOWN = '?';

export const fontName = (script: Script, weight: Weight): string => `${script} ${weight}`;

/** Which font has which letter. */
export class Typeface {
  readonly #has = new Map<string, OpenFont>();
  readonly #scripts: readonly Script[];

  /** @param open makes a font known to the document and hands it over */
  constructor(files: readonly FontFile[], open: (name: string, bytes: Buffer) => unknown) {
    this.#scripts = [...new Set(files.map(({ script }) => script))];
    for (const { script, weight, bytes } of files) {
      const name = fontName(script, weight);
      this.#has.set(name, open(name, bytes) as OpenFont);
    }
  }

  #fontOf(letter: string, weight: Weight): string | null {
    const code = letter.codePointAt(0) ?? 0;
    for (const script of this.#scripts) {
      const name = fontName(script, weight);
      if (this.#has.get(name)?.font.hasGlyphForCodePoint(code)) return name;
    }
    return null;
  }

  /** Stretches of one font each; spaces stay with what they follow. */
  runs(text: string, weight: Weight): Run[] {
    const runs: { font: string; text: string }[] = [];
    const latin = fontName('latin', weight);
    for (const letter of text.normalize('NFC')) {
      const last = runs.at(-1);
      const blank = /\s/.test(letter);
      const known = blank ? (last?.font ?? latin) : this.#fontOf(letter, weight);
      const font = known ?? latin;
      const shown = known === null ? UNKNOWN : letter;
      if (last?.font === font) last.text += shown;
      else runs.push({ font, text: shown });
    }
    return runs;
  }
}
