import { createContext } from 'react';

export interface FrameAccount {
  displayName: string;
  email: string;
  isAdmin: boolean;
  onSignOut: () => void;
}

/** Who is signed in, for the header of every page; null before sign-in. */
export const FrameAccountContext = createContext<FrameAccount | null>(null);
