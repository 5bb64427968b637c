import * as z from 'zod';
import { me } from './accounts.ts';
import { json, none, route } from './route.ts';

const password = z.string().min(1, 'Write your present password.').max(200);
/** Six digits of the device, or a recovery code. */
const code = z.string().trim().min(1, 'Write the code.').max(60);

export const codeBody = z.object({ code }).meta({ id: 'Code' });
export const startCodesBody = z.object({ password }).meta({ id: 'StartCodes' });
export const provenBody = z.object({ password, code }).meta({ id: 'PasswordAndCode' });

/** What an authenticator takes: the secret in base 32, and the same with its names as an `otpauth:` address. */
const codeSecret = z.object({ secret: z.string(), uri: z.string() }).meta({ id: 'CodeSecret' });

/** Shown once; hashes are kept. */
const recoveryCodeList = z
  .object({ recoveryCodes: z.array(z.string()) })
  .meta({ id: 'RecoveryCodes' });

export const oneTimeCodeRoutes = {
  signInCode: route({
    method: 'post',
    path: '/api/sign-in/code',
    summary: 'The second step of a sign-in: a one-time code or a recovery code opens the session.',
    audience: 'anyone',
    body: codeBody,
    status: 200,
    answer: json(me),
    problems: ['half-gone', 'code-wrong', 'too-many-tries'],
  }),
  startCodes: route({
    method: 'post',
    path: '/api/account/codes',
    summary:
      'Begin to set up one-time codes: a secret for one’s device. They are on once confirmed.',
    audience: 'staff',
    beforeCodes: true,
    body: startCodesBody,
    status: 200,
    answer: json(codeSecret),
    problems: ['password-wrong', 'codes-on', 'too-many-tries'],
  }),
  confirmCodes: route({
    method: 'post',
    path: '/api/account/codes/confirm',
    summary: 'Turn one-time codes on with the first code. Every other session of the account ends.',
    audience: 'staff',
    beforeCodes: true,
    body: codeBody,
    status: 200,
    answer: json(recoveryCodeList),
    problems: ['code-wrong', 'codes-on', 'too-many-tries'],
  }),
  renewRecoveryCodes: route({
    method: 'post',
    path: '/api/account/codes/recovery',
    summary: 'Make new recovery codes; the ones before open nothing any more.',
    audience: 'staff',
    body: provenBody,
    status: 200,
    answer: json(recoveryCodeList),
    problems: ['password-wrong', 'codes-off', 'code-wrong', 'too-many-tries'],
  }),
  stopCodes: route({
    method: 'post',
    path: '/api/account/codes/stop',
    summary: 'Turn one-time codes off.',
    audience: 'staff',
    body: provenBody,
    status: 204,
    answer: none,
    problems: ['password-wrong', 'codes-off', 'code-wrong', 'codes-needed', 'too-many-tries'],
  }),
};
