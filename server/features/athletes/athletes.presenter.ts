import type { Athlete, Consent as ConsentShape } from '#shared/contracts/athletes.ts';
import { presentWordingRef } from '../consents/wording.presenter.ts';
import { presentPerson } from '../accounts/accounts.presenter.ts';
import type { Page } from './athlete-list.ts';
import type { AthleteRow, CoachRow } from './athlete-rows.ts';
import type { Consent } from './consent.entity.ts';
import { isMinor, today } from './days.ts';

export const presentAthlete = (row: AthleteRow): Athlete => ({
  id: row.id,
  givenName: row.given_name,
  familyName: row.family_name,
  birthDate: row.birth_date,
  minor: isMinor(row.birth_date),
  heightMm: row.height_mm,
  sport: row.sport,
  cautions: row.cautions,
  contactEmail: row.contact_email,
  coach: { id: row.coach_id, name: row.coach_name },
  consentedTo: row.consented_to ?? [],
  consentUntil: row.consent_until,
  assentMissing:
    row.assent_missing &&
    isMinor(row.birth_date) &&
    !(row.consented_to ?? []).includes('assessment'),
  deletionDue: row.deletion_due,
  lastVisit: row.last_visit,
  visitCount: row.visit_count,
  version: row.version,
  createdAt: new Date(row.created_at).toISOString(),
});

export const presentAthletes = (
  page: Page<AthleteRow> & { readonly coaches: readonly CoachRow[] },
) => ({
  ...page,
  items: page.items.map(presentAthlete),
  coaches: page.coaches.map(presentPerson),
});

const stateOf = (consent: Consent): ConsentShape['state'] => {
  if (consent.withdrawnAt) return 'withdrawn';
  if (consent.validUntil < today()) return 'lapsed';
  return isMinor(consent.athlete.unwrap().birthDate) && !consent.assent
    ? 'assent-missing'
    : 'valid';
};

/** @param consent with `recordedBy`, `wording` and `athlete` loaded */
export const presentConsent = (consent: Consent): ConsentShape => ({
  id: consent.id,
  givenBy: consent.givenBy,
  guardianName: consent.guardianName ?? null,
  guardianRelation: consent.guardianRelation ?? null,
  assent: consent.assent,
  purposes: consent.purposes,
  held: consent.held,
  withdrawals: consent.withdrawals.map(({ purpose, at }) => ({ purpose, at })),
  wording: consent.wording ? presentWordingRef(consent.wording.unwrap()) : null,
  scan: consent.scan
    ? { type: consent.scan.type, bytes: consent.scan.bytes, at: consent.scan.at }
    : null,
  validFrom: consent.validFrom,
  validUntil: consent.validUntil,
  how: consent.how,
  state: stateOf(consent),
  recordedBy: presentPerson(consent.recordedBy.unwrap()),
  recordedAt: consent.recordedAt.toISOString(),
  withdrawnAt: consent.withdrawnAt?.toISOString() ?? null,
});
