import * as z from 'zod';

export const id = z.uuid().meta({ id: 'Id', description: 'An opaque identifier (UUID).' });
export const version = z
  .int()
  .positive()
  .meta({ id: 'Version', description: 'Counts changes; send it back with an edit.' });
/** A calendar day, ISO 8601. */
export const day = z.iso.date('Choose a day.').meta({ id: 'Day' });
/** A moment, ISO 8601 with an offset. */
export const moment = z.iso.datetime({ offset: true }).meta({ id: 'Moment' });

export const side = z
  .enum(['left', 'right'])
  .meta({ id: 'Side', description: 'The athlete’s side.' });
export const view = z
  .enum(['front', 'back', 'lifted-side', 'support-side'])
  .meta({ id: 'View', description: 'Where the camera stood, seen from the athlete.' });
/** Where the camera stood in the room; with a rep's support side it gives the rep's view. */
export const cameraStood = z
  .enum(['front', 'back', 'athlete-left', 'athlete-right'])
  .meta({ id: 'CameraStood' });

/** Text that a person typed: trimmed, without control characters other than line breaks and tabs. */
export const text = (max: number, min = 1) =>
  z
    .string()
    .trim()
    .min(min, min === 1 ? 'Write something here.' : `At least ${min} characters.`)
    .max(max, `At most ${max} characters.`)
    // eslint-disable-next-line no-control-regex -- control characters are what is kept out
    .regex(/^[^\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f]*$/, 'Leave out control characters.');

export const email = z
  .string()
  .trim()
  .toLowerCase()
  .max(254, 'At most 254 characters.')
  .pipe(z.email('Write an e-mail address, such as name@example.org.'));

/** A length in millimetres, in the span that a body, a rod or a room can have. */
export const millimetres = (min: number, max: number) =>
  z.number('Write a number.').min(min, `At least ${min} mm.`).max(max, `At most ${max} mm.`);

/** Pixels of the upright source frame; a mark may lie outside the picture. */
export const coordinate = z.number().min(-20_000).max(20_000);

/** A point in pixels of the upright source frame: u to the right, v down, from the top left corner. */
export const framePoint = z
  .object({ u: coordinate, v: coordinate })
  .meta({ id: 'FramePoint', description: 'Pixels of the upright source frame, u right, v down.' });

export const frameIndex = z.int().min(0).max(1_000_000).meta({ id: 'FrameIndex' });

export const personRef = z.object({ id, name: z.string() }).meta({ id: 'PersonRef' });

export const pageQuery = {
  page: z.coerce.number().int().min(1).max(100_000).default(1),
  pageSize: z.coerce.number().int().min(1).max(200).default(25),
};
/** One page of a list, with the count of all. */
export const pageOf = <T extends z.ZodType>(item: T) =>
  z.object({
    items: z.array(item),
    total: z.int(),
    page: z.int(),
    pageSize: z.int(),
  });

export type Side = z.infer<typeof side>;
export type View = z.infer<typeof view>;
export type CameraStood = z.infer<typeof cameraStood>;

/** A list that nobody writes to, as the engine gives it. */
export const readonlyList = <T extends z.ZodType>(item: T) =>
  z.array(item) as z.ZodType<readonly z.infer<T>[]>;

/** A finite number of one unit, under the name that the engine gives it. */
export const quantity = <Q extends number>(unit: string) =>
  z.custom<Q>(Number.isFinite).meta({ type: 'number', description: unit });
