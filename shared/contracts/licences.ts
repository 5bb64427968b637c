import * as z from 'zod';
import { json, route } from './route.ts';

/** A package of somebody else that Redshank ships, under its own licence. */
export const shippedPackage = z.object({
  name: z.string(),
  /** Null for what stays on the server: nobody outside need know what exactly runs there. */
  version: z.string().nullable(),
  /** An SPDX expression. */
  licence: z.string(),
  /** Whether browsers get it. */
  browser: z.boolean(),
  /** The file with the licence's words; null where the package has none. */
  text: z.string().nullable(),
});
export type ShippedPackage = z.infer<typeof shippedPackage>;

export const licenceList = z.object({ packages: z.array(shippedPackage) });

/** A file that the build makes beside the pages; it is no part of the interface. */
export const licencesFile = route({
  method: 'get',
  path: '/licences.json',
  summary: 'The packages that Redshank stands on, with their licences.',
  audience: 'anyone',
  status: 200,
  answer: json(licenceList),
});
