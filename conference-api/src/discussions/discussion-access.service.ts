import { Injectable } from '@nestjs/common';
import type { EntityManager } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import type { Permission } from '../access/permission.js';
import { CASE_STAGES } from '../cases/case-actions.js';
import type { Case } from '../cases/entities/case.entity.js';
import { notFound, Problem } from '../common/problems/problem.js';
import { Remark } from './entities/remark.entity.js';
import { Thread } from './entities/thread.entity.js';

/** Threads and remarks are reached through their case, whose row is locked where one is to change. */
@Injectable()
export class DiscussionAccess {
  constructor(private readonly access: AccessService) {}

  async thread(actor: Actor, permission: Permission, id: string, manager: EntityManager): Promise<{ thread: Thread; found: Case }> {
    const thread = await manager.findOneBy(Thread, { id });
    if (!thread) throw notFound('thread');
    const found = await asUnknown('thread', this.access.case(actor, permission, thread.caseId, { stages: CASE_STAGES.comment, manager, lock: true }));
    // again, under the lock: what was read before it may have changed
    return { thread: await manager.findOneByOrFail(Thread, { id }), found };
  }

  /** A remark that is about to change. */
  async remark(actor: Actor, permission: Permission, id: string, manager: EntityManager): Promise<{ remark: Remark; found: Case }> {
    const remark = await manager.findOneBy(Remark, { id });
    if (!remark) throw notFound('remark');
    const found = await asUnknown('remark', this.access.case(actor, permission, remark.caseId, { stages: CASE_STAGES.comment, manager, lock: true }));
    return { remark: await manager.findOneOrFail(Remark, { where: { id }, relations: { author: { unit: true } } }), found };
  }

  /** A remark to be read, at whatever stage its case is. */
  async readableRemark(actor: Actor, permission: Permission, id: string, manager: EntityManager): Promise<Remark> {
    const remark = await manager.findOneBy(Remark, { id });
    if (!remark) throw notFound('remark');
    await asUnknown('remark', this.access.case(actor, permission, remark.caseId, { manager }));
    return remark;
  }
}

// 'no such case' would tell a stranger that there is such a remark
async function asUnknown<T>(what: string, asked: Promise<T>): Promise<T> {
  try {
    return await asked;
  } catch (error) {
    throw error instanceof Problem && error.code === 'not-found' ? notFound(what) : error;
  }
}
