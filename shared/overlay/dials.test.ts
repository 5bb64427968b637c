import { describe, expect, it } from 'vitest';
import type { FramePoint } from '#shared/geometry/points.ts';
import { degrees } from '#shared/geometry/units.ts';
import { STANDARD_GATES } from '#shared/protocol/protocol.ts';
import { type Dial, liftDial, turnDial } from './dials.ts';

const lines = (dial: Dial, role: string) =>
  dial.primitives.filter((each) => each.kind === 'line' && each.role === role);
/** Heading of a line: 0 down to the camera, positive towards the picture's right. */
const heading = (from: FramePoint, to: FramePoint) =>
  (Math.atan2(to.u - from.u, to.v - from.v) * 180) / Math.PI;

describe('turnDial', () => {
  it('draws both yaws as the table gives them, the thigh from the support hip', () => {
    const dial = turnDial({
      supportSide: 'right',
      pelvisPart: degrees(8.3),
      thighPart: degrees(-1.6),
      provisional: true,
    });
    const [bar, pointer] = lines(dial, 'midline');
    const [thigh] = lines(dial, 'support');
    if (bar?.kind !== 'line' || pointer?.kind !== 'line' || thigh?.kind !== 'line')
      throw new Error('lines missing');
    // standing on the right, a pelvis that turns away adds to the turn: forward goes to the left
    expect(heading(pointer.from, pointer.to)).toBeCloseTo(8.3, 6);
    expect(heading(thigh.from, thigh.to)).toBeCloseTo(1.6, 6);
    expect(thigh.from).toEqual(bar.from);
    expect(thigh.from.u).toBeLessThan(pointer.from.u);
    expect(thigh.state).toBe('tracked');
  });

  it('mirrors with the support side', () => {
    const dial = turnDial({
      supportSide: 'left',
      pelvisPart: degrees(5),
      thighPart: degrees(3),
      provisional: false,
    });
    const [, pointer] = lines(dial, 'midline');
    const [thigh] = lines(dial, 'support');
    if (pointer?.kind !== 'line' || thigh?.kind !== 'line') throw new Error('lines missing');
    expect(heading(pointer.from, pointer.to)).toBeCloseTo(-5, 6);
    expect(heading(thigh.from, thigh.to)).toBeCloseTo(3, 6);
    expect(thigh.from.u).toBeGreaterThan(pointer.from.u);
  });

  it('says where it is seen from and which side is which', () => {
    const dial = turnDial({
      supportSide: 'left',
      pelvisPart: degrees(0),
      thighPart: degrees(0),
      provisional: false,
    });
    const words = dial.primitives.flatMap((each) => (each.kind === 'label' ? [each] : []));
    expect(words.map((each) => each.text)).toEqual(['from above', 'right', 'left', 'camera ↓']);
    const right = words[1];
    const left = words[2];
    expect(right && left && right.at.u < left.at.u).toBe(true);
  });
});

describe('liftDial', () => {
  it('draws the thigh at its lift from the plumb, towards the camera', () => {
    const dial = liftDial(degrees(74), false, STANDARD_GATES);
    const [thigh] = lines(dial, 'lifted');
    if (thigh?.kind !== 'line') throw new Error('no thigh');
    expect(heading(thigh.from, thigh.to)).toBeCloseTo(74, 6);
  });

  it('names the gates', () => {
    const words = liftDial(degrees(30), false, STANDARD_GATES).primitives.flatMap((each) =>
      each.kind === 'label' ? [each.text] : [],
    );
    expect(words).toEqual(['60°', '90°', 'from the side', 'camera →']);
  });
});
