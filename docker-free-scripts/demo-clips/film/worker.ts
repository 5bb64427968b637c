import { parentPort, workerData } from 'node:worker_threads';
import type { ClipPlan } from '../clips.ts';
import { intoRoom, makeCamera } from '../model/camera.ts';
import { FRONT_LANDMARKS, landmarksOf, SIDE_LANDMARKS } from '../model/landmarks.ts';
import { makeTake } from '../model/take.ts';
import { Painter } from '../paint/painter.ts';
import { paintRoom, type RoomPicture } from '../paint/room.ts';
import { painterPlan, sceneOf } from './stage.ts';

export interface WorkerStart {
  readonly clip: ClipPlan;
  readonly room: RoomPicture;
}

/** What the director asks of a worker, one thing at a time. */
export type Order =
  { readonly room: readonly [number, number] } | { readonly frame: number; readonly ms: number };

export type Delivery =
  | { readonly painted: 'room' }
  | {
      readonly painted: 'frame';
      readonly frame: number;
      readonly picture: Uint8Array;
      readonly hidden: readonly string[];
    };

/** The shutter is open this long: a 120th of a second, as a phone indoors in good light. */
const SHUTTER_S = 1 / 120;
/** A landmark inside a limb lies up to this far behind the skin that shows it, mm. */
const SKIN_DEEP = 95;

const { clip, room } = workerData as WorkerStart;
const take = makeTake(clip);
const camera = makeCamera(clip.camera);
const place = intoRoom(clip.camera.facing);
let painter: Painter | null = null;

const paintFrame = (frame: number, ms: number): Delivery => {
  painter ??= new Painter(painterPlan(clip, room));
  const picture = painter.paint(frame, (share) => {
    const seconds = ms / 1000 + share * SHUTTER_S;
    return { bones: take.skeletonAt(seconds), balancing: take.stanceAt(seconds).shift };
  });
  const wanted = clip.view === 'front' ? FRONT_LANDMARKS : SIDE_LANDMARKS;
  const points = landmarksOf(take.skeletonAt(ms / 1000), clip.pointers);
  const hidden = wanted.filter((id) => {
    const point = points.get(id);
    return point !== undefined && painter?.hides(place(point), SKIN_DEEP);
  });
  return { painted: 'frame', frame, picture, hidden };
};

parentPort?.on('message', (order: Order) => {
  if ('room' in order) {
    paintRoom(room, camera, sceneOf(clip), ...order.room);
    parentPort?.postMessage({ painted: 'room' } satisfies Delivery);
    return;
  }
  const delivery = paintFrame(order.frame, order.ms);
  parentPort?.postMessage(
    delivery,
    delivery.painted === 'frame' ? [delivery.picture.buffer as ArrayBuffer] : [],
  );
});
