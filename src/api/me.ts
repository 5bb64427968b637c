import { createContext, useContext } from 'react';
import type { Me } from '#shared/contracts/accounts.ts';

export const MeContext = createContext<Me | null>(null);

/** The person signed in. Only inside the staff frame. */
export function useMe(): Me {
  const me = useContext(MeContext);
  if (me === null) throw new Error('useMe outside the staff frame');
  return me;
}
