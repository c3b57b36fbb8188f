import { DISCIPLINE_WORDS } from '@kerfside/calc/vocabulary/people.js';
import type { Schemas } from '@/lib/api/types';

/** Who, of what discipline, from where. `short` keeps the name alone. */
export function PersonLine({ person, short = false }: { person: Schemas['PersonRefDto']; short?: boolean }) {
  return (
    <span>
      {person.name}
      {!short && (
        <span className="label-text">
          {' '}
          {DISCIPLINE_WORDS[person.discipline]}, {person.unit}
        </span>
      )}
    </span>
  );
}
