import type { Body } from '../model/bodies.ts';
import type { Pointers } from '../model/landmarks.ts';
import type { Skeleton } from '../model/skeleton.ts';
import { addArm, type ArmHold, armPart, type ArmShapes, armShapes } from './arm.ts';
import { addHead } from './head.ts';
import { addKit } from './kit.ts';
import { addLeg, type LegShapes, legShapes } from './leg.ts';
import type { Look } from './looks.ts';
import { PART } from './paints.ts';
import { addShoe } from './shoe.ts';
import { addTrunk, type TrunkShapes, trunkShapes } from './trunk.ts';
import type { Surfaces } from '../paint/surfaces.ts';

/** A person whose surfaces can be drawn around any posture of the skeleton. */
export interface Person {
  readonly body: Body;
  readonly look: Look;
  readonly leg: LegShapes;
  readonly trunk: TrunkShapes;
  readonly arm: ArmShapes;
}

export const makePerson = (body: Body, look: Look): Person => ({
  body,
  look,
  leg: legShapes(body),
  trunk: trunkShapes(body, look.fullChest),
  arm: armShapes(body.height, body.girth),
});

export interface Worn {
  readonly pointers: Pointers;
  readonly bothThighs: boolean;
  readonly arms: ArmHold;
}

/** Fills `surfaces` with the person in this posture, in the person's own coordinates. */
export const drawPerson = (
  surfaces: Surfaces,
  person: Person,
  bones: Skeleton,
  worn: Worn,
  balancing: number,
): void => {
  const { body, leg } = person;
  surfaces.clear();
  addTrunk(surfaces, bones, person.trunk);
  addLeg(surfaces, bones.support, body, leg, PART.supportLeg);
  addLeg(surfaces, bones.lifted, body, leg, PART.liftedLeg);
  addShoe(surfaces, bones.support, body, PART.supportLeg);
  addShoe(surfaces, bones.lifted, body, PART.liftedLeg);
  for (const limb of [bones.support, bones.lifted])
    addArm(
      surfaces,
      bones,
      person.arm,
      limb.sign,
      balancing,
      worn.arms,
      armPart(limb === bones.support),
    );
  addHead(surfaces, bones, person.look);
  addKit(surfaces, bones, person.trunk, worn.pointers, worn.bothThighs);
};
