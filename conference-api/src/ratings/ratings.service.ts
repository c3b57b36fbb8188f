import { Injectable } from '@nestjs/common';
import { DataSource, type EntityManager, In, IsNull } from 'typeorm';
import { mayInConference } from '../access/access.policy.js';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import { RATING_ROLES } from '../calc/vocabulary/people.js';
import type { Case } from '../cases/entities/case.entity.js';
import { toPersonRef } from '../common/people/person-ref.js';
import { type FieldError, notFound, Problem, wrongStage } from '../common/problems/problem.js';
import { Conference } from '../conferences/entities/conference.entity.js';
import { Membership } from '../conferences/entities/membership.entity.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import type { BallotDto, BallotReasonDto, GiveRatingDto, RatingDto, RoundDto } from './dto/rating.dto.js';
import { Ballot } from './entities/ballot.entity.js';
import { BallotRating } from './entities/ballot-rating.entity.js';
import { RatingRound } from './entities/rating-round.entity.js';
import { panelFigures } from './panel-figures.js';

@Injectable()
export class RatingsService {
  constructor(
    private readonly access: AccessService,
    private readonly work: UnitOfWork,
    private readonly dataSource: DataSource,
  ) {}

  async findOfCase(actor: Actor, caseId: string): Promise<RatingDto> {
    const found = await this.access.case(actor, Permission.RatingRead, caseId);
    return this.view(actor, found);
  }

  /** For a use case that has asked for access. */
  async view(actor: Actor, found: Case): Promise<RatingDto> {
    const { manager } = this.dataSource;
    const rounds = await manager.find(RatingRound, { where: { caseId: found.id }, order: { number: 'ASC' } });
    const mayRate = mayInConference(actor, Permission.Rate, found.conferenceId);
    if (!rounds.length) return { rounds: [], mayRate };
    const [ballots, eligible, conference] = await Promise.all([
      manager.find(Ballot, {
        where: { roundId: In(rounds.map((round) => round.id)) },
        relations: { ratings: true, person: { unit: true } },
        order: { revision: 'ASC' },
      }),
      this.countEligible(manager, found.conferenceId),
      manager.findOneByOrFail(Conference, { id: found.conferenceId }),
    ]);
    const role = actor.roles.get(found.conferenceId);
    return {
      mayRate,
      rounds: rounds.map((round) => {
        const ofRound = ballots.filter((ballot) => ballot.roundId === round.id);
        const namesShown = conference.namesShown === 'chair' ? role === 'chair' : conference.namesShown === 'all-after-round' && round.closedAt !== null;
        return toRoundDto(round, ofRound, actor.personId, eligible, namesShown);
      }),
    };
  }

  async give(actor: Actor, caseId: string, number: number, body: GiveRatingDto): Promise<RatingDto> {
    const found = await this.access.case(actor, Permission.Rate, caseId, { stages: ['open', 'listed'] });
    await this.work.run(actor, async (tx) => {
      // the lock makes a rating that arrives while the round closes either counted or refused
      const round = await tx.manager.findOne(RatingRound, { where: { caseId, number }, lock: { mode: 'pessimistic_write' } });
      if (!round) throw notFound('round');
      if (round.closedAt) throw wrongStage('This round is closed; the rating was not taken.');
      refuseUnfit(round, body);
      const member = await tx.manager.findOneBy(Membership, { conferenceId: found.conferenceId, personId: actor.personId });
      if (!member || !RATING_ROLES.includes(member.role)) throw notFound('case');
      await this.insertBallot(tx.manager, round, actor.personId, body, tx.now);
      await tx.audit({ action: 'rating.give', recordKind: 'round', recordId: round.id, caseId, conferenceId: found.conferenceId, details: { round: number } });
      await tx.event({ kind: 'rating-changed', conferenceId: found.conferenceId, caseId });
    });
    return this.view(actor, found);
  }

