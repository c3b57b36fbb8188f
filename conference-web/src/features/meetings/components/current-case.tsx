import { ChevronLeftIcon, ChevronRightIcon } from '@radix-ui/react-icons';
import { Button, Flex } from '@radix-ui/themes';
import { SIDE_WORDS, URGENCY_WORDS } from '@kerfside/calc/vocabulary/case.js';
import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { paths } from '@/app/paths';
import { Confirm } from '@/components/confirm';
import { useKey } from '@/components/keys/use-key';
import { PersonLine } from '@/components/person-line';
import { DecisionPanel } from '@/features/decisions/components/decision-panel';
import { RatingPanel } from '@/features/ratings/components/rating-panel';
import type { AgendaItem, Meeting } from '../api/get-meeting';
import { useDeferItem } from '../api/run-meeting';
import { RoundControl } from './round-control';
import styles from './run.module.css';

interface CurrentCaseProps {
  meeting: Meeting;
  item: AgendaItem;
  choose: (itemId: string) => void;
  timer: ReactNode;
}

/** The case being talked about: its sheet one step away, its rating and its decision here. */
export function CurrentCase({ meeting, item, choose, timer }: CurrentCaseProps) {
  const index = meeting.items.indexOf(item);
  const isRunning = meeting.state === 'running';
  const isLeading = isRunning && meeting.actions.run;
  return (
    <article aria-labelledby="current-case" className={styles.current}>
      <Neighbours {...{ meeting, index, choose }} />
      <h2 id="current-case">
        <span>{item.code}</span> {item.title}
      </h2>
      <p className={styles.facts}>
        {[item.side && SIDE_WORDS[item.side], URGENCY_WORDS[item.urgency].toLowerCase(), STATE_WORDS[item.state]].filter(Boolean).join(', ')}
        {'. '}
        <PersonLine person={item.presenter} />
      </p>
      {item.deferredReason && <p>Deferred: {item.deferredReason}</p>}
      {item.state === 'listed' && timer}
      <Flex gap="3" wrap="wrap" mb="4">
        <Button asChild variant="soft">
          <Link to={paths.case(item.caseId)}>Open the case</Link>
        </Button>
        {isLeading && item.state === 'listed' && <DeferCase meeting={meeting} item={item} />}
      </Flex>
      {isLeading && item.state === 'listed' && <RoundControl key={item.caseId} caseId={item.caseId} isRunning={isRunning} />}
      <RatingPanel key={`rating ${item.caseId}`} caseId={item.caseId} />
      <DecisionPanel key={`decision ${item.caseId}`} caseId={item.caseId} />
    </article>
  );
}

const STATE_WORDS = { listed: 'to be decided', decided: 'decided', deferred: 'deferred' } as const;

function Neighbours({ meeting, index, choose }: { meeting: Meeting; index: number; choose: (id: string) => void }) {
  const { items } = meeting;
  const go = (to: number) => {
    const item = items[to];
    if (item) choose(item.id);
  };
  useKey('j', 'Next case', () => go(index + 1));
  useKey('k', 'Previous case', () => go(index - 1));
  return (
    <nav className={styles.neighbours} aria-label="Cases of the agenda">
      <Button variant="soft" color="gray" highContrast disabled={index <= 0} onClick={() => go(index - 1)}>
        <ChevronLeftIcon aria-hidden="true" />
        Previous
      </Button>
      <span role="status">
        Case {index + 1} of {items.length}
      </span>
      <Button variant="soft" color="gray" highContrast disabled={index >= items.length - 1} onClick={() => go(index + 1)}>
        Next case
        <ChevronRightIcon aria-hidden="true" />
      </Button>
    </nav>
  );
}

function DeferCase({ meeting, item }: { meeting: Meeting; item: AgendaItem }) {
  const { mutateAsync } = useDeferItem(meeting.id);
  return (
    <Confirm
      title={`Defer ${item.code}`}
      confirmWord="Defer case"
      reason={{ label: 'Reason', hint: 'What has to be there before it is decided.', maxLength: 1000 }}
      onConfirm={(reason) => mutateAsync({ itemId: item.id, caseId: item.caseId, reason })}
      trigger={<Button variant="soft">Defer case</Button>}
    >
      The case goes back to open and can be listed for a later meeting. The reason stands in the minutes.
    </Confirm>
  );
}
