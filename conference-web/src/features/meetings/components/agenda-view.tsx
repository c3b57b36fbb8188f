import { type Column, DataTable } from '@/components/data-table';
import { RunningOrder } from '@/components/running-order/running-order';
import { layOutSlots } from '@/components/running-order/running-order-scale';
import { formatTime, zoneName } from '@/lib/dates';
import { counted, quantity } from '@/lib/units';
import { useMediaQuery } from '@/lib/use-media-query';
import { plannedMinutes } from '../agenda-draft';
import type { AgendaItem, Meeting } from '../api/get-meeting';
import { SlotText } from './agenda-slot';
import styles from './agenda.module.css';

/** `3 cases, 50 of 60 min planned.` */
export function agendaSummary(count: number, planned: number, minutes: number): string {
  if (count === 0) return `No case is listed; the meeting has ${quantity(minutes, 'minutes')}.`;
  const rest = minutes - planned;
  const end = rest > 0 ? `; ${quantity(rest, 'minutes')} free` : rest < 0 ? `; ${quantity(-rest, 'minutes')} too long` : '';
  return `${counted(count, 'case')}, ${planned} of ${quantity(minutes, 'minutes')} planned${end}.`;
}

/** `4 cases: 1 decided, 3 deferred.` */
function outcomeSummary(items: AgendaItem[]): string {
  const decided = items.filter(({ state }) => state === 'decided').length;
  return `${counted(items.length, 'case')}: ${decided} decided, ${items.length - decided} deferred.`;
}

/** The agenda to read: the running order, and the same as a table. */
export function AgendaView({ meeting }: { meeting: Meeting }) {
  const { items, startsAt, minutes } = meeting;
  const isNarrow = useMediaQuery('(max-width: 640px)');
  if (items.length === 0) return <p className="label-text">No case is listed yet.</p>;
  return (
    <>
      <p className={styles.summary}>{meeting.state === 'closed' ? outcomeSummary(items) : agendaSummary(items.length, plannedMinutes(items), minutes)}</p>
      <RunningOrder label="Running order" slots={items} startsAt={startsAt} minutes={minutes} neededPx={isNarrow ? 72 : 46} isDone={({ state }) => state !== 'listed'}>
        {({ slot }) => <SlotText item={slot} minutes={slot.minutes} />}
      </RunningOrder>
      <AgendaTable meeting={meeting} />
    </>
  );
}

/** All that the running order shows, in words; on paper it always stands there. */
export function AgendaTable({ meeting: { items, startsAt, minutes } }: { meeting: Pick<Meeting, 'items' | 'startsAt' | 'minutes'> }) {
  const { placed } = layOutSlots(items, minutes);
  const start = new Date(startsAt).getTime();
  const columns: Column<(typeof placed)[number]>[] = [
    { key: 'case', head: 'Case', cell: ({ slot }) => `${slot.code} ${slot.title}` },
    { key: 'time', head: `Begins (${zoneName(startsAt)})`, cell: ({ from, fits }) => (fits ? formatTime(new Date(start + from * 60_000)) : 'Does not fit') },
    { key: 'minutes', head: 'Minutes', align: 'right', cell: ({ slot }) => slot.minutes },
    { key: 'presenter', head: 'Presenter', cell: ({ slot }) => slot.presenter.name },
    { key: 'ratings', head: 'Ratings', align: 'right', cell: ({ slot }) => slot.ratings },
    { key: 'state', head: 'State', cell: ({ slot }) => stateWords(slot) },
  ];
  return (
    <>
      <details className={`${styles.table} print-hidden`}>
        <summary>The running order as a table</summary>
        <DataTable caption="Running order" columns={columns} rows={placed} rowKey={({ slot }) => slot.id} />
      </details>
      {/* paper has no fold to open */}
      <table className={`${styles.paper} print-only`}>
        <thead>
          <tr>
            {columns.map(({ key, head }) => (
              <th key={key}>{head}</th>
            ))}
          </tr>
        </thead>
        <tbody>
          {placed.map((row) => (
            <tr key={row.slot.id}>
              {columns.map(({ key, cell }) => (
                <td key={key}>{cell(row)}</td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </>
  );
}

function stateWords({ state, deferredReason }: AgendaItem): string {
  if (state === 'deferred') return deferredReason ? `Deferred: ${deferredReason}` : 'Deferred';
  return state === 'decided' ? 'Decided' : 'Listed';
}
