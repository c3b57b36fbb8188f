import { URGENCY_WORDS } from '@kerfside/calc/vocabulary/case.js';
import { Button } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { paths } from '@/app/paths';
import { type Column, DataTable } from '@/components/data-table';
import { Loaded, TableSkeleton } from '@/components/page-states';
import { Section } from '@/components/section';
import type { Schemas } from '@/lib/api/types';
import { formatDate } from '@/lib/dates';
import type { Meeting } from '../api/get-meeting';
import { listableCasesQuery } from '../api/list-listable-cases';
import type { AgendaDraft } from '../use-agenda-draft';
import styles from './agenda.module.css';

type Row = Schemas['ListableCaseDto'];

const FIRST_MINUTES = 15;

/** Open cases of the conference, with what each lacks before it can come on the agenda. */
export function ListableCases({ meeting, draft }: { meeting: Meeting; draft: AgendaDraft }) {
  const query = useQuery(listableCasesQuery(meeting.id));
  const onAgenda = new Set(draft.entries.map(({ caseId }) => caseId));
  const takenOff = meeting.items.filter(({ caseId, state }) => state === 'listed' && !onAgenda.has(caseId));
  const minutesBefore = new Map(meeting.items.map(({ caseId, minutes }) => [caseId, minutes]));
  const columns: Column<Row>[] = [
    {
      key: 'case',
      head: 'Case',
      cell: ({ id, code, title }) => (
        <Link to={paths.case(id)} data-list-item>
          <span className={styles.code}>{code}</span> {title}
        </Link>
      ),
    },
    { key: 'urgency', head: 'Urgency', cell: ({ urgency }) => URGENCY_WORDS[urgency] },
    { key: 'presenter', head: 'Presenter', cell: ({ presenter }) => presenter.name },
    { key: 'released', head: 'Open since', cell: ({ releasedAt }) => releasedAt && formatDate(releasedAt) },
    { key: 'ratings', head: 'Ratings', align: 'right', cell: ({ ratings }) => ratings },
    { key: 'missing', head: 'Missing', cell: (row) => <Missing row={row} /> },
    {
      key: 'list',
      head: 'List',
      fold: 'bare',
      align: 'right',
      cell: ({ id, code, canBeListed }) =>
        canBeListed && (
          <Button size="2" variant="soft" aria-label={`List case ${code}`} onClick={() => draft.add(id, minutesBefore.get(id) ?? FIRST_MINUTES)}>
            List case
          </Button>
        ),
    },
  ];
  return (
    <Section title="Cases that can be listed">
      <Loaded query={query} skeleton={<TableSkeleton rows={3} columns={6} />}>
        {({ items }) => {
          const rows = [...takenOff.map(asListable), ...items.filter(({ id }) => !onAgenda.has(id) && !minutesBefore.has(id))];
          if (rows.length === 0) return <p className="label-text">No other case of this conference is open.</p>;
          return <DataTable caption="Cases that can be listed" columns={columns} rows={rows} rowKey={({ id }) => id} />;
        }}
      </Loaded>
    </Section>
  );
}

const asListable = ({ caseId, code, title, urgency, presenter, ratings }: Meeting['items'][number]): Row => ({
  id: caseId,
  code,
  title,
  urgency,
  presenter,
  ratings,
  releasedAt: null,
  canBeListed: true,
  missing: [],
});

function Missing({ row }: { row: Row }) {
  if (row.missing.length === 0) return 'Nothing';
  return (
    <ul className={styles.missing}>
      {row.missing.map((line) => (
        <li key={line}>{line}</li>
      ))}
    </ul>
  );
}
