import PDFDocument from 'pdfkit';
import { fontFiles, type Weight } from './fonts.ts';
import { Typeface } from './typeface.ts';

type Doc = InstanceType<typeof PDFDocument>;
type Struct = ReturnType<Doc['struct']>;

/** Points; A4. */
const MARGIN = { top: 46, bottom: 56, left: 50, right: 50 };

export const INK = '#1D2521';
export const SOFT = '#56605A';
export const RULE = '#D8D4C7';

export interface Type {
  readonly size: number;
  readonly weight?: Weight;
  readonly colour?: string;
  readonly align?: 'left' | 'right' | 'center';
}

export interface Column {
  readonly title: string;
  /** Share of the table's width. */
  readonly share: number;
  readonly align?: 'left' | 'right';
}

/** Between the words of two columns. */
const COLUMN_GAP = 6;

/** Draws into a figure; its corner is 0, 0. */
export interface Pen {
  readonly doc: Doc;
  readonly word: (text: string, x: number, y: number, type: Type & { width?: number }) => void;
}

/** A tagged document of headings, paragraphs, tables and figures, one under the other. */
export class Paper {
  readonly #doc: Doc;
  readonly #face: Typeface;
  readonly #root: Struct;
  readonly #scale: number;
  #left = MARGIN.left;
  #width: number;

  private constructor(doc: Doc, face: Typeface, scale: number) {
    this.#doc = doc;
    this.#face = face;
    this.#scale = scale;
    this.#width = doc.page.width - MARGIN.left - MARGIN.right;
    this.#root = doc.struct('Document');
    doc.addStructure(this.#root);
  }

  /** @param scale of all type: 1 is 9.5 points for running text */
  static async open(of: { title: string; author: string; made: Date }, scale: number) {
    const doc = new PDFDocument({
      size: 'A4',
      margins: MARGIN,
      bufferPages: true,
      pdfVersion: '1.7',
      tagged: true,
      lang: 'en-GB',
      displayTitle: true,
      info: { Title: of.title, Author: of.author, CreationDate: of.made, ModDate: of.made },
    });
    const face = new Typeface(await fontFiles(), (name, bytes) => {
      doc.registerFont(name, bytes);
      doc.font(name);
      return (doc as unknown as { _font: unknown })._font;
    });
    return new Paper(doc, face, scale);
  }

  get width(): number {
    return this.#width;
  }

  get y(): number {
    return this.#doc.y;
  }

  set y(value: number) {
    this.#doc.y = value;
  }

  /** On to the next page unless so much fits on this one. */
  room(height: number): void {
    if (!this.#fits(height)) this.#doc.addPage();
  }

  #fits(height: number): boolean {
    return this.#doc.y + height <= this.#doc.page.height - MARGIN.bottom;
  }

  space(height: number): void {
    this.#doc.y += height * this.#scale;
  }

  /** What `write` writes stands in this part of the width. */
  within(from: number, width: number, write: () => void): void {
    const before = { left: this.#left, width: this.#width };
    this.#left = MARGIN.left + from;
    this.#width = width;
    write();
    this.#left = before.left;
    this.#width = before.width;
  }

  #height(text: string, { size, weight = 'plain' }: Type, width: number): number {
    this.#doc.font(`latin ${weight}`).fontSize(size * this.#scale);
    return this.#doc.heightOfString(text, { width, lineGap: 1 });
  }

  #words(text: string, type: Type, x: number, y: number, width: number, fit = false): void {
    const { size, weight = 'plain', colour = INK, align = 'left' } = type;
    const runs = this.#face.runs(text, weight);
    this.#doc.fillColor(colour).fontSize(size * this.#scale);
    for (const [n, run] of runs.entries()) {
      const options = { width, align, lineGap: 1, continued: n < runs.length - 1, lineBreak: !fit };
      this.#doc.font(run.font);
      if (n === 0) this.#doc.text(run.text, x, y, options);
      else this.#doc.text(run.text, options);
    }
  }

