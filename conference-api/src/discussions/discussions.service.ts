import { Injectable } from '@nestjs/common';
import { DataSource, type EntityManager } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { CASE_STAGES } from '../cases/case-actions.js';
import { forbidden, invalid } from '../common/problems/problem.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { readAnchor } from './anchors.js';
import { DiscussionAccess } from './discussion-access.service.js';
import type { CreateThreadDto, ThreadDto, ThreadListDto } from './dto/discussion.dto.js';
import { Remark } from './entities/remark.entity.js';
import { Thread } from './entities/thread.entity.js';
import { ReadingService } from './reading.service.js';
import { RemarkMailsService } from './remark-mails.service.js';
import { RemarkWriterService } from './remark-writer.service.js';
import { isNew, toThreadDto } from './thread-view.js';

/** Threads: what a conversation is about, and whether its question is answered. */
@Injectable()
export class DiscussionsService {
  constructor(
    private readonly access: AccessService,
    private readonly dataSource: DataSource,
    private readonly work: UnitOfWork,
    private readonly reading: ReadingService,
    private readonly discussionAccess: DiscussionAccess,
    private readonly writer: RemarkWriterService,
    private readonly mails: RemarkMailsService,
  ) {}

  /** All threads of a case in the order of their beginning, each with all its remarks: three queries. */
  async findOfCase(actor: Actor, caseId: string): Promise<ThreadListDto> {
    await this.access.case(actor, Permission.CaseRead, caseId);
    const { manager } = this.dataSource;
    const [threads, remarks, readUpTo] = await Promise.all([
      manager.find(Thread, { where: { caseId }, order: { createdAt: 'ASC', id: 'ASC' } }),
      manager.find(Remark, { where: { caseId }, order: { createdAt: 'ASC', id: 'ASC' }, relations: { author: { unit: true } } }),
      this.reading.findReadUpTo(actor.personId, caseId),
    ]);
    const ofThread = new Map<string, Remark[]>();
    for (const remark of remarks) ofThread.set(remark.threadId, [...(ofThread.get(remark.threadId) ?? []), remark]);
    return {
      items: threads.map((thread) => toThreadDto(actor, thread, ofThread.get(thread.id) ?? [], readUpTo)),
      unread: remarks.filter((remark) => isNew(actor, remark, readUpTo)).length,
    };
  }

  /** Begins a thread with its first remark. */
  async create(actor: Actor, caseId: string, body: CreateThreadDto): Promise<ThreadDto> {
    const thread = await this.work.run(actor, async (tx) => {
      const { manager } = tx;
      const found = await this.access.case(actor, Permission.RemarkWrite, caseId, { stages: CASE_STAGES.comment, manager, lock: true });
      if (body.kind === 'question' && found.presenterId === actor.personId)
        throw invalid('kind', 'own-question', 'A question goes to the presenter, who is you: write a remark.');
      const anchorRef = await readAnchor(manager, found, body.anchorKind, body.anchorRef);
      const begun = await manager.save(
        manager.create(Thread, { caseId, anchorKind: body.anchorKind, anchorRef, kind: body.kind, startedById: actor.personId, answeredAt: null, createdAt: tx.now }),
      );
      // a question goes to the presenter by a mail of its own: a second one for the mention would say the same
      const told = body.kind === 'question' ? [found.presenterId] : [];
      await this.writer.write(tx, actor, found, begun, { content: body.content, replyToId: null, toldAlready: told });
      if (body.kind === 'question') await this.mails.questionAsked(tx, actor, found, begun.id);
      return begun;
    });
    return this.show(actor, this.dataSource.manager, thread);
  }

  /** The presenter, or who asked, says that the question is answered, or opens it again. */
  async setAnswered(actor: Actor, id: string, answered: boolean): Promise<ThreadDto> {
    const changed = await this.work.run(actor, async (tx) => {
      const { thread, found } = await this.discussionAccess.thread(actor, Permission.RemarkWrite, id, tx.manager);
      if (thread.kind !== 'question') throw invalid('answered', 'no-question', 'This thread asks no question.');
      if (actor.personId !== found.presenterId && actor.personId !== thread.startedById)
        throw forbidden('The presenter, or who asked, says whether a question is answered.');
      if ((thread.answeredAt !== null) === answered) return thread;
      thread.answeredAt = answered ? tx.now : null;
      await tx.manager.update(Thread, { id }, { answeredAt: thread.answeredAt });
      await tx.audit({
        action: answered ? 'question.answer' : 'question.reopen',
        recordKind: 'thread',
        recordId: id,
        caseId: found.id,
        conferenceId: found.conferenceId,
      });
      await tx.event({ kind: 'remarks-changed', conferenceId: found.conferenceId, caseId: found.id });
      return thread;
    });
    return this.show(actor, this.dataSource.manager, changed);
  }

  private async show(actor: Actor, manager: EntityManager, thread: Thread): Promise<ThreadDto> {
    const remarks = await manager.find(Remark, {
      where: { threadId: thread.id },
      order: { createdAt: 'ASC', id: 'ASC' },
      relations: { author: { unit: true } },
    });
    return toThreadDto(actor, thread, remarks, await this.reading.findReadUpTo(actor.personId, thread.caseId));
  }
}
