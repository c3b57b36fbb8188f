import { OUTBOX_STATE_WORDS, OUTBOX_STATES, type OutboxState } from '@kerfside/calc/vocabulary/mail.js';
import { useInfiniteQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { SelectField } from '@/components/field';
import { Page } from '@/components/page';
import { EmptyState, ErrorState, TableSkeleton } from '@/components/page-states';
import { ShowMore } from '@/components/show-more';
import { mailQuery } from '@/features/mail/api/list-mail';
import { MailTable } from '@/features/mail/components/mail-table';
import { counted } from '@/lib/units';

/** `40 minutes`: roughly is enough to see that something is stuck. */
const roughly = (seconds: number) =>
  seconds < 90 ? counted(Math.round(seconds), 'second') : seconds < 5400 ? counted(Math.round(seconds / 60), 'minute') : counted(Math.round(seconds / 3600), 'hour');

export function Component() {
  const [address, setAddress] = useSearchParams();
  const state = OUTBOX_STATES.find((name) => name === address.get('state'));
  const query = useInfiniteQuery(mailQuery(state ? { state } : {}));
  const first = query.data?.pages[0];
  return (
    <Page title="Mail" heading="Mail">
      {first && (
        <p role="status">
          {first.waiting === 0
            ? 'No mail is waiting.'
            : `${counted(first.waiting, 'mail')} waiting${first.oldestUnsentSeconds === null ? '' : `, the oldest for ${roughly(first.oldestUnsentSeconds)}`}.`}
        </p>
      )}
      <div style={{ maxWidth: 260 }}>
        <SelectField
          label="State"
          none="All"
          words={OUTBOX_STATE_WORDS}
          value={state ?? ''}
          onChange={({ target }) => setAddress(target.value ? { state: target.value } : {}, { flushSync: true })}
        />
      </div>
      <Mails state={state} />
    </Page>
  );
}

function Mails({ state }: { state?: OutboxState }) {
  const query = useInfiniteQuery(mailQuery(state ? { state } : {}));
  if (!query.data) {
    if (query.error) return <ErrorState error={query.error} onRetry={() => void query.refetch()} />;
    return <TableSkeleton rows={8} columns={6} />;
  }
  const mails = query.data.pages.flatMap((page) => page.items);
  if (mails.length === 0)
    return <EmptyState title={state ? 'No mail in this state' : 'No mail yet'}>Every mail that Kerfside writes stands here until long after it is sent.</EmptyState>;
  return (
    <>
      <MailTable mails={mails} />
      <ShowMore query={query} />
    </>
  );
}