  #block(tag: string, text: string, type: Type, after: number): void {
    this.room(this.#height(text, type, this.#width));
    const y = this.#doc.y;
    this.#root.add(
      this.#doc.struct(tag, {}, () => this.#words(text, type, this.#left, y, this.#width)),
    );
    this.space(after);
  }

  title(text: string): void {
    this.#block('H1', text, { size: 19, weight: 'strong' }, 2);
  }

  /** @param keep points that have to follow on the same page */
  heading(text: string, keep = 60): void {
    this.space(6);
    this.room(keep);
    const { doc, y } = { doc: this.#doc, y: this.#doc.y };
    doc.markContent('Artifact', { type: 'Layout' });
    doc
      .moveTo(this.#left, y)
      .lineTo(this.#left + this.#width, y)
      .lineWidth(0.75)
      .strokeColor(INK)
      .stroke();
    doc.endMarkedContent();
    this.space(4);
    this.#block('H2', text, { size: 12.5, weight: 'strong' }, 2);
  }

  subheading(text: string): void {
    this.room(40);
    this.#block('H3', text, { size: 10, weight: 'strong' }, 1);
  }

  says(text: string, type: Partial<Type> = {}): void {
    if (text !== '') this.#block('P', text, { size: 9.5, ...type }, 3);
  }

  note(text: string): void {
    this.says(text, { size: 8.5, colour: SOFT });
  }

  /** A figure of vectors, told in words to those who cannot see it. */
  figure(alt: string, width: number, height: number, draw: (pen: Pen) => void): void {
    this.room(height);
    const { doc, y } = { doc: this.#doc, y: this.#doc.y };
    const word: Pen['word'] = (text, x, at, { width: wide, ...type }) =>
      this.#words(text, type, x, at, wide ?? width, wide === undefined);
    this.#root.add(
      doc.struct('Figure', { alt }, () => {
        doc.save().translate(this.#left, y);
        draw({ doc, word });
        doc.restore();
      }),
    );
    doc.x = this.#left;
    doc.y = y + height;
  }

  table(columns: readonly Column[], rows: readonly (readonly string[])[], size = 8.5): void {
    const table = this.#doc.struct('Table');
    this.#root.add(table);
    const head = columns.map(({ title }) => title);
    const strong: Type = { size, weight: 'strong' };
    const headHeight = this.#rowHeight(columns, head, strong);
    const heights = rows.map((row) => this.#rowHeight(columns, row, { size }));
    const writeHead = (into: Struct | null) =>
      this.#row(into, columns, head, { type: strong, tag: 'TH', height: headHeight });
    // a head is never parted from the first row under it
    this.room(headHeight + (heights[0] ?? 0));
    writeHead(table);
    for (const [n, row] of rows.entries()) {
      const height = heights[n] ?? 0;
      if (!this.#fits(height)) {
        this.#doc.addPage();
        // the table goes on: to those who hear it, its head has been said
        writeHead(null);
      }
      this.#row(table, columns, row, { type: { size }, tag: 'TD', height });
    }
    table.end();
    this.space(5);
  }

  /** What each column's words may take of the width. */
  #columnWidths(columns: readonly Column[]): number[] {
    const whole = columns.reduce((sum, { share }) => sum + share, 0);
    return columns.map(({ share }) => (share / whole) * this.#width);
  }

  /** With its rule below. */
  #rowHeight(columns: readonly Column[], cells: readonly string[], type: Type): number {
    const widths = this.#columnWidths(columns);
    const heights = cells.map((cell, n) => this.#height(cell, type, (widths[n] ?? 0) - COLUMN_GAP));
    return Math.max(0, ...heights) + 4;
  }

  /** @param table null: drawn once more, and no part of what is read out */
  #row(
    table: Struct | null,
    columns: readonly Column[],
    cells: readonly string[],
    { type, tag, height }: { type: Type; tag: 'TH' | 'TD'; height: number },
  ) {
    const doc = this.#doc;
    const widths = this.#columnWidths(columns);
    this.room(height);
    const y = doc.y;
    const row = table && doc.struct('TR');
    if (row) table.add(row);
    else doc.markContent('Artifact', { type: 'Pagination' });
    let x = this.#left;
    for (const [n, cell] of cells.entries()) {
      const at = x;
      const width = widths[n] ?? 0;
      const align = columns[n]?.align ?? 'left';
      const write = () =>
        this.#words(cell === '' ? ' ' : cell, { ...type, align }, at, y + 1.5, width - COLUMN_GAP);
      if (row) row.add(doc.struct(tag, {}, write));
      else write();
      x += width;
    }
    if (row) row.end();
    else doc.endMarkedContent();
    const end = y + height - 1;
    doc.markContent('Artifact', { type: 'Layout' });
    doc
      .moveTo(this.#left, end)
      .lineTo(this.#left + this.#width, end)
      .lineWidth(0.5)
      .strokeColor(tag === 'TH' ? SOFT : RULE)
      .stroke();
    doc.endMarkedContent();
    doc.x = this.#left;
    doc.y = end + 0.5;
  }

  /** Writes what stands at the foot of every page and closes the document. */
  async close(foot: (page: number, of: number) => string): Promise<{ pdf: Buffer; pages: number }> {
    const doc = this.#doc;
    this.#root.end();
    const { count } = doc.bufferedPageRange();
    for (let page = 0; page < count; page += 1) {
      doc.switchToPage(page);
      // or the foot would begin a page of its own
      doc.page.margins.bottom = 0;
      doc.markContent('Artifact', { type: 'Pagination' });
      const y = doc.page.height - 38;
      this.#words(foot(page + 1, count), { size: 8, colour: SOFT }, MARGIN.left, y, this.#width);
      doc.endMarkedContent();
    }
    const parts: Buffer[] = [];
    const ended = new Promise<void>((resolve, reject) => {
      doc.on('data', (part: Buffer) => parts.push(part));
      doc.on('end', resolve);
      doc.on('error', reject);
    });
    doc.end();
    await ended;
    return { pdf: Buffer.concat(parts), pages: count };
  }
}
