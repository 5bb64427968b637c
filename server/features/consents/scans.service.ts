import { Readable } from 'node:stream';
import type { Action } from '#shared/access/actions.ts';
import type { UserActor } from '#shared/access/actors.ts';
import type { Unit } from '#server/db/in-practice.ts';
import { found, needCaseload } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import type { Ground } from '../../main/ground.ts';
import { athletePrefix } from '../athletes/athlete-files.ts';
import type { Athlete } from '../athletes/athlete.entity.ts';
import { Consent, type Scan } from '../athletes/consent.entity.ts';
import { audit } from '../audit/audit.ts';
import { cleanScan } from './scan/clean-scan.ts';

type Of = Unit<UserActor>;
type Place = Pick<Ground, 'inPractice' | 'storage'>;

/** @throws Problem 'not-found' or 'not-allowed' */
export const consentInSight = async (
  { em, actor }: Of,
  id: string,
  action: Action,
): Promise<Consent> => {
  const consent = found(
    await em.findOne(Consent, { id }, { populate: ['athlete', 'recordedBy', 'wording'] }),
  ) as Consent;
  needCaseload(actor, action, consent.athlete.unwrap());
  return consent;
};

/** One file a version, so that a scan that replaces another never mixes with it. */
export const scanKey = (consent: Consent, { at }: Pick<Scan, 'at'>): string =>
  `${athletePrefix(consent.practiceId, (consent.athlete.unwrap() as Athlete).id)}/consents/${consent.id}-${Date.parse(at)}`;

/** Where the scan lies, for whoever may see the athlete. */
export const scanInSight = async (unit: Of, id: string): Promise<Scan & { key: string }> => {
  const consent = await consentInSight(unit, id, 'athlete.read');
  const { scan } = consent;
  if (!scan) throw new Problem('not-found');
  audit(unit, 'consent.read-scan', id, { athlete: consent.athlete.id });
  return { ...scan, key: scanKey(consent, scan) };
};

/**
 * Keeps the scan of the paper without what it says of place and device. The file lies there before the row names it;
 * one that it replaces is deleted afterwards.
 */
export const keepScan = async (
  { inPractice, storage }: Place,
  actor: UserActor,
  id: string,
  given: Buffer,
): Promise<Consent> => {
  const { type, bytes } = cleanScan(given);
  const scan: Scan = { type, bytes: bytes.length, at: new Date().toISOString(), byId: actor.id };
  const key = await inPractice(actor, async (unit) =>
    scanKey(await consentInSight(unit, id, 'consent.record'), scan),
  );
  await storage.putStream(key, Readable.from([bytes]), type);
  try {
    const { consent, old } = await inPractice(actor, async (unit) => {
      // two who send one at once replace each other in turn, and the file that loses is deleted
      await unit.em.execute('select 1 from consent where id = ? for update', [id]);
      const consent = await consentInSight(unit, id, 'consent.record');
      const old = consent.scan ? scanKey(consent, consent.scan) : null;
      consent.scan = scan;
      audit(unit, 'consent.scan', id, {
        athlete: consent.athlete.id,
        as: type.split('/')[1] ?? '',
        bytes: scan.bytes,
      });
      await unit.em.flush();
      return { consent, old };
    });
    if (old !== null && old !== key) await storage.delete(old);
    return consent;
  } catch (error) {
    await storage.delete(key);
    throw error;
  }
};

/** Takes the scan away again: the wrong paper, or another person's. */
export const removeScan = async (
  { inPractice, storage }: Place,
  actor: UserActor,
  id: string,
): Promise<Consent> => {
  const { consent, key } = await inPractice(actor, async (unit) => {
    const consent = await consentInSight(unit, id, 'consent.record');
    const key = consent.scan ? scanKey(consent, consent.scan) : null;
    if (key !== null) audit(unit, 'consent.delete-scan', id, { athlete: consent.athlete.id });
    consent.scan = null;
    await unit.em.flush();
    return { consent, key };
  });
  if (key !== null) await storage.delete(key);
  return consent;
};
