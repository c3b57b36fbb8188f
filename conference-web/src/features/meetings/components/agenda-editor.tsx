import { ChevronDownIcon, ChevronUpIcon, Cross2Icon, DragHandleDots2Icon } from '@radix-ui/react-icons';
import { Button, Flex, IconButton } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { FormProblem } from '@/components/form-problem';
import { RunningOrder } from '@/components/running-order/running-order';
import { formatTime } from '@/lib/dates';
import { useMediaQuery } from '@/lib/use-media-query';
import { plannedMinutes } from '../agenda-draft';
import type { AgendaItem, Meeting } from '../api/get-meeting';
import { listableCasesQuery } from '../api/list-listable-cases';
import type { AgendaDraft } from '../use-agenda-draft';
import { agendaSummary } from './agenda-view';
import { SlotText } from './agenda-slot';
import { StaleAgenda } from './stale-agenda';
import styles from './agenda.module.css';

interface EditorProps {
  meeting: Meeting;
  draft: AgendaDraft;
}

const LONGEST_MINUTES = 240;

/** What is known of the cases that are on the agenda or may come on it. */
export function useCasesById(meeting: Meeting): Map<string, AgendaItem> {
  const { data } = useQuery(listableCasesQuery(meeting.id));
  const fresh = (data?.items ?? []).map((row): [string, AgendaItem] => [
    row.id,
    { ...row, id: row.id, caseId: row.id, side: null, stage: 'open', position: 0, minutes: 0, state: 'listed', deferredReason: null },
  ]);
  return new Map([...fresh, ...meeting.items.map((item): [string, AgendaItem] => [item.caseId, item])]);
}

/** The running order to work on: drag, or the buttons of each case. */
export function AgendaEditor({ meeting, draft }: EditorProps) {
  const cases = useCasesById(meeting);
  const isNarrow = useMediaQuery('(max-width: 640px)');
  const [said, setSaid] = useState('');
  const slots = draft.entries.map(({ caseId, minutes }) => ({ id: caseId, minutes }));
  const start = new Date(meeting.startsAt).getTime();
  const nameOf = (caseId: string) => cases.get(caseId)?.code ?? 'a case';
  const move = (from: number, to: number) => {
    if (to < 0 || to >= slots.length) return;
    draft.move(from, to);
    setSaid(`${nameOf(slots[from]!.id)} is now ${to + 1} of ${slots.length}.`);
  };
  return (
    <>
      {draft.isStale && <StaleAgenda draft={draft} nameOf={nameOf} />}
      <p className={styles.summary} role="status">
        {agendaSummary(slots.length, plannedMinutes(draft.entries), meeting.minutes)}
      </p>
      <RunningOrder label="Running order" slots={slots} startsAt={meeting.startsAt} minutes={meeting.minutes} neededPx={isNarrow ? 128 : 58} onMove={move}>
        {({ slot, from }, index) => (
          <EditSlot
            item={cases.get(slot.id)}
            {...{ index, draft, move }}
            count={slots.length}
            minutes={slot.minutes}
            beginsAt={formatTime(new Date(start + from * 60_000))}
          />
        )}
      </RunningOrder>
      <p className="visually-hidden" role="status">
        {said}
      </p>
      <SaveAgenda draft={draft} />
    </>
  );
}

interface EditSlotProps {
  item: AgendaItem | undefined;
  index: number;
  count: number;
  minutes: number;
  beginsAt: string;
  draft: AgendaDraft;
  move: (from: number, to: number) => void;
}

function EditSlot({ item, index, count, minutes, beginsAt, draft, move }: EditSlotProps) {
  if (!item) return <div className={styles.text}>A case that you can not see</div>;
  const { code, caseId } = item;
  // what has been talked about already stays on the agenda as it was
  const isOver = item.state !== 'listed';
  return (
    <div className={styles.edit}>
      <span className={styles.handle} data-drag-handle={!isOver || undefined} title="Drag to another place" aria-hidden="true">
        <DragHandleDots2Icon width={18} height={18} />
      </span>
      <SlotText item={item} />
      <div className={styles.tools}>
        <label className={styles.field}>
          <span className="visually-hidden">
            Minutes for {code}, begins {beginsAt}
          </span>
          <input
            type="number"
            min={1}
            max={LONGEST_MINUTES}
            value={minutes}
            disabled={isOver}
            onChange={({ target }) => draft.setMinutes(caseId, Math.max(1, Math.min(LONGEST_MINUTES, Math.round(target.valueAsNumber) || 1)))}
          />
          min
        </label>
        <IconButton variant="ghost" color="gray" highContrast aria-label={`Move ${code} up`} aria-disabled={index === 0} onClick={() => move(index, index - 1)}>
          <ChevronUpIcon />
        </IconButton>
        <IconButton variant="ghost" color="gray" highContrast aria-label={`Move ${code} down`} aria-disabled={index === count - 1} onClick={() => move(index, index + 1)}>
          <ChevronDownIcon />
        </IconButton>
        <IconButton variant="ghost" color="gray" highContrast aria-label={`Take ${code} off the agenda`} disabled={isOver} onClick={() => draft.remove(caseId)}>
          <Cross2Icon />
        </IconButton>
      </div>
    </div>
  );
}

function SaveAgenda({ draft }: Pick<EditorProps, 'draft'>) {
  const { isDirty, isStale, isSaving, error } = draft;
  return (
    <div className={styles.save} data-dirty={isDirty || undefined}>
      {!isStale && <FormProblem error={error} />}
      <Flex gap="3" align="center" wrap="wrap">
        <Button onClick={() => void draft.save()} loading={isSaving} disabled={isSaving || !isDirty || isStale}>
          Save agenda
        </Button>
        {isDirty && (
          <Button variant="soft" color="gray" onClick={draft.discard}>
            Discard changes
          </Button>
        )}
        <span className="label-text" role="status">
          {isDirty ? 'Not saved yet: kept in this browser.' : 'No changes.'}
        </span>
      </Flex>
    </div>
  );
}
