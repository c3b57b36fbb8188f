import type { SelectQueryBuilder } from 'typeorm';
import type { Actor } from '../access/actor.js';
import { mayInConference } from '../access/access.policy.js';
import { Permission } from '../access/permission.js';
import { decodeCursor } from '../common/paging/cursor.js';
import { invalid } from '../common/problems/problem.js';
import type { CaseSort, ListCasesDto } from './dto/list-cases.dto.js';
import type { Case } from './entities/case.entity.js';
import { searchExpression } from './search-words.js';

type Key = string | number;

interface Sorting {
  /** Expressions that are sorted by, the id after them. */
  columns: string[];
  keysOf: (row: Case) => Key[];
  /** A key of the cursor as the database compares it. */
  asParameter?: (key: unknown) => unknown;
}

const URGENCY_RANK: Record<string, number> = { routine: 0, soon: 1, urgent: 2 };
const asDate = (key: unknown) => {
  const date = new Date(String(key));
  if (Number.isNaN(date.getTime())) throw invalid('cursor', 'cursor', 'cursor must be one that this list gave: leave it out to start again.');
  return date;
};

const SORTINGS: Record<CaseSort, Sorting> = {
  updated: { columns: ['c.updatedAt'], keysOf: (row) => [row.updatedAt.toISOString()], asParameter: asDate },
  released: {
    columns: ["COALESCE(c.releasedAt, '1970-01-01 00:00:00.000')"],
    keysOf: (row) => [(row.releasedAt ?? new Date(0)).toISOString()],
    asParameter: asDate,
  },
  // the code second, not the time of change: a case must not move within its group while someone pages
  urgency: {
    columns: ["CASE c.urgency WHEN 'urgent' THEN 2 WHEN 'soon' THEN 1 ELSE 0 END", 'c.code'],
    keysOf: (row) => [URGENCY_RANK[row.urgency] ?? 0, row.code],
  },
  code: { columns: ['c.code'], keysOf: (row) => [row.code] },
};

export interface Paging {
  sort: CaseSort;
  order: 'asc' | 'desc';
  /** When the first page was asked for, in milliseconds. */
  asOf: number;
}

export const pagingOf = (query: ListCasesDto, now: Date): Paging => ({ sort: query.sort ?? 'updated', order: query.order ?? 'desc', asOf: now.getTime() });

export const cursorOf = (paging: Paging, row: Case): Key[] => [paging.sort, paging.order, paging.asOf, ...SORTINGS[paging.sort].keysOf(row), row.id];

/**
 * Orders the query and, where a cursor is given, begins after it. Every case that does not change while someone
 * pages comes exactly once, and none comes twice: by time of change, oldest first, cases that change meanwhile
 * would come again at the end and are left out; newest first they move before what was read.
 */
export function sortAndPage(builder: SelectQueryBuilder<Case>, paging: Paging, cursor: string | undefined): Paging {
  const { columns, asParameter } = SORTINGS[paging.sort];
  const direction = paging.order === 'asc' ? 'ASC' : 'DESC';
  columns.forEach((column, index) => builder.addSelect(column, `sort_${index}`).addOrderBy(`sort_${index}`, direction));
  builder.addOrderBy('c.id', direction);
  if (!cursor) return paging;
  const [sort, order, asOf, ...keys] = decodeCursor(cursor, columns.length + 4);
  if (sort !== paging.sort || order !== paging.order || typeof asOf !== 'number')
    throw invalid('cursor', 'cursor', 'cursor belongs to another order of the list: leave it out to start again.');
  const names = keys.map((_, index) => `:key${index}`);
  const parameters = Object.fromEntries(keys.map((key, index) => [`key${index}`, asParameter && index < columns.length ? asParameter(key) : key]));
  builder.andWhere(`(${[...columns, 'c.id'].join(', ')}) ${paging.order === 'asc' ? '>' : '<'} (${names.join(', ')})`, parameters);
  if (paging.sort === 'updated' && paging.order === 'asc') builder.andWhere('c.updatedAt <= :asOf', { asOf: new Date(asOf) });
  return { ...paging, asOf };
}

/** The conferences in which this person may rate. */
const ratingConferences = (actor: Actor): string[] => [...actor.roles.keys()].filter((id) => mayInConference(actor, Permission.Rate, id));

export function filterCases(builder: SelectQueryBuilder<Case>, actor: Actor, query: ListCasesDto): void {
  if (query.conferenceId) builder.andWhere('c.conferenceId = :conferenceId', { conferenceId: query.conferenceId });
  if (query.stage?.length) builder.andWhere('c.stage IN (:...stages)', { stages: query.stage });
  if (query.joint) builder.andWhere('c.joint = :joint', { joint: query.joint });
  if (query.urgency) builder.andWhere('c.urgency = :urgency', { urgency: query.urgency });
  if (query.mine !== undefined) builder.andWhere(`c.presenterId ${query.mine ? '=' : '<>'} :me`, { me: actor.personId });
  if (query.awaitingMyRating !== undefined) filterAwaiting(builder, actor, query.awaitingMyRating);
  if (query.query?.trim()) filterWords(builder, query.query.trim());
}

function filterAwaiting(builder: SelectQueryBuilder<Case>, actor: Actor, awaiting: boolean): void {
  const conferences = ratingConferences(actor);
  if (!conferences.length) {
    if (awaiting) builder.andWhere('1 = 0');
    return;
  }
  builder.andWhere(
    `${awaiting ? '' : 'NOT '}(c.stage IN ('open', 'listed') AND c.conferenceId IN (:...ratingConferences) AND EXISTS (
       SELECT 1 FROM rating_rounds round WHERE round.caseId = c.id AND round.closedAt IS NULL AND NOT EXISTS (
         SELECT 1 FROM ballots ballot WHERE ballot.roundId = round.id AND ballot.personId = :rater AND ballot.supersededAt IS NULL)))`,
    { ratingConferences: conferences, rater: actor.personId },
  );
}

// two full-text lookups joined by their ids: with OR between them neither index would be used
function filterWords(builder: SelectQueryBuilder<Case>, typed: string): void {
  const words = searchExpression(typed);
  if (words)
    builder.andWhere(
      `c.id IN (SELECT found.id FROM cases found WHERE MATCH(found.searchText) AGAINST (:words IN BOOLEAN MODE)
        UNION SELECT said.caseId FROM remarks said WHERE said.deletedAt IS NULL AND MATCH(said.plainText) AGAINST (:words IN BOOLEAN MODE))`,
      { words },
    );
  else
    builder.andWhere('(c.title LIKE :like OR c.code LIKE :like)', { like: `%${typed.replace(/[\\%_]/g, '\\$&')}%` });
}
