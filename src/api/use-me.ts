import { createContext, useContext } from 'react';
import type { Me } from '../../server/contract/session';

/** Filled by the guard before every page that needs a session. */
export const MeContext = createContext<Me | null>(null);

/** The person signed in. */
export function useMe(): Me {
  const me = useContext(MeContext);
  if (me === null) throw new Error('This page stands outside the sign-in guard.');
  return me;
}
