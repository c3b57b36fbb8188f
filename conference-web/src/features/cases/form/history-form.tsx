import type { EarlierOperation, History } from '@kerfside/calc/vocabulary/case-content.js';
import { bindList, type Binding, newId } from './binding';
import { BoundField } from './bound-field';
import { ListEditor } from './list-editor';
import styles from './form.module.css';

const make = (): EarlierOperation => ({ id: newId('op'), interval: '', procedure: '' });

export function HistoryForm({ of }: { of: Binding<History> }) {
  return (
    <>
      <BoundField of={of} name="indexDiagnosis" rows={1} />
      <BoundField of={of} name="indexInterval" hint="As an interval, never a date: ‘9 years’." />
      <h3 className={styles.sub}>Earlier operations</h3>
      <ListEditor of={bindList<History, EarlierOperation>(of, 'operations')} noun="operation" make={make} ordered disabled={of.disabled} empty="None listed yet.">
        {(operation) => (
          <>
            <BoundField of={operation} name="interval" hint="‘4 years ago’, never a date." />
            <BoundField of={operation} name="procedure" rows={2} />
          </>
        )}
      </ListEditor>
      <BoundField of={of} name="reasons" />
      <BoundField of={of} name="course" rows={4} hint="How it came to this. Intervals, not dates." />
    </>
  );
}
