import { Injectable } from '@nestjs/common';
import { randomUUID } from 'node:crypto';
import { DataSource, type EntityManager, In } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import type { QuorumRule } from '../calc/vocabulary/conference.js';
import { forbidden, invalid, notFound, staleVersion } from '../common/problems/problem.js';
import { isDuplicate } from '../database/database-errors.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { ConferenceAccessService } from './conference-access.service.js';
import { defaultSlotStart, requireSlot } from './conference-slot.js';
import type { ConferenceDto, ConferenceListDto, ConferenceSettingsDto, CreateConferenceDto, UpdateConferenceDto } from './dto/conference.dto.js';
import { Conference } from './entities/conference.entity.js';

const SETTINGS = ['timeZone', 'slotStart', 'slotRule', 'slotMinutes', 'agendaHoursBefore', 'quorumRule', 'consensusRule', 'namesShown'] as const;

// common practice, no source: a conference sets its own
const DEFAULT_QUORUM: QuorumRule = {
  raters: 4,
  disciplines: [
    { discipline: 'revision-surgery', atLeast: 2 },
    { discipline: 'infection-microbiology', atLeast: 1, infectionOnly: true },
  ],
};

@Injectable()
export class ConferencesService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly work: UnitOfWork,
    private readonly access: AccessService,
    private readonly conferenceAccess: ConferenceAccessService,
  ) {}

  async findForActor(actor: Actor): Promise<ConferenceListDto> {
    const where = this.conferenceAccess.isAdministrator(actor) ? {} : { id: In([...actor.roles.keys()]) };
    const conferences = await this.dataSource.manager.find(Conference, { where, order: { name: 'ASC' } });
    return { items: conferences.map((conference) => this.toDto(actor, conference)) };
  }

  async findOne(actor: Actor, id: string): Promise<ConferenceDto> {
    this.conferenceAccess.require(actor, Permission.ConferenceRead, id);
    return this.toDto(actor, await this.require(this.dataSource.manager, id));
  }

  async create(actor: Actor, body: CreateConferenceDto): Promise<ConferenceDto> {
    this.access.site(actor, Permission.ConferencesManage);
    return this.work.run(actor, async (tx) => {
      const id = randomUUID();
      const conference = {
        ...{ timeZone: 'UTC', slotStart: defaultSlotStart(tx.now), slotRule: 'FREQ=WEEKLY', quorumRule: DEFAULT_QUORUM },
        ...settingsOf(body),
        ...{ id, name: body.name, code: body.code },
      };
      requireSlot(conference);
      await tx.manager.insert(Conference, conference).catch(refuseTwice);
      await tx.audit({ action: 'conference.create', recordKind: 'conference', recordId: id, conferenceId: id });
      return this.toDto(actor, await this.require(tx.manager, id));
    });
  }

  async update(actor: Actor, id: string, body: UpdateConferenceDto): Promise<ConferenceDto> {
    this.conferenceAccess.require(actor, Permission.ConferenceSettings, id);
    return this.work.run(actor, async (tx) => {
      const conference = await this.require(tx.manager, id, true);
      if (conference.version !== body.baseVersion)
        throw staleVersion('The settings were changed meanwhile. Look at what is there now, and make your change again.', { current: this.toDto(actor, conference) });
      const changes = { ...settingsOf(body), ...this.nameOf(actor, conference, body) };
      const fields = (Object.keys(changes) as (keyof typeof changes)[]).filter((field) => !isSame(changes[field], conference[field]));
      if (fields.length) {
        requireSlot({ ...conference, ...changes });
        // the version counts edits of the settings: `update` raises it
        await tx.manager.update(Conference, { id }, changes).catch(refuseTwice);
        await tx.audit({ action: 'conference.update', recordKind: 'conference', recordId: id, conferenceId: id, details: { fields } });
        await tx.event({ kind: 'meeting-changed', conferenceId: id });
      }
      return this.toDto(actor, await this.require(tx.manager, id));
    });
  }

  private async require(manager: EntityManager, id: string, lock = false): Promise<Conference> {
    const conference = await manager.findOne(Conference, { where: { id }, ...(lock ? { lock: { mode: 'pessimistic_write' as const } } : {}) });
    if (!conference) throw notFound('conference');
    return conference;
  }

  private nameOf(actor: Actor, conference: Conference, { name }: UpdateConferenceDto): { name?: string } {
    if (name === undefined) return {};
    if (name === null || name.trim() === '') throw invalid('name', 'missing', 'A conference needs a name.');
    if (name.trim() !== conference.name && !this.conferenceAccess.isAdministrator(actor)) throw forbidden('Only an administrator may change the name.');
    return { name: name.trim() };
  }

  private toDto(actor: Actor, conference: Conference): ConferenceDto {
    const { id, name, code, timeZone, slotStart, slotRule, slotMinutes, agendaHoursBefore, quorumRule, consensusRule, namesShown, version } = conference;
    return {
      ...{ id, name, code, timeZone, slotStart, slotRule, slotMinutes, agendaHoursBefore, quorumRule, consensusRule, namesShown, version },
      myRole: actor.roles.get(id) ?? null,
      maySetUp: this.conferenceAccess.maySetUp(actor, id),
    };
  }
}

/** The settings that were sent; null is no value here. */
function settingsOf(body: ConferenceSettingsDto): Partial<Pick<Conference, (typeof SETTINGS)[number]>> {
  const sent = SETTINGS.filter((field) => body[field] !== undefined);
  for (const field of sent) if (body[field] === null) throw invalid(field, 'missing', `${field} can not be emptied. Leave it out to keep it.`);
  return Object.fromEntries(sent.map((field) => [field, body[field]]));
}

const isSame = (one: unknown, other: unknown) => one === other || JSON.stringify(one) === JSON.stringify(other);

const refuseTwice = (error: unknown): never => {
  if (!isDuplicate(error)) throw error;
  const field = /\bcode\b|'[A-Z]{2,6}'/.test((error as Error).message) ? 'code' : 'name';
  throw invalid(field, 'taken', `Another conference has this ${field} already.`);
};
