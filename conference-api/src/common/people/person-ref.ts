import type { Person } from '../../people/entities/person.entity.js';
import type { PersonRefDto } from './person-ref.dto.js';

/** A person as others see them; the unit must have been loaded. */
export const toPersonRef = (person: Pick<Person, 'id' | 'name' | 'discipline' | 'unit'>): PersonRefDto => ({
  id: person.id,
  name: person.name,
  discipline: person.discipline,
  unit: person.unit.name,
});
