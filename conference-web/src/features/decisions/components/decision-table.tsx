import { Link } from 'react-router-dom';
import { paths } from '@/app/paths';
import { type Column, DataTable } from '@/components/data-table';
import type { Schemas } from '@/lib/api/types';
import { formatDate } from '@/lib/dates';

type Row = Schemas['DecisionSummaryDto'];

const columns: Column<Row>[] = [
  {
    key: 'number',
    head: 'Number',
    cell: ({ id, number, kind }) => (
      <Link to={paths.decision(id)} data-list-item>
        {kind === 'advice' ? 'Advice' : 'Decision'} {number}
      </Link>
    ),
  },
  { key: 'case', head: 'Case', cell: ({ caseCode }) => caseCode },
  { key: 'version', head: 'Version', cell: ({ version }) => (version === 1 ? '1' : `${version}, amendment`) },
  { key: 'at', head: 'Signed', cell: ({ signedAt }) => <time dateTime={signedAt}>{formatDate(signedAt)}</time> },
  { key: 'by', head: 'By', cell: ({ signedBy }) => signedBy },
];

/** Signed decisions, newest first. */
export const DecisionTable = ({ items }: { items: Row[] }) => (
  <DataTable caption="Decisions" columns={columns} rows={items} rowKey={({ id }) => id} linked />
);
