import { OUTBOX_STATE_WORDS } from '@kerfside/calc/vocabulary/mail.js';
import { Button, Flex } from '@radix-ui/themes';
import { Confirm } from '@/components/confirm';
import { type Column, DataTable } from '@/components/data-table';
import type { Schemas } from '@/lib/api/types';
import { formatDateTime } from '@/lib/dates';
import { useDropMail, useRetryMail } from '../api/settle-mail';

type Mail = Schemas['QueuedMailDto'];

/** What the mail tells, in words; the template's name where a newer server has one that is not known here. */
const KIND_WORDS: Record<string, string> = {
  invitation: 'Invitation',
  'password-reset': 'New password',
  agenda: 'Agenda',
  'case-returned': 'Case returned',
  'case-released': 'Case released',
  'question-asked': 'Question asked',
  mention: 'Mention',
  'rating-due': 'Rating due',
  'decision-signed': 'Decision signed',
  'final-decision-due': 'Final decision due',
  'final-decision': 'Final decision',
};

function Settle({ mail }: { mail: Mail }) {
  const retry = useRetryMail();
  const drop = useDropMail();
  return (
    <Flex gap="2" wrap="wrap" py="1">
      <Confirm
        title="Send again"
        confirmWord="Send again"
        onConfirm={() => retry.mutateAsync(mail.id)}
        trigger={
          <Button variant="soft" size="2" data-list-item aria-label={`Send the mail to ${mail.recipient} again`}>
            Send again
          </Button>
        }
      >
        {mail.state === 'uncertain'
          ? `This mail to ${mail.recipient} may have arrived already. Sending it again may make it arrive twice.`
          : `The mail goes to ${mail.recipient} at the next turn.`}
      </Confirm>
      <Confirm
        title="Drop this mail"
        tone="grave"
        confirmWord="Drop mail"
        reason={{ label: 'Reason', hint: 'Kept in the audit trail.', maxLength: 300 }}
        onConfirm={(reason) => drop.mutateAsync({ id: mail.id, reason })}
        trigger={
          <Button variant="soft" color="gray" size="2" aria-label={`Drop the mail to ${mail.recipient}`}>
            Drop
          </Button>
        }
      >
        It will not be sent to {mail.recipient}.
      </Confirm>
    </Flex>
  );
}

function StateCell({ mail }: { mail: Mail }) {
  return (
    <>
      {OUTBOX_STATE_WORDS[mail.state]}
      {mail.state === 'queued' && mail.attempts > 0 && <div className="label-text">Next try {formatDateTime(mail.nextAttemptAt)}</div>}
      {mail.lastError && mail.state !== 'sent' && <div className="label-text">{mail.lastError}</div>}
    </>
  );
}

const columns: Column<Mail>[] = [
  { key: 'recipient', head: 'To', cell: ({ recipient }) => <span style={{ overflowWrap: 'anywhere' }}>{recipient}</span> },
  { key: 'kind', head: 'About', cell: ({ template }) => KIND_WORDS[template] ?? template },
  { key: 'created', head: 'Written', cell: ({ createdAt }) => <time dateTime={createdAt}>{formatDateTime(createdAt)}</time> },
  { key: 'state', head: 'State', cell: (mail) => <StateCell mail={mail} /> },
  { key: 'attempts', head: 'Tries', align: 'right', cell: ({ attempts }) => attempts },
  { key: 'sent', head: 'Sent', cell: ({ sentAt }) => sentAt && <time dateTime={sentAt}>{formatDateTime(sentAt)}</time> },
  {
    key: 'settle',
    head: 'Settle',
    fold: 'bare',
    cell: (mail) => (mail.state === 'failed' || mail.state === 'uncertain' ? <Settle mail={mail} /> : null),
  },
];

export function MailTable({ mails }: { mails: Mail[] }) {
  return <DataTable caption="Mail" columns={columns} rows={mails} rowKey={({ id }) => id} />;
}
