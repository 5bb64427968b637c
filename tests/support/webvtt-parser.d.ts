/** The part of the package that the tests use; it comes without types. */
declare module 'webvtt-parser' {
  export interface Node {
    readonly type: string;
    readonly name?: string;
    readonly value?: string;
    readonly children?: readonly Node[];
  }
  export interface ParsedCue {
    readonly id: string;
    readonly startTime: number;
    readonly endTime: number;
    readonly tree: { readonly children: readonly Node[] };
  }
  export class WebVTTParser {
    /** @param entities HTML's named characters, as the package lists them */
    constructor(entities: Readonly<Record<string, string>>);
    parse(
      text: string,
      mode: string,
    ): {
      readonly cues: readonly ParsedCue[];
      readonly errors: readonly { readonly message: string; readonly line: number }[];
    };
  }
}
declare module 'webvtt-parser/html-entities.json' {
  const entities: Readonly<Record<string, string>>;
  export default entities;
}
