import { Injectable } from '@nestjs/common';
import { type EntityManager, In, IsNull } from 'typeorm';
import { quorum } from '../calc/panel/quorum.js';
import type { Case } from '../cases/entities/case.entity.js';
import { Conference } from '../conferences/entities/conference.entity.js';
import { Membership } from '../conferences/entities/membership.entity.js';
import { Attendance } from '../meetings/entities/attendance.entity.js';
import { Ballot } from '../ratings/entities/ballot.entity.js';
import { RatingRound } from '../ratings/entities/rating-round.entity.js';
import { panelFigures } from '../ratings/panel-figures.js';
import type { Circumstances } from './decision-view.js';

/** Gathers what a decision rests on: the rounds, who was there, whether that was enough. */
@Injectable()
export class CircumstancesService {
  async gather(manager: EntityManager, found: Case, meetingId: string | null): Promise<Circumstances> {
    const [conference, rounds, attendances, memberships] = await Promise.all([
      manager.findOneByOrFail(Conference, { id: found.conferenceId }),
      manager.find(RatingRound, { where: { caseId: found.id }, order: { number: 'ASC' } }),
      meetingId ? manager.find(Attendance, { where: { meetingId, state: In(['present', 'remote']) }, relations: { person: { unit: true } } }) : [],
      manager.find(Membership, { where: { conferenceId: found.conferenceId } }),
    ]);
    const ballots = rounds.length
      ? await manager.find(Ballot, { where: { roundId: In(rounds.map((round) => round.id)), supersededAt: IsNull() }, relations: { ratings: true } })
      : [];
    const roleOf = new Map(memberships.map((membership) => [membership.personId, membership.role]));
    const suspicion = found.content.infection.suspicion;
    const present = attendances.filter((attendance) => roleOf.has(attendance.personId));
    return {
      rounds: rounds.map((round) => ({
        number: round.number,
        figures: panelFigures(round.options, ballots.filter((ballot) => ballot.roundId === round.id)),
      })),
      attendance: attendances
        .map(({ person, state }) => ({ name: person.name, discipline: person.discipline as string, unit: person.unit.name, state: state as string }))
        .sort((a, b) => a.discipline.localeCompare(b.discipline) || a.name.localeCompare(b.name)),
      quorum: quorum(
        conference.quorumRule,
        present.map(({ person, personId, state }) => ({ discipline: person.discipline, role: roleOf.get(personId)!, state })),
        suspicion === 'confirmed' || suspicion === 'possible',
      ),
    };
  }
}
