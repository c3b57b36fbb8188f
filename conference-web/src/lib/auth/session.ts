import { createContext, useContext } from 'react';
import type { Role } from '@kerfside/calc/vocabulary/people.js';
import type { Schemas } from '../api/types';

export type Me = Schemas['MeDto'];

/**
 * `ended`: somebody was signed in here and the server no longer knows the session. The page stays as it is, with
 * what was typed, until the same person signs in again.
 */
export type SessionState =
  | { status: 'loading' }
  | { status: 'unreachable'; error: Error }
  | { status: 'signed-out' }
  | { status: 'signed-in'; me: Me }
  | { status: 'ended'; me: Me };

export interface Session {
  state: SessionState;
  signIn: (email: string, password: string) => Promise<void>;
  /** Takes over a token that another route gave, such as an accepted invitation. */
  takeToken: (token: Schemas['AccessTokenDto']) => Promise<void>;
  signOut: () => Promise<void>;
  retry: () => void;
}

export const SessionContext = createContext<Session | null>(null);

export function useSession(): Session {
  const session = useContext(SessionContext);
  if (!session) throw new Error('useSession needs the SessionProvider around it');
  return session;
}

/** Who is signed in. Only below RequireSession. */
export function useMe(): Me {
  const { state } = useSession();
  if (state.status !== 'signed-in' && state.status !== 'ended') throw new Error('useMe needs RequireSession around it');
  return state.me;
}

/** The role held in a conference; null where there is none. */
export const roleIn = (me: Me, conferenceId: string): Role | null =>
  me.memberships.find((membership) => membership.conferenceId === conferenceId)?.role ?? null;
