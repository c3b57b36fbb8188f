import { Button } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { Link, useNavigate, useParams } from 'react-router-dom';
import { paths } from '@/app/paths';
import { Page } from '@/components/page';
import { EmptyState, Loaded, TextSkeleton } from '@/components/page-states';
import { type Meeting, meetingQuery } from '@/features/meetings/api/get-meeting';
import { AttendancePanel } from '@/features/meetings/components/attendance-panel';
import { CurrentCase } from '@/features/meetings/components/current-case';
import { OrderPanel } from '@/features/meetings/components/order-panel';
import { CloseMeeting, RunHead, StartMeeting } from '@/features/meetings/components/run-head';
import { SlotTimer } from '@/features/meetings/components/slot-timer';
import { useNow, useSlotClock } from '@/features/meetings/use-slot-clock';
import { formatDate } from '@/lib/dates';
import styles from '@/features/meetings/components/run.module.css';

export function Component() {
  const { id = '' } = useParams();
  const query = useQuery(meetingQuery(id));
  return (
    <Loaded query={query} what="meeting" skeleton={<Waiting />}>
      {(meeting) => <RunMeeting key={meeting.id} meeting={meeting} />}
    </Loaded>
  );
}

const Waiting = () => (
  <Page title="Meeting" heading="Meeting">
    <TextSkeleton lines={8} />
  </Page>
);

function RunMeeting({ meeting }: { meeting: Meeting }) {
  const navigate = useNavigate();
  const { state, actions } = meeting;
  const isOver = state === 'closed' || state === 'cancelled';
  const now = useNow(!isOver);
  const slots = useSlotClock(meeting);
  const isLeading = state === 'running' && actions.run;
  const buttons = (
    <>
      {state === 'planned' && actions.run && <StartMeeting meeting={meeting} />}
      {isLeading && <CloseMeeting meeting={meeting} onClosed={() => void navigate(paths.meeting(meeting.id))} />}
      <Button asChild variant="soft" color="gray">
        <Link to={paths.meeting(meeting.id)}>Agenda</Link>
      </Button>
    </>
  );
  return (
    <Page title={`Meeting ${formatDate(meeting.startsAt)}`} heading={`${meeting.conferenceName}, ${formatDate(meeting.startsAt)}`} actions={buttons} width="wide">
      {isOver ? (
        <EmptyState title={state === 'closed' ? 'This meeting is closed' : 'This meeting was cancelled'}>What was decided stands with its cases and under Decisions.</EmptyState>
      ) : (
        <>
          {state === 'planned' && <p>The meeting has not started. {actions.run ? '' : 'The chair starts it.'}</p>}
          <RunHead meeting={meeting} clock={slots.clock} now={now} />
          <Columns {...{ meeting, slots, now, isLeading }} />
        </>
      )}
    </Page>
  );
}

interface ColumnsProps {
  meeting: Meeting;
  slots: ReturnType<typeof useSlotClock>;
  now: number;
  isLeading: boolean;
}

function Columns({ meeting, slots, now, isLeading }: ColumnsProps) {
  const { current, clock, choose } = slots;
  // the coordinator is here for the attendance
  const isTaking = meeting.actions.writeAttendance && !meeting.actions.run;
  return (
    <div className={styles.columns}>
      {current ? (
        <CurrentCase
          meeting={meeting}
          item={current}
          choose={choose}
          timer={isLeading && <SlotTimer item={current} clock={clock} now={now} onStart={() => slots.start(current.id)} onStop={slots.stop} />}
        />
      ) : (
        <EmptyState title="No case is listed">The agenda of this meeting is empty.</EmptyState>
      )}
      <div className={isTaking ? styles.first : undefined}>
        {isTaking && <AttendancePanel meeting={meeting} />}
        {current && <OrderPanel meeting={meeting} current={current} now={now} choose={choose} />}
        {!isTaking && <AttendancePanel meeting={meeting} />}
      </div>
    </div>
  );
}
