import { Button, Flex } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { Confirm } from '@/components/confirm';
import { FormProblem } from '@/components/form-problem';
import { type Round, roundsQuery } from '@/features/ratings/api/get-rounds';
import { formatTime } from '@/lib/dates';
import { useControlRound } from '../api/control-round';
import styles from './run.module.css';

/** The second round: opened, watched and closed by the chair. */
export function RoundControl({ caseId, isRunning }: { caseId: string; isRunning: boolean }) {
  const { data } = useQuery(roundsQuery(caseId));
  const { mutate, mutateAsync, error, isPending } = useControlRound(caseId);
  if (!data) return null;
  const second = data.rounds.find(({ number }) => number === 2);
  return (
    <div className={styles.round}>
      <p role="status" className={styles.count}>
        {second ? secondWords(second) : firstWords(data.rounds.at(-1))}
      </p>
      <FormProblem error={error} />
      <Flex gap="3" wrap="wrap">
        {!second && isRunning && (
          <Button loading={isPending} onClick={() => mutate({ act: 'open', number: 2 })}>
            Open second round
          </Button>
        )}
        {second?.state === 'open' && (
          <Confirm
            title="Close the second round"
            confirmWord="Close round"
            onConfirm={() => mutateAsync({ act: 'close', number: 2 })}
            trigger={<Button variant={second.given < second.eligible ? 'soft' : 'solid'}>Close second round</Button>}
          >
            {second.given < second.eligible ? `${second.eligible - second.given} of ${second.eligible} have not rated yet. ` : 'All have rated. '}
            Nobody can rate after it; a closed round is not opened again.
          </Confirm>
        )}
      </Flex>
    </div>
  );
}

const firstWords = (first: Round | undefined) =>
  first ? `Before the meeting ${first.given} of ${first.eligible} have rated.` : 'No round of rating has been opened.';

function secondWords({ given, eligible, state, closedAt }: Round): string {
  if (state === 'open') return `Second round: ${given} of ${eligible} have rated.`;
  return `Second round closed ${formatTime(closedAt!)}: ${given} of ${eligible} rated.`;
}
