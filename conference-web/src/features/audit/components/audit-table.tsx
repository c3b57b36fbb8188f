import { type Column, DataTable } from '@/components/data-table';
import type { Schemas } from '@/lib/api/types';
import { formatDateTime } from '@/lib/dates';
import { actionWords, detailWords } from '../words';

type Entry = Schemas['AuditEntryDto'];

const columns: Column<Entry>[] = [
  { key: 'at', head: 'When', cell: ({ at }) => <time dateTime={at}>{formatDateTime(at)}</time> },
  { key: 'who', head: 'Who', cell: ({ personName, personId }) => personName ?? (personId ? 'Somebody no longer known' : 'Nobody signed in, or the server') },
  { key: 'what', head: 'What', cell: ({ action }) => actionWords(action) },
  {
    key: 'record',
    head: 'Record',
    cell: ({ recordKind, recordId }) => (
      <>
        {recordKind.replaceAll('-', ' ')} <span className="label-text">{recordId.slice(0, 8)}</span>
      </>
    ),
  },
  { key: 'details', head: 'Details', cell: ({ details }) => detailWords(details) },
  { key: 'address', head: 'From', cell: ({ address }) => address },
];

/** Who did what to which record, when and from where; newest first, and nothing clinical in it. */
export function AuditTable({ entries }: { entries: Entry[] }) {
  return <DataTable caption="Audit trail" columns={columns} rows={entries} rowKey={({ id }) => id} />;
}
