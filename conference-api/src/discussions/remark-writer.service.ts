import { Injectable } from '@nestjs/common';
import type { Actor } from '../access/actor.js';
import type { Case } from '../cases/entities/case.entity.js';
import type { Transaction } from '../database/unit-of-work.js';
import type { Person } from '../people/entities/person.entity.js';
import { Mention } from './entities/mention.entity.js';
import { Remark } from './entities/remark.entity.js';
import type { Thread } from './entities/thread.entity.js';
import { RemarkContentService } from './remark-content.service.js';
import { RemarkMailsService } from './remark-mails.service.js';

export interface NewRemark {
  content: unknown;
  replyToId: string | null;
  /** People who hear of it in another way. */
  toldAlready: string[];
}

/** Writes one remark with its mentions, mails, audit entry and event: the first of a thread, or a reply. */
@Injectable()
export class RemarkWriterService {
  constructor(
    private readonly contents: RemarkContentService,
    private readonly mails: RemarkMailsService,
  ) {}

  async write(tx: Transaction, actor: Actor, found: Case, thread: Thread, sent: NewRemark): Promise<Remark> {
    const { content, plainText, mentioned } = await this.contents.read(tx.manager, found, sent.content);
    const remark = await tx.manager.save(
      tx.manager.create(Remark, {
        threadId: thread.id,
        caseId: found.id,
        authorId: actor.personId,
        replyToId: sent.replyToId,
        content,
        plainText,
        version: 1,
        createdAt: tx.now,
        editedAt: null,
        deletedAt: null,
      }),
    );
    await this.mention(tx, actor, found, remark.id, mentioned, sent.toldAlready);
    await tx.audit({
      action: 'remark.write',
      recordKind: 'remark',
      recordId: remark.id,
      caseId: found.id,
      conferenceId: found.conferenceId,
      details: { kind: thread.kind, mentions: mentioned.length },
    });
    await tx.event({ kind: 'remarks-changed', conferenceId: found.conferenceId, caseId: found.id });
    return remark;
  }

  /** Keeps who is mentioned now, and tells them. */
  async mention(tx: Transaction, actor: Actor, found: Case, remarkId: string, mentioned: Person[], toldAlready: string[]): Promise<void> {
    await tx.manager.delete(Mention, { remarkId });
    if (mentioned.length) await tx.manager.insert(Mention, mentioned.map((person) => ({ remarkId, personId: person.id })));
    const untold = mentioned.filter((person) => !toldAlready.includes(person.id));
    await this.mails.mentioned(tx, actor, found, remarkId, untold);
  }
}
