import { mayOnCase } from '../access/access.policy.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import type { Stage } from '../calc/vocabulary/case.js';
import type { CaseActionsDto } from './dto/case.dto.js';
import type { Case } from './entities/case.entity.js';

/** At which stages a use case on a case is possible; asked by the use cases and shown as actions. */
export const CASE_STAGES = {
  edit: ['draft', 'open', 'listed'],
  post: ['draft'],
  check: ['checking'],
  withdraw: ['draft', 'checking', 'open', 'listed'],
  comment: ['open', 'listed', 'decided', 'final', 'reported'],
  rate: ['open', 'listed'],
  writeDecision: ['listed', 'decided', 'final', 'reported'],
  writeFinalDecision: ['decided', 'final'],
  writeOutcome: ['final', 'reported'],
} as const satisfies Record<string, readonly Stage[]>;

/** What the policy and the stage together let this person do with the case now. */
export function caseActions(actor: Actor, found: Case, rounds: { closedAt: Date | null }[]): CaseActionsDto {
  const may = (permission: Permission, stages: readonly Stage[]) => stages.includes(found.stage) && mayOnCase(actor, permission, found);
  const edit = may(Permission.CaseWrite, CASE_STAGES.edit);
  return {
    edit,
    editOptions: edit && rounds.length === 0,
    post: may(Permission.CaseWrite, CASE_STAGES.post),
    check: may(Permission.CaseCheck, CASE_STAGES.check) && found.presenterId !== actor.personId,
    withdraw: may(Permission.CaseWithdraw, CASE_STAGES.withdraw),
    comment: may(Permission.RemarkWrite, CASE_STAGES.comment),
    rate: may(Permission.Rate, CASE_STAGES.rate) && rounds.some((round) => round.closedAt === null),
    controlRounds: may(Permission.RoundControl, CASE_STAGES.rate),
    list: may(Permission.AgendaWrite, CASE_STAGES.rate),
    writeDecision: may(Permission.DecisionWrite, CASE_STAGES.writeDecision),
    writeFinalDecision: may(Permission.FinalDecisionWrite, CASE_STAGES.writeFinalDecision),
    writeOutcome: may(Permission.OutcomeWrite, CASE_STAGES.writeOutcome),
    readAudit: mayOnCase(actor, Permission.CaseAudit, found),
    addImages: may(Permission.ImageWrite, CASE_STAGES.edit),
  };
}
