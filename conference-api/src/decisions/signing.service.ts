import { Injectable } from '@nestjs/common';
import { DataSource, type EntityManager, In, IsNull, Not } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { PasswordsService } from '../auth/passwords.service.js';
import type { DecisionRecord } from '../calc/vocabulary/decisions.js';
import { Case } from '../cases/entities/case.entity.js';
import { invalid, notFound, staleVersion, wrongStage } from '../common/problems/problem.js';
import { Conference } from '../conferences/entities/conference.entity.js';
import { Membership } from '../conferences/entities/membership.entity.js';
import { Settings } from '../config/settings.js';
import { type MailFacts, type Transaction, UnitOfWork } from '../database/unit-of-work.js';
import { AgendaItem } from '../meetings/entities/agenda-item.entity.js';
import { Person } from '../people/entities/person.entity.js';
import { RatingRound } from '../ratings/entities/rating-round.entity.js';
import { canonicalHash } from './canonical-hash.js';
import { CircumstancesService } from './circumstances.service.js';
import { DecisionsService } from './decisions.service.js';
import type { DecisionCheckDto, DecisionDto, SignDecisionDto } from './dto/decision.dto.js';
import { Decision } from './entities/decision.entity.js';

/** Signs decisions into the chain of their conference, and checks the chain. */
@Injectable()
export class SigningService {
  constructor(
    private readonly access: AccessService,
    private readonly work: UnitOfWork,
    private readonly passwords: PasswordsService,
    private readonly circumstances: CircumstancesService,
    private readonly decisions: DecisionsService,
    private readonly settings: Settings,
    private readonly dataSource: DataSource,
  ) {}

  async sign(actor: Actor, caseId: string, body: SignDecisionDto): Promise<DecisionDto> {
    await this.access.case(actor, Permission.DecisionWrite, caseId, { stages: ['listed', 'decided', 'final', 'reported'] });
    if (!(await this.passwords.verifyOwn(actor.personId, body.password)))
      throw invalid('password', 'wrong-password', 'This is not your password. The decision was not signed.');
    return this.work.run(actor, async (tx) => {
      const found = await this.access.case(actor, Permission.DecisionWrite, caseId, { stages: ['listed', 'decided', 'final', 'reported'], manager: tx.manager, lock: true });
      const draft = await tx.manager.findOneBy(Decision, { caseId, signedAt: IsNull() });
      if (!draft) throw wrongStage('There is no draft to sign; perhaps it was signed just now.');
      if (draft.revision !== body.baseRevision)
        throw staleVersion('The draft was changed after you read it. Read it again before you sign.', { currentRevision: draft.revision, current: draft.content });
      await this.refuseUnready(tx.manager, found, draft);
      const conference = await tx.manager.findOneOrFail(Conference, { where: { id: found.conferenceId }, lock: { mode: 'pessimistic_write' } });
      await this.seal(tx, actor, found, draft, conference);
      // not through the entity: counting must not raise the version that a settings form was opened on
      await tx.manager.query('UPDATE conferences SET lastDecisionNumber = ? WHERE id = ?', [draft.number, conference.id]);
      if (found.stage === 'listed') {
        await tx.manager.update(Case, { id: caseId }, { stage: 'decided', updatedAt: tx.now });
        await tx.manager.update(AgendaItem, { caseId, state: 'listed' }, { state: 'decided' });
        await tx.event({ kind: 'case-changed', conferenceId: found.conferenceId, caseId });
      }
      await tx.audit({ action: 'decision.sign', recordKind: 'decision', recordId: draft.id, caseId, conferenceId: found.conferenceId, details: { number: draft.number, version: draft.version, hash: draft.hash } });
      await tx.event({ kind: 'decision-changed', conferenceId: found.conferenceId, caseId, meetingId: draft.meetingId });
      await tx.mail(await this.mails(tx.manager, found, conference, draft));
      return this.decisions.view(tx.manager, draft);
    });
  }

  /** Computes every fingerprint of the conference's chain again, and says what does not fit. */
  async check(actor: Actor, id: string): Promise<DecisionCheckDto> {
    const decision = await this.dataSource.manager.findOneBy(Decision, { id });
    if (!decision?.signedAt) throw notFound('decision');
    await this.access.case(actor, Permission.DecisionRead, decision.caseId);
    const chain = await this.dataSource.manager.find(Decision, { where: { conferenceId: decision.conferenceId, number: Not(IsNull()) }, order: { number: 'ASC' } });
    const conference = await this.dataSource.manager.findOneByOrFail(Conference, { id: decision.conferenceId });
    return { checked: chain.length, ...chainFaults(chain, conference.lastDecisionNumber) };
  }

  private async refuseUnready(manager: EntityManager, found: Case, draft: Decision): Promise<void> {
    if (!draft.content.text.trim()) throw invalid('text', 'missing', 'Write the decision before you sign it.');
    if (!draft.content.chosenOptionId) throw invalid('chosenOptionId', 'missing', 'Choose the option that was agreed.');
    if (found.stage !== 'listed') return;
    const second = await manager.findOneBy(RatingRound, { caseId: found.id, number: 2 });
    if (!second) throw wrongStage('Open and close the second round before you sign.');
    if (!second.closedAt) throw wrongStage('The second round is still open: close it before you sign.');
  }

