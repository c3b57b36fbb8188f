import { MEETING_STATE_WORDS } from '@kerfside/calc/vocabulary/meetings.js';
import { Link } from 'react-router-dom';
import { paths } from '@/app/paths';
import { type Column, DataTable } from '@/components/data-table';
import type { Schemas } from '@/lib/api/types';
import { formatDateTime } from '@/lib/dates';
import { counted, quantity } from '@/lib/units';
import { MeetingWhen } from './meeting-when';

type Row = Schemas['MeetingSummaryDto'];

function agendaWords({ state, agendaSentAt, agendaDueAt }: Row): string {
  if (agendaSentAt) return `Sent ${formatDateTime(agendaSentAt)}`;
  if (state !== 'planned') return 'Not sent';
  return `Goes out ${formatDateTime(agendaDueAt)}`;
}

function planWords({ caseCount, plannedMinutes, minutes }: Row): string {
  if (caseCount === 0) return 'None';
  return `${counted(caseCount, 'case')}, ${plannedMinutes} of ${quantity(minutes, 'minutes')}`;
}

const columns: Column<Row>[] = [
  {
    key: 'when',
    head: 'When',
    cell: (row) => (
      <Link to={paths.meeting(row.id)} data-list-item>
        <MeetingWhen {...row} />
      </Link>
    ),
  },
  { key: 'conference', head: 'Conference', cell: ({ conferenceName }) => conferenceName },
  { key: 'state', head: 'State', cell: ({ state }) => (state === 'running' ? <strong>Running now</strong> : MEETING_STATE_WORDS[state]) },
  { key: 'cases', head: 'Cases', cell: planWords },
  { key: 'agenda', head: 'Agenda', cell: agendaWords },
];

export function MeetingTable({ caption, rows }: { caption: string; rows: Row[] }) {
  return <DataTable caption={caption} columns={columns} rows={rows} rowKey={({ id }) => id} linked />;
}
