import { type Discipline, DISCIPLINES } from '@kerfside/calc/vocabulary/people.js';
import type { Schemas } from '@/lib/api/types';

type Row = Schemas['AttendanceDto'];

/** Members under their disciplines, in the disciplines' own order; without those that have nobody. */
export const byDiscipline = (rows: readonly Row[]): [Discipline, Row[]][] =>
  DISCIPLINES.map((discipline): [Discipline, Row[]] => [discipline, rows.filter(({ person }) => person.discipline === discipline)]).filter(
    ([, found]) => found.length > 0,
  );