  private async seal(tx: Transaction, actor: Actor, found: Case, draft: Decision, conference: Conference): Promise<void> {
    const previous = await tx.manager.findOne(Decision, { where: { conferenceId: conference.id, number: Not(IsNull()) }, order: { number: 'DESC' } });
    const replaced = await tx.manager.findOneBy(Decision, { caseId: found.id, version: draft.version - 1 });
    const circumstances = await this.circumstances.gather(tx.manager, found, draft.meetingId);
    const dissenters = draft.content.dissent.length
      ? await tx.manager.findBy(Person, { id: In(draft.content.dissent.map((entry) => entry.personId)) })
      : [];
    const options = found.content.options.options ?? [];
    const record: DecisionRecord = {
      format: 'kerfside-decision-1',
      conference: conference.name,
      caseCode: found.code,
      caseVersion: found.version,
      number: conference.lastDecisionNumber + 1,
      version: draft.version,
      replaces: replaced?.number ?? null,
      amendmentReason: draft.amendmentReason,
      question: found.content.heading.question ?? '',
      options: options.map(({ id, title, description }) => ({ id, title, description: description ?? '' })),
      content: {
        chosenOption: options.find((option) => option.id === draft.content.chosenOptionId)?.title ?? null,
        text: draft.content.text,
        conditions: draft.content.conditions,
        timing: draft.content.timing,
        dissent: draft.content.dissent.map(({ personId, words }) => ({ name: dissenters.find((person) => person.id === personId)?.name ?? '', words })),
      },
      rounds: circumstances.rounds,
      attendance: circumstances.attendance,
      quorum: circumstances.quorum,
      kind: circumstances.quorum.met ? 'decision' : 'advice',
      signedBy: actor.name,
      signedAt: tx.now.toISOString(),
      previousHash: previous?.hash ?? null,
    };
    Object.assign(draft, {
      number: record.number,
      record,
      hash: canonicalHash(record),
      previousHash: record.previousHash,
      signedById: actor.personId,
      signedAt: tx.now,
    });
    const { number, hash, previousHash, signedById, signedAt } = draft;
    await tx.manager.update(Decision, { id: draft.id }, { number, record, hash, previousHash, signedById, signedAt });
  }

  private async mails(manager: EntityManager, found: Case, conference: Conference, decision: Decision): Promise<MailFacts[]> {
    const members = await manager.find(Membership, { where: { conferenceId: conference.id, person: { isActive: true } }, relations: { person: true } });
    const url = `${this.settings.publicUrl}/decisions/${decision.id}`;
    const results = members.map(({ person }) => ({
      purpose: `decision-signed:${decision.id}:${person.id}`,
      personId: person.id,
      recipient: person.email,
      template: 'decision-signed',
      data: {
        name: person.name,
        code: found.code,
        number: decision.number,
        version: decision.version,
        conference: conference.name,
        kind: decision.record!.kind,
        amended: decision.version > 1,
        url,
      },
    }));
    const surgeon = members.find(({ personId }) => personId === found.treatingSurgeonId)?.person;
    if (!surgeon || found.stage !== 'listed') return results;
    const due = {
      purpose: `final-decision-due:${decision.id}:${surgeon.id}`,
      personId: surgeon.id,
      recipient: surgeon.email,
      template: 'final-decision-due',
      data: { name: surgeon.name, code: found.code, url: `${this.settings.publicUrl}/cases/${found.id}` },
    };
    return [...results, due];
  }
}

/** What does not fit in a conference's chain of signed decisions, given in the order of their numbers. */
export function chainFaults(
  chain: Pick<Decision, 'number' | 'record' | 'hash' | 'previousHash' | 'version' | 'signedAt'>[],
  lastNumber: number,
): { intact: boolean; faults: string[] } {
  const faults: string[] = [];
  let previousHash: string | null = null;
  chain.forEach((decision, index) => {
    const name = `Decision ${decision.number}`;
    const { record } = decision;
    if (decision.number !== index + 1) faults.push(`${name} stands where number ${index + 1} should: one is missing or was put in.`);
    if (!record || canonicalHash(record) !== decision.hash) faults.push(`${name}: its content does not fit its fingerprint.`);
    if (decision.previousHash !== previousHash || record?.previousHash !== previousHash) faults.push(`${name} does not follow the one before it.`);
    if (record && (record.number !== decision.number || record.version !== decision.version || record.signedAt !== decision.signedAt?.toISOString()))
      faults.push(`${name}: number, version or time differ from what was signed.`);
    previousHash = decision.hash;
  });
  if (chain.length !== lastNumber) faults.push(`${lastNumber} decisions were signed, ${chain.length} are here.`);
  return { intact: faults.length === 0, faults };
}
