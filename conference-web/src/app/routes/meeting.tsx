import { MEETING_STATE_WORDS } from '@kerfside/calc/vocabulary/meetings.js';
import { Button } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { paths } from '@/app/paths';
import { Page } from '@/components/page';
import { Loaded, TextSkeleton } from '@/components/page-states';
import { Facts, Section } from '@/components/section';
import { type Meeting, meetingQuery } from '@/features/meetings/api/get-meeting';
import { AgendaEditor } from '@/features/meetings/components/agenda-editor';
import { AgendaTable, AgendaView } from '@/features/meetings/components/agenda-view';
import { AttendanceList } from '@/features/meetings/components/attendance-list';
import { ListableCases } from '@/features/meetings/components/listable-cases';
import { MeetingWhen } from '@/features/meetings/components/meeting-when';
import { CancelMeeting, MoveMeeting } from '@/features/meetings/components/move-meeting';
import { SendAgenda } from '@/features/meetings/components/send-agenda';
import { useAgendaDraft } from '@/features/meetings/use-agenda-draft';
import { formatDate, formatDateTime } from '@/lib/dates';

export function Component() {
  const { id = '' } = useParams();
  const query = useQuery(meetingQuery(id));
  return (
    <Loaded query={query} what="meeting" skeleton={<Waiting />}>
      {(meeting) => <MeetingPage key={meeting.id} meeting={meeting} />}
    </Loaded>
  );
}

const Waiting = () => (
  <Page title="Meeting" heading="Meeting">
    <TextSkeleton lines={8} />
  </Page>
);

function MeetingPage({ meeting }: { meeting: Meeting }) {
  const { actions, state } = meeting;
  const heading = `${meeting.conferenceName}, ${formatDate(meeting.startsAt)}`;
  return (
    <Page title={`Meeting ${formatDate(meeting.startsAt)}`} heading={heading} actions={<MeetingActions meeting={meeting} />}>
      <MeetingFacts meeting={meeting} />
      {actions.editAgenda ? (
        <EditableAgenda meeting={meeting} />
      ) : (
        <Section title="Running order">
          <AgendaView meeting={meeting} />
        </Section>
      )}
      {(state === 'running' || state === 'closed') && (
        <Section title="Attendance">
          <AttendanceList meeting={meeting} />
          <p>{meeting.quorum.met ? 'The quorum was met.' : `Not enough for a quorum: ${meeting.quorum.missing.join('; ')}.`}</p>
        </Section>
      )}
    </Page>
  );
}

function EditableAgenda({ meeting }: { meeting: Meeting }) {
  const draft = useAgendaDraft(meeting);
  return (
    <>
      <div className="print-hidden">
        <Section title="Running order">
          <AgendaEditor meeting={meeting} draft={draft} />
          {!draft.isDirty && meeting.items.length > 0 && <AgendaTable meeting={meeting} />}
        </Section>
        <ListableCases meeting={meeting} draft={draft} />
        <SendAgenda meeting={meeting} isDirty={draft.isDirty} />
      </div>
      <div className="print-only">
        <Section title="Running order">
          <AgendaView meeting={meeting} />
        </Section>
      </div>
    </>
  );
}

function MeetingActions({ meeting }: { meeting: Meeting }) {
  const { state, actions } = meeting;
  const isOpen = state === 'planned' || state === 'running';
  return (
    <>
      {isOpen && (
        <Button asChild variant={state === 'running' || actions.run ? 'solid' : 'soft'}>
          <Link to={paths.runMeeting(meeting.id)}>{actions.run ? 'Run meeting' : actions.writeAttendance ? 'Take attendance' : 'Follow meeting'}</Link>
        </Button>
      )}
      {state === 'planned' && actions.editAgenda && (
        <>
          <MoveMeeting meeting={meeting} />
          <CancelMeeting meeting={meeting} />
        </>
      )}
      <Button variant="soft" color="gray" onClick={() => print()}>
        Print
      </Button>
    </>
  );
}

function MeetingFacts({ meeting }: { meeting: Meeting }) {
  const { state, cancelledReason, startedAt, closedAt, agendaSentAt } = meeting;
  return (
    <div style={{ marginBottom: 'var(--space-5)' }}>
      <Facts
        facts={[
          ['When', <MeetingWhen key="when" {...meeting} />],
          ['State', state === 'cancelled' ? `Cancelled: ${cancelledReason ?? ''}` : MEETING_STATE_WORDS[state]],
          ...(startedAt ? [['Started', formatDateTime(startedAt)] as [string, string]] : []),
          ...(closedAt ? [['Closed', formatDateTime(closedAt)] as [string, string]] : []),
          ...(state !== 'cancelled' ? [['Agenda', agendaSentAt ? `Sent ${formatDateTime(agendaSentAt)}` : `Not sent yet; goes out by itself ${formatDateTime(meeting.agendaDueAt)}`] as [string, string]] : []),
        ]}
      />
    </div>
  );
}
