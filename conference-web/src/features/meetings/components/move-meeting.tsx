import { Button } from '@radix-ui/themes';
import { type FormEvent, useState } from 'react';
import { Confirm } from '@/components/confirm';
import { FormButtons } from '@/components/form-buttons';
import { FormDialog } from '@/components/form-dialog';
import { FormProblem } from '@/components/form-problem';
import { fieldMessages } from '@/lib/api/field-messages';
import type { Meeting } from '../api/get-meeting';
import { useCancelMeeting, useMoveMeeting } from '../api/write-meeting';
import { instantOf, wallTime } from '../zoned-time';
import { MeetingTimeFields } from './meeting-time-fields';

/** Another time or length for a meeting that has not begun. */
export function MoveMeeting({ meeting }: { meeting: Meeting }) {
  return (
    <FormDialog
      title="Move meeting"
      description={
        meeting.agendaSentAt
          ? 'The agenda was sent already: every member gets the new time by e-mail at once, for their calendars too.'
          : 'Nobody has had the agenda yet: members learn of the new time with it.'
      }
      trigger={<Button variant="soft">Move meeting</Button>}
    >
      {(close) => <MoveMeetingForm meeting={meeting} close={close} />}
    </FormDialog>
  );
}

function MoveMeetingForm({ meeting, close }: { meeting: Meeting; close: () => void }) {
  const { timeZone } = meeting;
  const { mutateAsync, error, isPending } = useMoveMeeting(meeting.id);
  const [times, setTimes] = useState({ wall: wallTime(meeting.startsAt, timeZone), minutes: meeting.minutes });
  const submit = async (event: FormEvent) => {
    event.preventDefault();
    const startsAt = instantOf(times.wall, timeZone);
    if (!startsAt) return;
    const isDone = await mutateAsync({ startsAt, minutes: times.minutes, baseVersion: meeting.version }).then(
      () => true,
      () => false,
    );
    if (isDone) close();
  };
  return (
    <form onSubmit={submit}>
      <FormProblem error={error} shown={['startsAt', 'minutes']} />
      <MeetingTimeFields timeZone={timeZone} value={times} onChange={setTimes} errors={fieldMessages(error)} />
      <FormButtons word="Move meeting" isBusy={isPending} onCancel={close} />
    </form>
  );
}

export function CancelMeeting({ meeting }: { meeting: Meeting }) {
  const { mutateAsync } = useCancelMeeting(meeting.id);
  return (
    <Confirm
      title="Cancel this meeting"
      confirmWord="Cancel meeting"
      tone="grave"
      reason={{ label: 'Reason', hint: 'Members read it. No clinical detail.', maxLength: 1000 }}
      onConfirm={mutateAsync}
      trigger={
        <Button variant="soft" color="gray" highContrast>
          Cancel meeting
        </Button>
      }
    >
      {meeting.items.length > 0 ? 'Its cases go back to open, for a later meeting. ' : ''}
      {meeting.agendaSentAt ? 'Members who got the agenda are told by e-mail, and their calendar entry is cancelled.' : 'Nobody has had its agenda yet.'}
    </Confirm>
  );
}
