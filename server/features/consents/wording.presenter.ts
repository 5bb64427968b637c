import type * as z from 'zod';
import type { ConsentWording as Shape, wordingRef } from '#shared/contracts/consents.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import type { ConsentWording } from './consent-wording.entity.ts';

export const presentWordingRef = ({
  id,
  version,
  at,
}: Pick<ConsentWording, 'id' | 'version' | 'at'>): z.infer<typeof wordingRef> => ({
  id,
  version,
  at: at.toISOString(),
});

/** @param wording with `by` loaded */
export const presentWording = (wording: ConsentWording, consents: number): Shape => ({
  ...presentWordingRef(wording),
  texts: wording.texts,
  by: wording.by ? presentPerson(wording.by.unwrap()) : null,
  note: wording.note,
  consents,
});
