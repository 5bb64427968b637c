import type { FrameMarks } from '#shared/landmarks/commands.ts';
import type { LandmarkId } from '#shared/landmarks/types.ts';
import { hipCentre } from '#shared/measures/hip-centre.ts';
import { noteLine, type NoteShape, noteShape } from '#shared/overlay/notes.ts';
import { overlay } from '#shared/overlay/overlay.ts';
import type { HipCentres } from '#shared/overlay/segments.ts';
import type { Primitive } from '#shared/overlay/types.ts';
import type { FrameValues } from '#shared/overlay/value-labels.ts';
import { engineMarks } from '#shared/records/engine-input.ts';
import type { BenchModel } from '../model/bench-model.ts';
import { draftShape, type Tool } from '../store/tools.ts';
import type { ClipGeometry } from '#shared/contracts/clips.ts';

/** Hip centres of a frame, by the ASIS distance of the rep's quiet stance. */
export const hipsOf = (marks: FrameMarks, width: number | null): HipCentres => {
  const support = marks['asis-support'];
  const lifted = marks['asis-lifted'];
  if (support?.to !== 'point' || lifted?.to !== 'point' || width === null)
    return { support: null, lifted: null };
  return {
    support: hipCentre(support.point, lifted.point, width),
    lifted: hipCentre(lifted.point, support.point, width),
  };
};

export interface Drawn {
  readonly model: BenchModel;
  readonly marks: FrameMarks;
  readonly sourceLongEdge: number;
  /** Null: no figures on the picture. */
  readonly values: FrameValues | null;
  readonly conflicts: ReadonlySet<LandmarkId>;
  /** What the comments at this frame point at. */
  readonly shapes: readonly NoteShape[];
  readonly tool: Tool;
  readonly geometry: ClipGeometry;
  /** Rod, plumb line and floor line are drawn while the set-up is open. */
  readonly setUp: boolean;
}

/** Everything on the picture of one frame: marks and values, then what people pointed at. */
export const drawnOn = (drawn: Drawn): Primitive[] => {
  const { model, marks, values, conflicts, shapes, tool, geometry, setUp } = drawn;
  const { current, view } = model;
  const side = current?.rep.supportSide ?? 'left';
  const width = current?.course?.setting.reference.width ?? null;
  const draft = draftShape(tool);
  return [
    ...(setUp ? setUpLines(geometry, tool) : []),
    ...overlay({
      view,
      supportSide: side,
      marks: engineMarks(marks, drawn.sourceLongEdge),
      hips: hipsOf(marks, width),
      values,
      conflicts,
    }),
    ...shapes.map(noteShape),
    ...(draft ? [noteShape(draft)] : []),
  ];
};

/** Stored lines, without the one that is being drawn anew; a smear shows on its own frame only, so never. */
const setUpLines = ({ scale, plumb, floorLine }: ClipGeometry, tool: Tool): Primitive[] => {
  const drawing = tool.kind === 'line' ? tool : null;
  const [a, b] = drawing?.points ?? [];
  const stored = scale && scale.from !== 'typed' ? scale : null;
  const scaling = drawing?.of === 'rod' || drawing?.of === 'body-height';
  return [
    ...(stored && !scaling ? noteLine(stored.a, stored.b) : []),
    ...(plumb && drawing?.of !== 'plumb' ? noteLine(plumb.top, plumb.bottom) : []),
    ...(floorLine && drawing?.of !== 'floor' ? noteLine(floorLine.a, floorLine.b) : []),
    ...(a && b ? noteLine(a, b) : a ? [noteShape({ kind: 'point', ...a })] : []),
  ];
};
