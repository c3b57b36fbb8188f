import type { Role } from '../calc/vocabulary/people.js';

/** The signed-in person of a request, with what the policy needs. */
export interface Actor {
  personId: string;
  sessionId: string;
  name: string;
  isAdministrator: boolean;
  /** conference id → role */
  roles: ReadonlyMap<string, Role>;
  /** Where the request came from. */
  address: string;
}
