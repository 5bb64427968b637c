import type { Role } from '#shared/contracts/accounts.ts';

export const ROLES: readonly { value: Role; label: string; note: string }[] = [
  { value: 'coach', label: 'Coach', note: 'films, marks and plans for athletes of their own' },
  {
    value: 'supervisor',
    label: 'Supervisor',
    note: 'sees the athletes of the coaches you name, comments and marks a second time',
  },
  { value: 'owner', label: 'Owner', note: 'sees everything, and invites and manages people' },
];

export const roleLabel = (role: Role): string =>
  ROLES.find(({ value }) => value === role)?.label ?? role;
