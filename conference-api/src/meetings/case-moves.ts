import { In } from 'typeorm';
import { Case } from '../cases/entities/case.entity.js';
import type { Transaction } from '../database/unit-of-work.js';

const ACTIONS = { listed: 'case.list', open: 'case.unlist' } as const;

/** open → listed, or back; the cases' rows must be locked. */
export async function moveCases(tx: Transaction, caseIds: string[], to: keyof typeof ACTIONS, of: { meetingId: string; conferenceId: string }): Promise<void> {
  if (!caseIds.length) return;
  await tx.manager.update(Case, { id: In(caseIds) }, { stage: to, updatedAt: tx.now });
  for (const caseId of caseIds) {
    await tx.audit({ action: ACTIONS[to], recordKind: 'case', recordId: caseId, caseId, conferenceId: of.conferenceId, details: { to, meetingId: of.meetingId } });
    await tx.event({ kind: 'case-changed', conferenceId: of.conferenceId, caseId });
  }
}
