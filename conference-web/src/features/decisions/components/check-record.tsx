import { Button } from '@radix-ui/themes';
import { FormProblem } from '@/components/form-problem';
import { formatDateTime } from '@/lib/dates';
import { counted } from '@/lib/units';
import { useCheckDecision } from '../api/check-decision';
import styles from './decisions.module.css';

/** Has the record and the chain that it stands in checked, and says what was found. */
export function CheckRecord({ id }: { id: string }) {
  const check = useCheckDecision(id);
  return (
    <div className={styles.check}>
      <Button variant="soft" loading={check.isPending} onClick={() => check.mutate()}>
        Check this record
      </Button>
      <FormProblem error={check.error} />
      <div role="status">
        {check.data &&
          (check.data.intact ? (
            <p>
              <strong>Intact.</strong> The fingerprints of {counted(check.data.checked, 'decision')} of this conference were computed again at{' '}
              {formatDateTime(new Date(check.submittedAt))}: each fits its content and the one before it.
            </p>
          ) : (
            <div className={styles.faults}>
              <p>
                <strong>Not intact.</strong> Do not rely on this record. Tell the chair and the administrator:
              </p>
              <ul>
                {check.data.faults.map((fault) => (
                  <li key={fault}>{fault}</li>
                ))}
              </ul>
            </div>
          ))}
      </div>
    </div>
  );
}
