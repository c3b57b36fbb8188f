import type { Stage } from '../calc/vocabulary/case.js';
import type { Actor } from './actor.js';
import { Permission } from './permission.js';
import { ADMINISTRATOR_PERMISSIONS, OWN_CASE_ONLY, ROLE_PERMISSIONS, TREATING_SURGEON_ONLY } from './role-permissions.js';

/** What the policy has to know of a case. */
export interface CaseFacts {
  conferenceId: string;
  presenterId: string;
  treatingSurgeonId: string;
  stage: Stage;
}

/** May this person do this somewhere in the whole site (administrator's things)? */
export const mayOnSite = (actor: Actor, permission: Permission): boolean =>
  actor.isAdministrator && ADMINISTRATOR_PERMISSIONS.has(permission);

/** May this member do this in the conference? */
export function mayInConference(actor: Actor, permission: Permission, conferenceId: string): boolean {
  const role = actor.roles.get(conferenceId);
  return role !== undefined && ROLE_PERMISSIONS[role].has(permission);
}

/**
 * May this person know that the case exists? A draft is its presenter's alone; a case being checked
 * is the presenter's and the coordinators'; a withdrawn one also the chair's; the others every member's.
 */
export function maySeeCase(actor: Actor, facts: CaseFacts): boolean {
  const role = actor.roles.get(facts.conferenceId);
  if (!role) return false;
  if (facts.presenterId === actor.personId) return true;
  switch (facts.stage) {
    case 'draft':
      return false;
    case 'checking':
      return role === 'coordinator';
    case 'withdrawn':
      return role === 'coordinator' || role === 'chair';
    default:
      return true;
  }
}

/** May this person do this to the case? Whether its stage allows it is asked by the use case. */
export function mayOnCase(actor: Actor, permission: Permission, facts: CaseFacts): boolean {
  if (!maySeeCase(actor, facts)) return false;
  if (OWN_CASE_ONLY.has(permission) && facts.presenterId !== actor.personId) return false;
  if (TREATING_SURGEON_ONLY.has(permission) && facts.treatingSurgeonId !== actor.personId) return false;
  return mayInConference(actor, permission, facts.conferenceId);
}
