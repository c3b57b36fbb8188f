import { maySeeCase } from '../access/access.policy.js';
import type { Actor } from '../access/actor.js';
import type { FedEvent } from './live-event-feed.service.js';

/** May this person hear of the event? Whatever is not allowed here is not sent. */
export function mayHear(actor: Actor, { event, found }: FedEvent): boolean {
  if (event.personId) return event.personId === actor.personId;
  if (!event.conferenceId || !actor.roles.has(event.conferenceId)) return false;
  if (!event.caseId) return true;
  if (!found || found.conferenceId !== event.conferenceId) return false;
  // who could read it has to learn that it is gone; before its release they knew nothing of it
  if (found.stage === 'withdrawn' && found.releasedAt) return true;
  return maySeeCase(actor, found);
}
