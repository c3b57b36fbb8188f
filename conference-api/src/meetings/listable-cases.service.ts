import { Injectable } from '@nestjs/common';
import { DataSource, type EntityManager, In } from 'typeorm';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { caseReadiness } from '../calc/cases/readiness.js';
import { URGENCIES } from '../calc/vocabulary/case.js';
import type { Projection } from '../calc/vocabulary/images.js';
import { Case } from '../cases/entities/case.entity.js';
import { toPersonRef } from '../common/people/person-ref.js';
import { CaseImage } from '../images/entities/case-image.entity.js';
import type { ListableCasesDto } from './dto/meeting.dto.js';
import { MeetingAccessService } from './meeting-access.service.js';
import { MeetingViewService } from './meeting-view.service.js';

const MOST = 200;

export interface Listability {
  canBeListed: boolean;
  missing: string[];
}

/** The open cases of a conference, the urgent first, and what each lacks for a place on an agenda. */
@Injectable()
export class ListableCasesService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly meetings: MeetingAccessService,
    private readonly view: MeetingViewService,
  ) {}

  async find(actor: Actor, meetingId: string): Promise<ListableCasesDto> {
    const { conferenceId } = await this.meetings.meeting(actor, Permission.AgendaWrite, meetingId);
    const { manager } = this.dataSource;
    const cases = await manager.find(Case, {
      where: { conferenceId, stage: 'open' },
      relations: { presenter: { unit: true } },
      order: { releasedAt: 'ASC', id: 'ASC' },
      take: MOST,
    });
    const [ratings, readiness] = await Promise.all([this.view.countRatings(manager, cases.map((found) => found.id)), this.readinessOf(manager, cases)]);
    const byUrgency = [...cases].sort((a, b) => URGENCIES.indexOf(b.urgency) - URGENCIES.indexOf(a.urgency));
    return {
      items: byUrgency.map((found) => ({
        id: found.id,
        code: found.code,
        title: found.title,
        urgency: found.urgency,
        presenter: toPersonRef(found.presenter),
        releasedAt: found.releasedAt?.toISOString() ?? null,
        ratings: ratings.get(found.id) ?? 0,
        ...readiness.get(found.id)!,
      })),
    };
  }

  /** For all cases by one query. */
  async readinessOf(manager: EntityManager, cases: Pick<Case, 'id' | 'content'>[]): Promise<ReadonlyMap<string, Listability>> {
    if (!cases.length) return new Map();
    const images = await manager.find(CaseImage, {
      where: { caseId: In(cases.map((found) => found.id)), state: 'ready' },
      select: { id: true, caseId: true, projection: true },
    });
    const projections = new Map<string, Projection[]>();
    for (const { caseId, projection } of images) projections.set(caseId, [...(projections.get(caseId) ?? []), projection]);
    return new Map(
      cases.map(({ id, content }) => {
        const { items, canBeListed } = caseReadiness(content, projections.get(id) ?? []);
        return [id, { canBeListed, missing: items.filter((item) => !item.done && item.weight !== 'advice').map((item) => item.label) }];
      }),
    );
  }
}
