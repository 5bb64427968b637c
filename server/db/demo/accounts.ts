import type { Role } from '#shared/access/actors.ts';

/** The demo's practices and people, invented for Redshank. The ids are fixed so that a start finds them again. */
export const GREYWATER = '6f1d2a0e-5c1b-4c57-9d55-0a3f1e2b7c01';
export const PENNYWORT = '6f1d2a0e-5c1b-4c57-9d55-0a3f1e2b7c02';

export interface DemoAccount {
  readonly practiceId: string;
  readonly role: Role;
  readonly name: string;
  readonly email: string;
}

const account = (practiceId: string, role: Role, name: string, domain: string): DemoAccount => ({
  practiceId,
  role,
  name,
  email: `${role}@${domain}`,
});

export const DEMO_ACCOUNTS = {
  owner: account(GREYWATER, 'owner', 'Maren Holt', 'greywater-row.example'),
  supervisor: account(GREYWATER, 'supervisor', 'Ines Falk', 'greywater-row.example'),
  coach: account(GREYWATER, 'coach', 'Jonas Reed', 'greywater-row.example'),
  foreignCoach: account(PENNYWORT, 'coach', 'Tilda Marsh', 'pennywort-mill.example'),
} as const satisfies Record<string, DemoAccount>;
