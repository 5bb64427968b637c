import type { BodyName } from '../model/bodies.ts';
import { type Colour, colour } from './paints.ts';

/** Colours and hair of an invented person. */
export interface Look {
  readonly skin: Colour;
  readonly lips: Colour;
  readonly hair: Colour;
  readonly shirt: Colour;
  readonly shorts: Colour;
  readonly shoe: Colour;
  readonly sole: Colour;
  readonly sock: Colour;
  readonly knot: 'none' | 'high' | 'plaits';
  /** hair reaches down to here, mm above the chin */
  readonly hairDown: number;
  readonly hairThick: number;
  /** how far the hair at the sides falls towards the face, 0 to 1 */
  readonly hairForward: number;
  /** front edge of the hair, mm above the chin */
  readonly brow: number;
  readonly headScale: number;
  readonly fullChest: boolean;
}

export const LOOKS: Readonly<Record<BodyName, Look>> = {
  woman: {
    skin: colour('#b97a56'),
    lips: colour('#8f4d3c'),
    hair: colour('#2c211d'),
    shirt: colour('#7f93a1'),
    shorts: colour('#23292c'),
    shoe: colour('#5b6a70'),
    sole: colour('#dcd8cd'),
    sock: colour('#4b5154'),
    knot: 'high',
    hairDown: 62,
    hairThick: 1,
    hairForward: 0.2,
    brow: 169,
    headScale: 1,
    fullChest: true,
  },
  man: {
    skin: colour('#7a4b33'),
    lips: colour('#5c3127'),
    hair: colour('#17120f'),
    shirt: colour('#c8bda4'),
    shorts: colour('#2f3a47'),
    shoe: colour('#3a3f43'),
    sole: colour('#cfcac0'),
    sock: colour('#4b5154'),
    knot: 'none',
    hairDown: 92,
    hairThick: -2,
    hairForward: 0.2,
    brow: 174,
    headScale: 1,
    fullChest: false,
  },
  child: {
    skin: colour('#dba989'),
    lips: colour('#b96f5f'),
    hair: colour('#7a5030'),
    shirt: colour('#8c9a6e'),
    shorts: colour('#2a2f3a'),
    shoe: colour('#c9c4b4'),
    sole: colour('#80858a'),
    sock: colour('#4b5154'),
    knot: 'plaits',
    hairDown: 62,
    hairThick: 1,
    hairForward: 0.2,
    brow: 166,
    headScale: 1.07,
    fullChest: false,
  },
  olderMan: {
    skin: colour('#cf9d7e'),
    lips: colour('#a5685a'),
    hair: colour('#a9a7a2'),
    shirt: colour('#5f7076'),
    shorts: colour('#3a3a38'),
    shoe: colour('#55504a'),
    sole: colour('#cbc5b8'),
    sock: colour('#4b5154'),
    knot: 'none',
    hairDown: 96,
    hairThick: -3,
    hairForward: 0.2,
    brow: 188,
    headScale: 1,
    fullChest: false,
  },
  olderWoman: {
    skin: colour('#a06a49'),
    lips: colour('#7d4437'),
    hair: colour('#8d8a86'),
    shirt: colour('#9a7f8c'),
    shorts: colour('#26302f'),
    shoe: colour('#6d5a63'),
    sole: colour('#dcd8cd'),
    sock: colour('#4b5154'),
    knot: 'none',
    hairDown: 38,
    hairThick: 8,
    hairForward: 0.62,
    brow: 169,
    headScale: 1,
    fullChest: true,
  },
  tallWoman: {
    skin: colour('#8a583c'),
    lips: colour('#6b382d'),
    hair: colour('#3a2418'),
    shirt: colour('#b08a62'),
    shorts: colour('#263238'),
    shoe: colour('#b9c0c2'),
    sole: colour('#6f767a'),
    sock: colour('#4b5154'),
    knot: 'high',
    hairDown: 62,
    hairThick: 2,
    hairForward: 0.25,
    brow: 168,
    headScale: 0.98,
    fullChest: true,
  },
};
