import { bodyOf, type ClipPlan, ROD_MM } from '../clips.ts';
import { LOOKS } from '../figure/looks.ts';
import { makePerson } from '../figure/person.ts';
import { makeCamera } from '../model/camera.ts';
import { rodY } from '../model/truth.ts';
import { type PainterPlan } from '../paint/painter.ts';
import { type RoomPicture } from '../paint/room.ts';
import { type RoomScene, roomScene } from '../paint/room-scene.ts';

/** The room of a clip: the chair on the support side, the rod across from it. */
export const sceneOf = (clip: ClipPlan): RoomScene => {
  const away = rodY(clip);
  return roomScene({
    chairSide: away > 0 ? -1 : 1,
    chairBehind: clip.view !== 'front',
    rodY: away,
    rodLength: ROD_MM,
  });
};

export const painterPlan = (clip: ClipPlan, room: RoomPicture): PainterPlan => ({
  camera: makeCamera(clip.camera),
  person: makePerson(bodyOf(clip), LOOKS[clip.body]),
  worn: {
    pointers: clip.pointers,
    bothThighs: new Set(clip.script.reps).size > 1,
    arms: clip.view === 'front' ? 'hanging' : 'before-waist',
  },
  room,
  stickers: clip.stickers ?? true,
  seed: clip.script.seed,
  grain: 0.9,
});
