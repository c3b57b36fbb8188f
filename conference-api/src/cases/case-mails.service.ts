import { Injectable } from '@nestjs/common';
import { type EntityManager, In, Not } from 'typeorm';
import { RATING_ROLES } from '../calc/vocabulary/people.js';
import { Settings } from '../config/settings.js';
import { Conference } from '../conferences/entities/conference.entity.js';
import { Membership } from '../conferences/entities/membership.entity.js';
import type { Transaction } from '../database/unit-of-work.js';
import { Person } from '../people/entities/person.entity.js';
import type { Case } from './entities/case.entity.js';

/** What is told by mail of a case on its way to the panel: code and link, nothing clinical. */
@Injectable()
export class CaseMailsService {
  constructor(private readonly settings: Settings) {}

  /** To the presenter. Returned twice at one version is told twice, hence the time of posting in the purpose. */
  async returned(tx: Transaction, found: Case): Promise<void> {
    const presenter = await this.presenterOf(tx.manager, found);
    if (!presenter) return;
    const posted = found.postedAt?.getTime() ?? 0;
    await tx.mail([
      {
        purpose: `case-returned:${found.id}:${found.version}:${posted}:${presenter.id}`,
        personId: presenter.id,
        recipient: presenter.email,
        template: 'case-returned',
        data: { name: presenter.name, code: found.code, url: this.urlOf(found) },
      },
    ]);
  }

  /** To the presenter that it is out, to all others who may rate that their rating is due. */
  async released(tx: Transaction, found: Case): Promise<void> {
    const conference = await tx.manager.findOneByOrFail(Conference, { id: found.conferenceId });
    const presenter = await this.presenterOf(tx.manager, found);
    const raters = await tx.manager.find(Membership, {
      where: { conferenceId: found.conferenceId, role: In([...RATING_ROLES]), personId: Not(found.presenterId), person: { isActive: true } },
      relations: { person: true },
    });
    const facts = { code: found.code, conference: conference.name, url: this.urlOf(found) };
    await tx.mail([
      ...(presenter
        ? [
            {
              purpose: `case-released:${found.id}:${found.version}:${presenter.id}`,
              personId: presenter.id,
              recipient: presenter.email,
              template: 'case-released',
              data: { name: presenter.name, ...facts },
            },
          ]
        : []),
      ...raters.map(({ person }) => ({
        purpose: `rating-due:${found.id}:1:${person.id}`,
        personId: person.id,
        recipient: person.email,
        template: 'rating-due',
        data: { name: person.name, code: facts.code, url: facts.url },
      })),
    ]);
  }

  private presenterOf(manager: EntityManager, found: Case): Promise<Person | null> {
    return manager.findOneBy(Person, { id: found.presenterId, isActive: true });
  }

  private urlOf(found: Case): string {
    return `${this.settings.publicUrl}/cases/${found.id}`;
  }
}
