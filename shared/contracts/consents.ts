import * as z from 'zod';
import { id, moment, personRef, text } from './primitives.ts';
import { json, route } from './route.ts';

export const purpose = z
  .enum(['assessment', 'supervision', 'teaching', 'sharing-by-link'])
  .meta({ id: 'ConsentPurpose' });
export type Purpose = z.infer<typeof purpose>;

/** Which version of the practice's wording, and since when. */
export const wordingRef = z
  .object({ id, version: z.int(), at: moment })
  .meta({ id: 'ConsentWordingRef', description: 'A version of the practice’s consent wording.' });

const passage = text(2000, 3);
/** What is read out or shown: to all, for each purpose, and what holds for minors and for a withdrawal. */
export const wordingTexts = z
  .object({
    intro: passage,
    assessment: passage,
    supervision: passage,
    teaching: passage,
    'sharing-by-link': passage,
    minors: passage,
    withdrawal: passage,
  })
  .meta({ id: 'ConsentWordingTexts' });
export type WordingTexts = z.infer<typeof wordingTexts>;

export const consentWording = wordingRef
  .extend({
    texts: wordingTexts,
    /** Who wrote it; null: it came with the practice. */
    by: personRef.nullable(),
    note: z.string(),
    /** Consents that were given to these words. */
    consents: z.int(),
  })
  .meta({ id: 'ConsentWording' });
export type ConsentWording = z.infer<typeof consentWording>;

const wordingPage = z
  .object({
    current: consentWording,
    /** Newest first, the current one with them. */
    history: z.array(consentWording),
  })
  .meta({ id: 'ConsentWordingPage' });
export type ConsentWordingPage = z.infer<typeof wordingPage>;

export const wordingBody = z
  .object({
    /** The version that was changed; another one made meanwhile is not passed over. */
    after: z.int(),
    texts: wordingTexts,
    note: text(500, 3),
  })
  .meta({ id: 'ConsentWordingBody' });

export const scanType = z.enum(['application/pdf', 'image/jpeg', 'image/png']);
export type ScanType = z.infer<typeof scanType>;
/** Bytes; a page at 300 dpi weighs about one tenth of it. */
export const MAX_SCAN_BYTES = 10 * 1024 ** 2;
export const consentScan = z
  .object({ type: scanType, bytes: z.int(), at: moment })
  .meta({ id: 'ConsentScan', description: 'The paper, kept as a file beside the consent.' });

export const consentWordingRoutes = {
  consentWording: route({
    method: 'get',
    path: '/api/practice/consent-wording',
    summary: 'What is read out when a consent is asked for, and every version before it.',
    audience: 'staff',
    status: 200,
    answer: json(wordingPage),
  }),
  changeConsentWording: route({
    method: 'post',
    path: '/api/practice/consent-wording',
    summary: 'Write a new version of the wording. Consents keep the version they were given to.',
    audience: 'staff',
    body: wordingBody,
    status: 201,
    answer: json(wordingPage),
    problems: ['not-allowed', 'edited-meanwhile'],
  }),
};
