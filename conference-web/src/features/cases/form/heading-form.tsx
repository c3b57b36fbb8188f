import type { Heading } from '@kerfside/calc/vocabulary/case-content.js';
import type { Binding } from './binding';
import { BoundField } from './bound-field';
import styles from './form.module.css';

export function HeadingForm({ of }: { of: Binding<Heading> }) {
  const needsReason = of.value.urgency === 'urgent' || of.value.urgency === 'soon';
  return (
    <>
      <BoundField of={of} name="title" hint="What it is about, in a few words. No initials, no dates." />
      <div className={styles.row}>
        <BoundField of={of} name="side" none="Choose" />
        <BoundField of={of} name="joint" none="" />
        <BoundField of={of} name="urgency" none="Choose" />
      </div>
      {(needsReason || of.value.urgencyReason) && (
        <BoundField
          of={of}
          name="urgencyReason"
          rows={2}
          hint="For example sepsis, a fracture round the implant, or a dislocation that can not be reduced."
        />
      )}
      <BoundField of={of} name="question" rows={4} hint="What you want the panel to answer." />
    </>
  );
}
