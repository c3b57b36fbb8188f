import { Injectable } from '@nestjs/common';
import { DataSource, type EntityManager } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import type { Permission } from '../access/permission.js';
import { MEETING_STATE_WORDS, type MeetingState } from '../calc/vocabulary/meetings.js';
import { notFound, wrongStage } from '../common/problems/problem.js';
import { Conference } from '../conferences/entities/conference.entity.js';
import { Meeting } from './entities/meeting.entity.js';

/** A meeting of a conference whose member one is not does not exist for one. */
@Injectable()
export class MeetingAccessService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly access: AccessService,
  ) {}

  /** The meeting with its conference; its row locked where `lock` is given inside a transaction. */
  async meeting(
    actor: Actor,
    permission: Permission,
    id: string,
    options: { states?: readonly MeetingState[]; manager?: EntityManager; lock?: boolean } = {},
  ): Promise<Meeting> {
    const manager = options.manager ?? this.dataSource.manager;
    const found = await manager.findOne(Meeting, {
      where: { id },
      ...(options.lock ? { lock: { mode: 'pessimistic_write' as const } } : { relations: { conference: true } }),
    });
    if (!found || !actor.roles.has(found.conferenceId)) throw notFound('meeting');
    this.access.conference(actor, permission, found.conferenceId);
    if (options.states && !options.states.includes(found.state))
      throw wrongStage(`The meeting is '${MEETING_STATE_WORDS[found.state]}'; this is possible for: ${options.states.map((state) => MEETING_STATE_WORDS[state]).join(', ')}.`);
    // after the lock, so that only the meeting's row is held and not the conference's
    if (options.lock) found.conference = await manager.findOneByOrFail(Conference, { id: found.conferenceId });
    return found;
  }
}
