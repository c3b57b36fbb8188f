import { Injectable } from '@nestjs/common';
import { DataSource } from 'typeorm';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import type { Role } from '../calc/vocabulary/people.js';
import { forbidden, invalid, Problem, staleVersion } from '../common/problems/problem.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { DiscussionAccess } from './discussion-access.service.js';
import type { CreateRemarkDto, RemarkDto, RemarkVersionListDto, UpdateRemarkDto } from './dto/discussion.dto.js';
import { Mention } from './entities/mention.entity.js';
import { Remark } from './entities/remark.entity.js';
import { RemarkVersion } from './entities/remark-version.entity.js';
import { Thread } from './entities/thread.entity.js';
import { ReadingService } from './reading.service.js';
import { RemarkContentService } from './remark-content.service.js';
import { RemarkWriterService } from './remark-writer.service.js';
import { toRemarkDto } from './thread-view.js';

/** May delete what others said: what should not stand there must go at once. */
const TIDYING_ROLES: readonly (Role | undefined)[] = ['chair', 'coordinator'];

@Injectable()
export class RemarksService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly work: UnitOfWork,
    private readonly access: DiscussionAccess,
    private readonly contents: RemarkContentService,
    private readonly writer: RemarkWriterService,
    private readonly reading: ReadingService,
  ) {}

  /** Adds to a thread; the presenter's reply can answer its question. */
  async reply(actor: Actor, threadId: string, body: CreateRemarkDto): Promise<RemarkDto> {
    const id = await this.work.run(actor, async (tx) => {
      const { thread, found } = await this.access.thread(actor, Permission.RemarkWrite, threadId, tx.manager);
      if (body.replyToId && !(await tx.manager.existsBy(Remark, { id: body.replyToId, threadId })))
        throw invalid('replyToId', 'reply-to', 'The remark that you answer is not in this thread.');
      if (body.answers && thread.kind !== 'question') throw invalid('answers', 'no-question', 'This thread asks no question.');
      if (body.answers && found.presenterId !== actor.personId) throw forbidden('The presenter answers questions.');
      const remark = await this.writer.write(tx, actor, found, thread, { content: body.content, replyToId: body.replyToId ?? null, toldAlready: [] });
      if (body.answers && !thread.answeredAt) await tx.manager.update(Thread, { id: threadId }, { answeredAt: tx.now });
      return remark.id;
    });
    return this.show(actor, id);
  }

  /** The author changes the words; what was said before stays on record. */
  async edit(actor: Actor, id: string, body: UpdateRemarkDto): Promise<RemarkDto> {
    await this.work.run(actor, async (tx) => {
      const { remark, found } = await this.access.remark(actor, Permission.RemarkWrite, id, tx.manager);
      if (remark.authorId !== actor.personId) throw forbidden('Only its author edits a remark.');
      if (!remark.content) throw new Problem('conflict', 'The remark was deleted meanwhile. Write a new one.');
      if (remark.version !== body.baseVersion)
        throw staleVersion('The remark was edited meanwhile, perhaps in another window.', { currentVersion: remark.version, currentContent: remark.content });
      const { content, plainText, mentioned } = await this.contents.read(tx.manager, found, body.content);
      if (JSON.stringify(content) === JSON.stringify(remark.content)) return;
      const { version, editedAt, createdAt, content: earlier } = remark;
      await tx.manager.save(tx.manager.create(RemarkVersion, { remarkId: id, version, content: earlier, at: editedAt ?? createdAt }));
      await tx.manager.save(Object.assign(remark, { content, plainText, version: version + 1, editedAt: tx.now }));
      await this.writer.mention(tx, actor, found, id, mentioned, []);
      await tx.audit({
        action: 'remark.edit',
        recordKind: 'remark',
        recordId: id,
        caseId: found.id,
        conferenceId: found.conferenceId,
        details: { version: remark.version },
      });
      await tx.event({ kind: 'remarks-changed', conferenceId: found.conferenceId, caseId: found.id });
    });
    return this.show(actor, id);
  }

  /** Leaves a mark that something was said; the words, also the earlier ones, are gone. */
  async remove(actor: Actor, id: string): Promise<void> {
    await this.work.run(actor, async (tx) => {
      const { manager } = tx;
      const { remark, found } = await this.access.remark(actor, Permission.RemarkWrite, id, manager);
      if (remark.authorId !== actor.personId && !TIDYING_ROLES.includes(actor.roles.get(found.conferenceId)))
        throw forbidden('Its author, the chair or the coordinator deletes a remark.');
      if (remark.deletedAt) return;
      await manager.update(Remark, { id }, { content: null, plainText: '', deletedAt: tx.now });
      await manager.delete(RemarkVersion, { remarkId: id });
      await manager.delete(Mention, { remarkId: id });
      await this.closeWithItsQuestion(manager, remark, tx.now);
      await tx.audit({
        action: 'remark.delete',
        recordKind: 'remark',
        recordId: id,
        caseId: found.id,
        conferenceId: found.conferenceId,
        details: { own: remark.authorId === actor.personId },
      });
      await tx.event({ kind: 'remarks-changed', conferenceId: found.conferenceId, caseId: found.id });
    });
  }

  /** What it said before, and what it says now; nothing of a deleted one. */
  async versions(actor: Actor, id: string): Promise<RemarkVersionListDto> {
    const { manager } = this.dataSource;
    const remark = await this.access.readableRemark(actor, Permission.CaseRead, id, manager);
    if (!remark.content) return { items: [] };
    const earlier = await manager.find(RemarkVersion, { where: { remarkId: id }, order: { version: 'ASC' } });
    const now = { version: remark.version, at: remark.editedAt ?? remark.createdAt, content: remark.content };
    return { items: [...earlier, now].map(({ version, at, content }) => ({ version, at: at.toISOString(), content })) };
  }

  // a question whose words are gone can not be answered: it must not stay open for ever
  private async closeWithItsQuestion(manager: DataSource['manager'], remark: Remark, now: Date): Promise<void> {
    const thread = await manager.findOneByOrFail(Thread, { id: remark.threadId });
    if (thread.kind !== 'question' || thread.answeredAt) return;
    const first = await manager.findOne(Remark, { where: { threadId: thread.id }, order: { createdAt: 'ASC', id: 'ASC' } });
    if (first?.id === remark.id) await manager.update(Thread, { id: thread.id }, { answeredAt: now });
  }

  private async show(actor: Actor, id: string): Promise<RemarkDto> {
    const remark = await this.dataSource.manager.findOneOrFail(Remark, { where: { id }, relations: { author: { unit: true } } });
    return toRemarkDto(actor, remark, await this.reading.findReadUpTo(actor.personId, remark.caseId));
  }
}
