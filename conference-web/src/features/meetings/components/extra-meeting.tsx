import { PlusIcon } from '@radix-ui/react-icons';
import { Button } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { type FormEvent, useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { paths } from '@/app/paths';
import { SelectField } from '@/components/field';
import { FormButtons } from '@/components/form-buttons';
import { FormDialog } from '@/components/form-dialog';
import { FormProblem } from '@/components/form-problem';
import { conferencesQuery } from '@/features/conferences/api/list-conferences';
import { fieldMessages } from '@/lib/api/field-messages';
import type { Schemas } from '@/lib/api/types';
import { useCreateMeeting } from '../api/write-meeting';
import { instantOf } from '../zoned-time';
import { MeetingTimeFields, type MeetingTimes } from './meeting-time-fields';

type Conference = Schemas['ConferenceDto'];

/** A meeting outside the slot, by who may write the agenda of a conference. */
export function ExtraMeeting() {
  const { data } = useQuery(conferencesQuery());
  const mine = (data?.items ?? []).filter(({ myRole }) => myRole === 'chair' || myRole === 'coordinator');
  if (mine.length === 0) return null;
  return (
    <FormDialog
      title="Extra meeting"
      description="A meeting outside the conference’s slot. Its agenda goes out by itself as long before it as for the others."
      trigger={
        <Button variant="soft">
          <PlusIcon aria-hidden="true" />
          Extra meeting
        </Button>
      }
    >
      {(close) => <ExtraMeetingForm conferences={mine} close={close} />}
    </FormDialog>
  );
}

function ExtraMeetingForm({ conferences, close }: { conferences: Conference[]; close: () => void }) {
  const navigate = useNavigate();
  const { mutateAsync, error, isPending } = useCreateMeeting();
  const [id, setId] = useState(conferences[0]!.id);
  const conference = conferences.find((each) => each.id === id) ?? conferences[0]!;
  const [times, setTimes] = useState<MeetingTimes>({ wall: '', minutes: conference.slotMinutes });
  const submit = async (event: FormEvent) => {
    event.preventDefault();
    const startsAt = instantOf(times.wall, conference.timeZone);
    if (!startsAt) return;
    const meeting = await mutateAsync({ conferenceId: conference.id, startsAt, minutes: times.minutes }).catch(() => null);
    if (!meeting) return;
    close();
    void navigate(paths.meeting(meeting.id));
  };
  return (
    <form onSubmit={submit}>
      <FormProblem error={error} shown={['startsAt', 'minutes']} />
      {conferences.length > 1 && (
        <SelectField
          label="Conference"
          words={Object.fromEntries(conferences.map(({ id: each, name }) => [each, name]))}
          value={id}
          onChange={({ target }) => setId(target.value)}
        />
      )}
      <MeetingTimeFields timeZone={conference.timeZone} value={times} onChange={setTimes} errors={fieldMessages(error)} />
      <FormButtons word="Plan meeting" isBusy={isPending} onCancel={close} />
    </form>
  );
}
