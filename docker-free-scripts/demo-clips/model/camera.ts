import { cross, dot, RAD, sub, type Vec } from './vec.ts';

/** A pinhole camera before the person. Lengths in mm, angles in degrees, the picture upright. */
export interface CameraPlan {
  readonly focalPx: number;
  /** lens to the plane through the person's ankles, square to that plane */
  readonly distance: number;
  readonly lensHeight: number;
  /** to the picture's right positive */
  readonly pan: number;
  /** upwards positive */
  readonly tilt: number;
  /** clockwise, as the photographer sees it, positive */
  readonly roll: number;
  /** direction the person faces: 0 into the lens, −90 when the left side is filmed, 90 for the right */
  readonly facing: number;
}

export const PICTURE = { width: 1080, height: 1920 } as const;

export type Pixel = readonly [number, number];

export interface Camera {
  readonly plan: CameraPlan;
  readonly eye: Vec;
  readonly right: Vec;
  readonly up: Vec;
  readonly ahead: Vec;
  /** u right, v down, from the picture's top left corner, fractions of a pixel */
  readonly project: (point: Vec) => Pixel;
}

/** Turns the person's coordinates into the room's, where the lens looks along −x. */
export const intoRoom = (facing: number): ((point: Vec) => Vec) => {
  const [c, s] = [Math.cos(facing * RAD), Math.sin(facing * RAD)];
  return (p) => [c * p[0] - s * p[1], s * p[0] + c * p[1], p[2]];
};

export const makeCamera = (plan: CameraPlan): Camera => {
  const [pan, tilt, roll] = [plan.pan * RAD, plan.tilt * RAD, plan.roll * RAD];
  const level: Vec = [-Math.cos(pan), Math.sin(pan), 0];
  const ahead: Vec = [level[0] * Math.cos(tilt), level[1] * Math.cos(tilt), Math.sin(tilt)];
  const flatRight: Vec = [Math.sin(pan), Math.cos(pan), 0];
  const flatUp = cross(flatRight, ahead);
  const right: Vec = [
    flatRight[0] * Math.cos(roll) - flatUp[0] * Math.sin(roll),
    flatRight[1] * Math.cos(roll) - flatUp[1] * Math.sin(roll),
    flatRight[2] * Math.cos(roll) - flatUp[2] * Math.sin(roll),
  ];
  const up = cross(right, ahead);
  const eye: Vec = [plan.distance, 0, plan.lensHeight];
  return {
    plan,
    eye,
    right,
    up,
    ahead,
    project: (point) => {
      const ray = sub(point, eye);
      const reach = plan.focalPx / dot(ray, ahead);
      return [
        PICTURE.width / 2 + reach * dot(ray, right),
        PICTURE.height / 2 - reach * dot(ray, up),
      ];
    },
  };
};
