import { compare, hash } from 'bcryptjs';

/** About 0.3 s on one core of 2020: slow enough for a stolen table, bearable at a sign-in. */
const COST = 12;

/** bcrypt reads 72 bytes; longer pass phrases are refused where they are set. */
export const hashPassword = (password: string, cost = COST): Promise<string> =>
  hash(password, cost);

/** The hash of a password that nobody has: an unknown address costs the same time as a wrong password. */
const NOBODYS = '$2b$12$RLlDRJKwniYI2OIqlV9fQuMaMsH.Tgo8bdyCVs/q/NScjqXgg9QWe';

export const passwordFits = (
  password: string,
  passwordHash: string | undefined,
): Promise<boolean> => compare(password, passwordHash ?? NOBODYS);
