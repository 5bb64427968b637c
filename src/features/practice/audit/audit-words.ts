import type { AuditEntry } from '#shared/contracts/audit.ts';
import { shortDay } from '#src/ui/days.ts';
import { paths } from '#src/ui/paths.ts';

/** `family name` of `familyName` */
const spaced = (code: string) => code.replace(/([A-Z])/g, ' $1').toLowerCase();

/** Somebody who is no user, in words. */
const OTHERS = {
  link: 'Whoever has the link',
  product: 'Redshank itself',
  nobody: 'Somebody not signed in',
} as const;

export const whoWords = ({ actor, by }: AuditEntry): string =>
  actor === 'user' ? (by?.name ?? 'An account that is gone') : OTHERS[actor];

/** Parts of a record whose names in the file say too little. */
const PARTS: Readonly<Record<string, string>> = {
  items: 'exercises',
  retestOn: 'day of the retest',
  filming: 'how it was filmed',
  setUpId: 'set-up',
  geometry: 'figures of the filming',
  coachId: 'coach',
};

/** What something was made by or as, where that is no role. */
const AS: Readonly<Record<string, string>> = {
  reading: 'by the measured reading',
  call: 'by what was seen',
  csv: 'as CSV',
  pdf: 'as PDF',
  webvtt: 'as captions',
  'web-annotation': 'as annotations',
};

/** What details say to a person; ids and sizes are for the file. */
const DETAILS: Partial<Record<keyof NonNullable<AuditEntry['detail']>, (value: string) => string>> =
  {
    as: (as) => AS[as] ?? `as ${as}`,
    cleared: (cleared) => (cleared === 'true' ? 'cleared by a colleague' : ''),
    fields: (fields) =>
      fields
        .split(' ')
        .map((field) => PARTS[field] ?? spaced(field))
        .join(', '),
    frames: (frames) => (frames === '1' ? '1 frame' : `${frames} frames`),
    on: (on) => (on === 'true' ? 'on' : 'off'),
    resolved: (resolved) => (resolved === 'true' ? 'resolved' : 'reopened'),
    rows: (rows) => (rows === '1' ? '1 entry' : `${rows} entries`),
    side: (side) => `${side} support`,
    tried: (tried) => {
      const [thing = '', act = ''] = tried.split('.');
      return `wanted: ${thing} ${act}`.replaceAll('-', ' ');
    },
    version: (version) => `version ${version}`,
    yes: (yes) => (yes === '0' ? 'nothing answered with yes' : `${yes} answered with yes`),
  };

export const detailWords = ({ detail }: AuditEntry): string =>
  Object.entries(detail ?? {})
    .flatMap(([key, value]) => {
      const words = DETAILS[key as keyof typeof DETAILS]?.(String(value)) ?? '';
      return words === '' || value === null ? [] : [words];
    })
    .join('; ');

const isOfVisit = (kind: AuditEntry['subject']['kind']): boolean =>
  kind === 'visit' || kind === 'reading';

/** What the thing is called; a visit, and what was read at it, by its day. */
export const nameWords = ({ subject: { kind, name } }: AuditEntry): string | null =>
  name !== null && isOfVisit(kind) ? shortDay(name) : name;

/** Where the thing is shown, as long as it is there. */
export const placeOf = ({ subject: { kind, id, name } }: AuditEntry): string | null => {
  if (name === null) return null;
  if (kind === 'clip') return paths.bench(id);
  return isOfVisit(kind) ? paths.visit(id) : null;
};
