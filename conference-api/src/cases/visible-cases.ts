import { maySeeCase } from '../access/access.policy.js';
import type { Actor } from '../access/actor.js';
import { STAGES } from '../calc/vocabulary/case.js';

/** A condition on the table `alias` with its parameters; in words of SQL what `maySeeCase` says of one case. */
export interface Condition {
  sql: string;
  parameters: Record<string, unknown>;
}

/**
 * The cases that a person may know of. Asked of the policy itself, stage by stage and conference by
 * conference, so that list and page can not come apart.
 */
export function visibleCases(actor: Actor, alias: string): Condition {
  const conferences = [...actor.roles.keys()];
  if (!conferences.length) return { sql: '1 = 0', parameters: {} };
  const someoneElse = '';
  const parameters: Record<string, unknown> = { visibleTo: actor.personId, visibleConferences: conferences };
  const parts = [`(${alias}.presenterId = :visibleTo AND ${alias}.conferenceId IN (:...visibleConferences))`];
  STAGES.forEach((stage, index) => {
    const where = conferences.filter((conferenceId) =>
      maySeeCase(actor, { conferenceId, stage, presenterId: someoneElse, treatingSurgeonId: someoneElse }),
    );
    if (!where.length) return;
    parts.push(`(${alias}.stage = :visibleStage${index} AND ${alias}.conferenceId IN (:...visibleAt${index}))`);
    parameters[`visibleStage${index}`] = stage;
    parameters[`visibleAt${index}`] = where;
  });
  return { sql: `(${parts.join(' OR ')})`, parameters };
}
