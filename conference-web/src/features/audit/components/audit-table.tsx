import { type Column, DataTable } from '@/components/data-table';
import type { Schemas } from '@/lib/api/types';
import { formatDateTime } from '@/lib/dates';
import { actionWords, detailWords } from '../words';
import styles from './audit-table.module.css';

type Entry = Schemas['AuditEntryDto'];

const columnsFor = (onCase?: (caseId: string) => void): Column<Entry>[] => [
  { key: 'at', head: 'When', nowrap: true, cell: ({ at }) => <time dateTime={at}>{formatDateTime(at)}</time> },
  { key: 'who', head: 'Who', cell: ({ personName, personId }) => personName ?? (personId ? 'Somebody no longer known' : 'Nobody signed in, or the server') },
  { key: 'what', head: 'What', nowrap: true, cell: ({ action }) => actionWords(action) },
  {
    key: 'record',
    head: 'Record',
    cell: ({ recordKind, recordId, caseId }) => (
      <>
        {recordKind.replaceAll('-', ' ')} <span className="label-text">{recordId.slice(0, 8)}</span>
        {caseId && onCase && (
          <div>
            <button type="button" className={styles.only} onClick={() => onCase(caseId)}>
              All of this case
            </button>
          </div>
        )}
      </>
    ),
  },
  { key: 'details', head: 'Details', cell: ({ details }) => detailWords(details) },
  { key: 'address', head: 'From', cell: ({ address }) => address },
];

/** Who did what to which record, when and from where; newest first, and nothing clinical in it. */
export function AuditTable({ entries, onCase }: { entries: Entry[]; onCase?: (caseId: string) => void }) {
  return <DataTable caption="Audit trail" columns={columnsFor(onCase)} rows={entries} rowKey={({ id }) => id} />;
}
