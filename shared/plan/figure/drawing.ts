import type { Pose } from './body.ts';
import type { Spot } from './reach.ts';

/** What stands about, in the figure's units. */
export type Prop =
  | { readonly kind: 'wall'; readonly at: number }
  | { readonly kind: 'chair'; readonly at: number }
  | { readonly kind: 'step'; readonly from: number; readonly to: number; readonly height: number }
  | { readonly kind: 'cushion'; readonly at: number }
  | { readonly kind: 'towel'; readonly at: number }
  | { readonly kind: 'stick'; readonly at: number; readonly height: number }
  | { readonly kind: 'rail'; readonly from: Spot; readonly to: Spot }
  /** A height on a wall, with what it is called. */
  | { readonly kind: 'mark'; readonly at: Spot; readonly text: string };

/** One position of an exercise. */
export interface Position {
  readonly name: string;
  readonly pose: Pose;
  readonly props?: readonly Prop[];
  /** The hand that holds a weight. */
  readonly load?: 'near' | 'far';
  /** Which way it goes from here. */
  readonly arrow?: readonly [from: Spot, to: Spot];
}

/** Three points of the sole, seen from above. */
export interface Sole {
  readonly name: string;
  readonly sole: true;
}

export interface ExerciseDrawing {
  /** For those who do not see it; `{support}` and `{lifted}` stand for the sides. */
  readonly label: string;
  readonly positions: readonly [Position, Position | Sole];
  /** Of the figure in its frame; smaller where it needs room. */
  readonly scale?: number;
}

/** A position stands in a frame of this size; two of them side by side are a drawing. */
export const FRAME = { width: 160, height: 200, floor: 186 } as const;
const USUAL_SCALE = 0.86;

/** A spot of the figure in its frame: x right, y down. */
export const inFrame =
  ({ scale = USUAL_SCALE }: Pick<ExerciseDrawing, 'scale'>, mirrored: boolean) =>
  ([forward, up]: Spot): Spot => [
    FRAME.width / 2 + (mirrored ? -1 : 1) * scale * forward,
    FRAME.floor - scale * up,
  ];

export const labelOf = (
  { label }: ExerciseDrawing,
  support: 'left' | 'right',
  lifted: 'left' | 'right',
): string => label.replaceAll('{support}', support).replaceAll('{lifted}', lifted);
