import type { Person } from './entities/person.entity.js';
import type { PersonDto } from './dto/people.dto.js';

/** As the administrator sees a person; unit, memberships with conferences and the hash must have been loaded. */
export const toPersonDto = (person: Person): PersonDto => ({
  id: person.id,
  name: person.name,
  email: person.email,
  discipline: person.discipline,
  unitId: person.unitId,
  unit: person.unit.name,
  isActive: person.isActive,
  isAdministrator: person.isAdministrator,
  hasAccepted: person.passwordHash !== null,
  memberships: person.memberships
    .map(({ conferenceId, conference, role }) => ({ conferenceId, conferenceName: conference.name, role }))
    .sort((a, b) => a.conferenceName.localeCompare(b.conferenceName)),
});
