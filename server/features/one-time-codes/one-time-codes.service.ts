import { randomBytes } from 'node:crypto';
import type * as z from 'zod';
import type { codeBody, provenBody } from '#shared/contracts/one-time-codes.ts';
import { found } from '../../http/need.ts';
import { Problem } from '../../http/problem.ts';
import type { Sealer } from '../../main/sealer.ts';
import { notify } from '../accounts/notices.ts';
import { endSessionsOf } from '../accounts/open-session.ts';
import { needPassword, type Work } from '../accounts/own-account.ts';
import { User } from '../accounts/user.entity.ts';
import { audit } from '../audit/audit.ts';
import { Practice } from '../practice/practice.entity.ts';
import { base32 } from './base32.ts';
import { dropCodes } from './drop-codes.ts';
import { makeRecoveryCodes } from './recovery-codes.ts';
import { lockedUser, takeCode, takeDeviceCode } from './take-code.ts';

/** 160 bits, the length of the hash (RFC 4226, section 4). */
const SECRET_BYTES = 20;

type Proven = z.output<typeof provenBody>;

/**
 * Makes a secret; until its first code it changes nothing.
 * @throws Problem 'password-wrong' or 'codes-on'
 */
export const startCodes = async (
  work: Work,
  sealer: Sealer,
  password: string,
): Promise<{ secret: string; uri: string }> => {
  await needPassword(work, password);
  return work(async ({ em, actor }) => {
    const user = found(await lockedUser(em, actor.id));
    if (user.codesSince) throw new Problem('codes-on');
    const bytes = randomBytes(SECRET_BYTES);
    const codeSecret = sealer.seal(bytes, user.id);
    await em.nativeUpdate(User, { id: user.id }, { codeSecret, lastCodeStep: null });
    const secret = base32(bytes);
    const label = encodeURIComponent(`Redshank:${user.email}`);
    return { secret, uri: `otpauth://totp/${label}?secret=${secret}&issuer=Redshank` };
  });
};

/**
 * Turns codes on and ends the sessions that began without one.
 * @param sessionId the session that goes on
 * @throws Problem 'code-wrong' or 'codes-on'
 */
export const confirmCodes = (
  work: Work,
  sealer: Sealer,
  { code }: z.output<typeof codeBody>,
  sessionId: string,
): Promise<{ recoveryCodes: string[] }> =>
  work(async (unit) => {
    const { em, actor } = unit;
    const user = found(await lockedUser(em, actor.id));
    if (user.codesSince) throw new Problem('codes-on');
    await takeDeviceCode(em, user, sealer, code);
    await em.nativeUpdate(User, { id: user.id }, { codesSince: new Date() });
    const recoveryCodes = await makeRecoveryCodes(em, user.id);
    await endSessionsOf(unit, user.id, sessionId);
    audit(unit, 'account.codes-on', user.id);
    await notify(unit, user.id, 'codes-on');
    return { recoveryCodes };
  });

/** @throws Problem 'password-wrong', 'codes-off' or 'code-wrong' */
export const renewRecoveryCodes = async (
  work: Work,
  sealer: Sealer,
  { password, code }: Proven,
): Promise<{ recoveryCodes: string[] }> => {
  await needPassword(work, password);
  return work(async (unit) => {
    const { em, actor } = unit;
    const user = found(await lockedUser(em, actor.id));
    if (!user.codesSince) throw new Problem('codes-off');
    await takeCode(em, user, sealer, code);
    const recoveryCodes = await makeRecoveryCodes(em, user.id);
    audit(unit, 'account.recovery-renew', user.id);
    await notify(unit, user.id, 'recovery-renewed');
    return { recoveryCodes };
  });
};

/**
 * Turns codes off. Asks for password and code: neither who found an open session nor who found the device alone can
 * do it.
 * @throws Problem 'password-wrong', 'codes-off', 'code-wrong', or 'codes-needed' where the practice asks its owners
 * for them
 */
export const stopCodes = async (
  work: Work,
  sealer: Sealer,
  { password, code }: Proven,
): Promise<void> => {
  await needPassword(work, password);
  await work(async (unit) => {
    const { em, actor } = unit;
    const user = found(await lockedUser(em, actor.id));
    if (!user.codesSince) throw new Problem('codes-off');
    const { ownersNeedCode } = await em.findOneOrFail(Practice, { id: actor.practiceId });
    if (user.role === 'owner' && ownersNeedCode) throw new Problem('codes-needed');
    await takeCode(em, user, sealer, code);
    await dropCodes(em, user.id);
    audit(unit, 'account.codes-off', user.id);
    await notify(unit, user.id, 'codes-off');
  });
};