  private async insertBallot(manager: EntityManager, round: RatingRound, personId: string, body: GiveRatingDto, now: Date): Promise<void> {
    const earlier = await manager.find(Ballot, { where: { roundId: round.id, personId }, order: { revision: 'DESC' }, take: 1 });
    await manager.update(Ballot, { roundId: round.id, personId, supersededAt: IsNull() }, { supersededAt: now });
    const ballot = await manager.save(
      manager.create(Ballot, {
        roundId: round.id,
        personId,
        revision: (earlier[0]?.revision ?? 0) + 1,
        preferredOptionId: body.preferredOptionId ?? null,
        reason: body.reason ?? '',
        at: now,
        supersededAt: null,
      }),
    );
    await manager.insert(BallotRating, body.ratings.map(({ optionId, value }) => ({ ballotId: ballot.id, optionId, value })));
  }

  private countEligible(manager: EntityManager, conferenceId: string): Promise<number> {
    return manager
      .createQueryBuilder(Membership, 'membership')
      .innerJoin('membership.person', 'person', 'person.isActive = TRUE')
      .where('membership.conferenceId = :conferenceId AND membership.role IN (:...roles)', { conferenceId, roles: RATING_ROLES })
      .getCount();
  }
}

/** Every option of the round once, and the preferred one among them. */
function refuseUnfit(round: RatingRound, body: GiveRatingDto): void {
  const known = new Set(round.options.map((option) => option.id));
  const given = body.ratings.map((rating) => rating.optionId);
  const errors: FieldError[] = [];
  given.forEach((optionId, index) => {
    const field = `ratings[${index}].optionId`;
    if (!known.has(optionId)) errors.push({ field, code: 'unknown-option', message: 'This option is not in the round.' });
    else if (given.indexOf(optionId) !== index) errors.push({ field, code: 'twice', message: 'This option is rated twice.' });
  });
  const missing = [...known].filter((optionId) => !given.includes(optionId)).length;
  if (missing) errors.push({ field: 'ratings', code: 'missing', message: `Rate every option: ${missing} more.` });
  if (body.preferredOptionId && !known.has(body.preferredOptionId))
    errors.push({ field: 'preferredOptionId', code: 'unknown-option', message: 'The preferred option is not in the round.' });
  if (errors.length) throw new Problem('invalid', errors[0]!.message, errors);
}

function toRoundDto(round: RatingRound, ballots: Ballot[], personId: string, eligible: number, namesShown: boolean): RoundDto {
  const current = ballots.filter((ballot) => ballot.supersededAt === null);
  const own = ballots.filter((ballot) => ballot.personId === personId);
  const mine = own.find((ballot) => ballot.supersededAt === null);
  const isSeen = round.closedAt !== null || mine !== undefined;
  return {
    id: round.id,
    number: round.number,
    state: round.closedAt ? 'closed' : 'open',
    openedAt: round.openedAt.toISOString(),
    closedAt: round.closedAt?.toISOString() ?? null,
    caseVersion: round.caseVersion,
    options: round.options.map(({ id, title, description, isProposal }) => ({ id, title, description: description ?? '', isProposal: isProposal ?? false })),
    given: current.length,
    eligible,
    mine: mine ? toBallotDto(mine) : null,
    earlier: own.filter((ballot) => ballot !== mine).map(toBallotDto),
    figures: isSeen ? panelFigures(round.options, current) : null,
    reasons: isSeen ? reasons(current, namesShown) : null,
  };
}

const toBallotDto = (ballot: Ballot): BallotDto => ({
  revision: ballot.revision,
  at: ballot.at.toISOString(),
  ratings: ballot.ratings.map(({ optionId, value }) => ({ optionId, value })),
  preferredOptionId: ballot.preferredOptionId,
  reason: ballot.reason,
});

// sorted by their text: the order of giving would tell who gave which
const reasons = (ballots: Ballot[], namesShown: boolean): BallotReasonDto[] =>
  ballots
    .filter((ballot) => ballot.reason.trim())
    .map((ballot) => ({ text: ballot.reason, person: namesShown ? toPersonRef(ballot.person) : null }))
    .sort((a, b) => a.text.localeCompare(b.text));
