import type { Request, RequestHandler } from 'express';
import multer from 'multer';
import { MAX_SCAN_BYTES } from '#shared/contracts/consents.ts';
import type { Ground } from '../../main/ground.ts';
import { formFault } from '../../http/form-fault.ts';
import { Problem } from '../../http/problem.ts';
import { staffOf } from '../../http/session.ts';
import { consentInSight } from './scans.service.ts';

const TOO_LARGE = 'A scan may weigh up to 10 MB. Scan it in grey at 300 dpi, or photograph it.';

const problemOf = (error: unknown): unknown => {
  if (!(error instanceof multer.MulterError)) return formFault(error);
  if (error.code === 'LIMIT_FILE_SIZE') return new Problem('body-too-large', TOO_LARGE);
  return new Problem('invalid-input', undefined, [
    { path: `body.${error.field ?? 'scan'}`, message: 'Send one file, in the field ‘scan’.' },
  ]);
};

const readForm: RequestHandler = (req, res, next) => {
  if (!req.is('multipart/form-data'))
    throw new Problem('unsupported-media-type', 'Send the scan as multipart/form-data.');
  multer({
    storage: multer.memoryStorage(),
    limits: { fileSize: MAX_SCAN_BYTES, files: 1, fields: 0, parts: 1 },
  }).single('scan')(req, res, (error: unknown) => {
    if (error) next(problemOf(error));
    else next();
  });
};

/** Who asks is settled before the body is read. */
export const scanGate = ({ inPractice }: Ground): readonly RequestHandler[] => [
  async (req, res, next) => {
    await inPractice(staffOf(res).actor, (unit) =>
      consentInSight(unit, String(req.params.id), 'consent.record'),
    );
    next();
  },
  readForm,
];

/** The bytes that the form brought. */
export const scanOf = ({ file }: Request): Buffer => {
  if (!file || file.size === 0)
    throw new Problem('invalid-input', undefined, [
      { path: 'body.scan', message: 'Choose the scan: a PDF, a JPEG or a PNG.' },
    ]);
  return file.buffer;
};
