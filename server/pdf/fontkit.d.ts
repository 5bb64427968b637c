/** What is used here of the font reader that pdfkit stands on; it ships without types. */
declare module 'fontkit' {
  export interface PathCommand {
    readonly command: 'moveTo' | 'lineTo' | 'quadraticCurveTo' | 'bezierCurveTo' | 'closePath';
    readonly args: readonly number[];
  }
  export interface Font {
    readonly unitsPerEm: number;
    readonly ascent: number;
    readonly descent: number;
    hasGlyphForCodePoint(code: number): boolean;
    layout(text: string): {
      readonly advanceWidth: number;
      readonly glyphs: readonly { readonly path: { readonly commands: readonly PathCommand[] } }[];
      readonly positions: readonly {
        readonly xAdvance: number;
        readonly xOffset: number;
        readonly yOffset: number;
      }[];
    };
  }
  export function create(bytes: Buffer): Font;
}
