import { SECTION_WORDS, SECTIONS } from '@kerfside/calc/vocabulary/case.js';
import { useInfiniteQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { ErrorState, TableSkeleton } from '@/components/page-states';
import { PersonLine } from '@/components/person-line';
import { Section } from '@/components/section';
import { ShowMore } from '@/components/show-more';
import { formatDateTime, formatTime } from '@/lib/dates';
import { versionsQuery } from '../../api/list-versions';
import { groupVersions, type VersionGroup } from '../../version-groups';
import { CompareVersions } from './compare-versions';
import { Differences } from './differences';
import styles from './history.module.css';

/** Who changed what when, and any two versions side by side. */
export function CaseHistory({ caseId }: { caseId: string }) {
  const query = useInfiniteQuery(versionsQuery(caseId));
  if (!query.data) {
    if (query.error) return <ErrorState error={query.error} what="case" onRetry={() => void query.refetch()} />;
    return <TableSkeleton rows={6} columns={3} />;
  }
  const versions = query.data.pages.flatMap(({ items }) => items);
  // only its presenter and the coordinator read what was there before the release
  const oldest = query.hasNextPage ? null : (versions.at(-1)?.version ?? null);
  return (
    <>
      <Section title="Compare two versions">
        <CompareVersions caseId={caseId} versions={versions} />
      </Section>
      <Section title="Changes">
        <ol className={styles.groups}>
          {groupVersions(versions).map((group) => (
            <li key={group.first}>
              <Group caseId={caseId} group={group} oldest={oldest} />
            </li>
          ))}
        </ol>
        <ShowMore query={query} />
      </Section>
    </>
  );
}

const span = ({ startedAt, endedAt }: VersionGroup) =>
  formatDateTime(startedAt) === formatDateTime(endedAt) ? formatDateTime(endedAt) : `${formatDateTime(startedAt)} to ${formatTime(endedAt)}`;

const numbers = ({ first, last }: VersionGroup) => (first === last ? `version ${last}` : `versions ${first} to ${last}`);

/** One sitting; its differences are fetched when it is opened. The oldest version differs from nothing. */
function Group({ caseId, group, oldest }: { caseId: string; group: VersionGroup; oldest: number | null }) {
  const [isOpen, setOpen] = useState(false);
  const since = group.first === oldest ? oldest : group.first - 1;
  const isBeginning = group.last === since;
  const sections = SECTIONS.filter((section) => (group.sections as string[]).includes(section)).map((section) => SECTION_WORDS[section]).join(', ');
  const what = isBeginning ? (since === 1 ? 'Begun' : 'As released') : sections || 'Begun';
  const head = (
    <>
      <strong>{what}</strong>
      <span className="label-text">
        {span(group)}, {numbers(group)}, <PersonLine person={group.author} short />
      </span>
    </>
  );
  if (isBeginning) return <div className={styles.begun}>{head}</div>;
  return (
    <details onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary>{head}</summary>
      {isOpen && <Differences caseId={caseId} since={since} version={group.last} />}
    </details>
  );
}
