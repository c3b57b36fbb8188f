import { Injectable } from '@nestjs/common';
import type { Actor } from '../access/actor.js';
import type { Case } from '../cases/entities/case.entity.js';
import { Settings } from '../config/settings.js';
import type { Transaction } from '../database/unit-of-work.js';
import { Person } from '../people/entities/person.entity.js';

/** Who is told by mail of what was said: code, names and link; what was said stays on the page. */
@Injectable()
export class RemarkMailsService {
  constructor(private readonly settings: Settings) {}

  async questionAsked(tx: Transaction, actor: Actor, found: Case, threadId: string): Promise<void> {
    const presenter = await tx.manager.findOneBy(Person, { id: found.presenterId, isActive: true });
    if (!presenter) return;
    await tx.mail([
      {
        purpose: `question-asked:${threadId}:${presenter.id}`,
        personId: presenter.id,
        recipient: presenter.email,
        template: 'question-asked',
        data: { name: presenter.name, code: found.code, asker: actor.name, url: this.urlOf(found) },
      },
    ]);
  }

  /** Once for a remark and a person, also where the remark is edited later. */
  async mentioned(tx: Transaction, actor: Actor, found: Case, remarkId: string, people: Person[]): Promise<void> {
    await tx.mail(
      people
        .filter((person) => person.id !== actor.personId)
        .map((person) => ({
          purpose: `mention:${remarkId}:${person.id}`,
          personId: person.id,
          recipient: person.email,
          template: 'mention',
          data: { name: person.name, code: found.code, author: actor.name, url: this.urlOf(found) },
        })),
    );
  }

  private urlOf(found: Case): string {
    return `${this.settings.publicUrl}/cases/${found.id}`;
  }
}
