import { Button } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Confirm } from '@/components/confirm';
import { Section } from '@/components/section';
import { membersQuery } from '@/features/conferences/api/list-members';
import { formatDateTime } from '@/lib/dates';
import { counted } from '@/lib/units';
import type { Meeting } from '../api/get-meeting';
import { useSendAgenda } from '../api/send-agenda';

/** When the agenda goes out, and the button that sends it now. */
export function SendAgenda({ meeting, isDirty }: { meeting: Meeting; isDirty: boolean }) {
  const { agendaSentAt, agendaDueAt, conferenceName, conferenceId, items } = meeting;
  const isUnchanged = agendaSentAt !== null && !meeting.actions.sendAgenda && !isDirty;
  const members = useQuery(membersQuery(conferenceId)).data?.items.length;
  const { mutateAsync } = useSendAgenda(meeting.id);
  const [result, setResult] = useState('');
  const send = async () => {
    const { mails } = await mutateAsync(meeting.version);
    setResult(`${counted(mails, 'mail')} on the way.`);
  };
  return (
    <Section title="Sending the agenda">
      <p style={{ maxWidth: 'var(--measure)', lineHeight: 1.5 }}>
        {agendaSentAt
          ? `Sent ${formatDateTime(agendaSentAt)}. ${isUnchanged ? 'Nothing has changed since.' : 'What was changed since reaches members only when it is sent again.'}`
          : `The server sends it by itself on ${formatDateTime(agendaDueAt)}, as it stands then.`}
      </p>
      <Confirm
        title="Send agenda"
        confirmWord="Send agenda"
        onConfirm={send}
        trigger={<Button disabled={isDirty || isUnchanged}>{agendaSentAt ? 'Send agenda again' : 'Send agenda'}</Button>}
      >
        {`The agenda ${items.length > 0 ? `with ${counted(items.length, 'case')}` : 'without a case'} goes by e-mail to ${members === undefined ? 'all members' : `the ${counted(members, 'member')}`} of ${conferenceName}, with an entry for their calendars. `}
        {'It holds case codes, minutes, presenters and a link; no clinical detail.'}
      </Confirm>
      {isDirty && <p className="label-text">Save the agenda first.</p>}
      <p role="status">{result}</p>
    </Section>
  );
}
