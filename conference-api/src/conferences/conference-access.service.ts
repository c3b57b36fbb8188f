import { Injectable } from '@nestjs/common';
import { mayInConference, mayOnSite } from '../access/access.policy.js';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';

/** What an administrator may do with every conference as such, and a member of the right role with the own one. */
@Injectable()
export class ConferenceAccessService {
  constructor(private readonly access: AccessService) {}

  isAdministrator(actor: Actor): boolean {
    return mayOnSite(actor, Permission.ConferencesManage);
  }

  require(actor: Actor, permission: Permission, conferenceId: string): void {
    if (!this.isAdministrator(actor)) this.access.conference(actor, permission, conferenceId);
  }

  maySetUp(actor: Actor, conferenceId: string): boolean {
    return this.isAdministrator(actor) || mayInConference(actor, Permission.ConferenceSettings, conferenceId);
  }
}
