import type { ClipTruth, FrameTruth, RepTruth } from '#tests/fixtures/clips/truth.ts';

/**
 * The measurement's lift and yaw formulas, written a second time and as short as they go. Only the
 * checks of the clips use it: it must not share code with what it checks.
 */
export interface PlainReading {
  readonly lift: number;
  /** zero at quiet stance; NaN where the pointers are missing */
  readonly turn: number;
  readonly bareTurn: number;
}

type Pixel = readonly [number, number];
const DEG = 180 / Math.PI;
const mean = (values: readonly number[]): number =>
  values.reduce((sum, value) => sum + value, 0) / values.length;

const at = (frame: FrameTruth, id: string): Pixel => frame.marks[id] ?? [NaN, NaN];
const middle = (a: Pixel, b: Pixel): Pixel => [(a[0] + b[0]) / 2, (a[1] + b[1]) / 2];

export const plainReading = (
  truth: ClipTruth,
  rep: RepTruth,
): ((f: FrameTruth) => PlainReading) => {
  const { mmPerPx, distanceMm, lensHeightMm, beltPointerMm, thighPointerMm } = truth.setUp;
  const quiet = truth.frames.slice(rep.quietFrames[0], rep.quietFrames[1] + 1);
  const still = (id: string): Pixel => [
    mean(quiet.map((frame) => at(frame, id)[0])),
    mean(quiet.map((frame) => at(frame, id)[1])),
  ];
  const focal = distanceMm / mmPerPx;
  const u0 = truth.picture.width / 2;
  const sigma = rep.supportSide === 'left' ? 1 : -1;
  const [s0, l0] = [still('asis-support'), still('asis-lifted')];
  const width = Math.hypot(s0[0] - l0[0], s0[1] - l0[1]);
  const kneeWidth = Math.abs(still('knee-inner')[0] - still('knee-outer')[0]);

  const hipHeight = (support: Pixel, lifted: Pixel): number => {
    const apart = Math.hypot(support[0] - lifted[0], support[1] - lifted[1]);
    const [eu, ev] = [(support[0] - lifted[0]) / apart, (support[1] - lifted[1]) / apart];
    return lifted[1] + 0.14 * width * ev + 0.345 * width * Math.abs(eu);
  };
  const full = still('lifted-knee')[1] - hipHeight(s0, l0);
  const v0 = still('ankle-support')[1] - (lensHeightMm - 75) / mmPerPx;

  const yaw = (far: Pixel, near: Pixel, reach: number): number => {
    const t = (near[0] - u0) / focal;
    const sine = (near[0] - far[0]) / (reach * Math.sqrt(1 + t * t));
    return (Math.asin(Math.max(-0.98, Math.min(0.98, sine))) - Math.atan(t)) * DEG;
  };
  const turns = (frame: FrameTruth): { pointers: number; bare: number } => {
    const asis = middle(at(frame, 'asis-support'), at(frame, 'asis-lifted'));
    const strap = middle(at(frame, 'strap-inner'), at(frame, 'strap-outer'));
    const knee = middle(at(frame, 'knee-inner'), at(frame, 'knee-outer'));
    const outline = middle(at(frame, 'outline-support'), at(frame, 'outline-lifted'));
    const femur = yaw(strap, at(frame, 'thigh-tip'), (55 + (thighPointerMm ?? NaN)) / mmPerPx);
    const pelvis = yaw(asis, at(frame, 'belt-tip'), (beltPointerMm ?? NaN) / mmPerPx);
    return {
      pointers: sigma * (femur - pelvis),
      bare:
        sigma * (yaw(knee, at(frame, 'kneecap'), kneeWidth / 2) - yaw(outline, asis, 70 / mmPerPx)),
    };
  };
  const zero = {
    pointers: mean(quiet.map((frame) => turns(frame).pointers)),
    bare: mean(quiet.map((frame) => turns(frame).bare)),
  };

  return (frame) => {
    const knee = at(frame, 'lifted-knee');
    const slope = (knee[1] - v0) / focal;
    const drop = knee[1] - hipHeight(at(frame, 'asis-support'), at(frame, 'asis-lifted'));
    const cosine = drop / (full * Math.sqrt(1 + slope * slope));
    const { pointers, bare } = turns(frame);
    return {
      lift: (Math.acos(Math.max(-1, Math.min(1, cosine))) + Math.atan(slope)) * DEG,
      turn: pointers - zero.pointers,
      bareTurn: bare - zero.bare,
    };
  };
};
