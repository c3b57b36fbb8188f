import type { Actor } from '../access/actor.js';
import { toPersonRef } from '../common/people/person-ref.js';
import type { RemarkDto, ThreadDto } from './dto/discussion.dto.js';
import type { Remark } from './entities/remark.entity.js';
import type { Thread } from './entities/thread.entity.js';

/** Author and unit must have been loaded. */
export function toRemarkDto(actor: Actor, remark: Remark, readUpTo: Date | null): RemarkDto {
  const isMine = remark.authorId === actor.personId;
  return {
    id: remark.id,
    threadId: remark.threadId,
    author: toPersonRef(remark.author),
    replyToId: remark.replyToId,
    content: remark.content,
    version: remark.version,
    createdAt: remark.createdAt.toISOString(),
    editedAt: remark.editedAt?.toISOString() ?? null,
    deletedAt: remark.deletedAt?.toISOString() ?? null,
    isMine,
    isNew: isNew(actor, remark, readUpTo),
  };
}

export const isNew = (actor: Actor, remark: Remark, readUpTo: Date | null): boolean =>
  remark.authorId !== actor.personId && !remark.deletedAt && (!readUpTo || remark.createdAt > readUpTo);

export const toThreadDto = (actor: Actor, thread: Thread, remarks: Remark[], readUpTo: Date | null): ThreadDto => ({
  id: thread.id,
  anchorKind: thread.anchorKind,
  anchorRef: thread.anchorRef,
  kind: thread.kind,
  answeredAt: thread.answeredAt?.toISOString() ?? null,
  createdAt: thread.createdAt.toISOString(),
  remarks: remarks.map((remark) => toRemarkDto(actor, remark, readUpTo)),
});
