import type { Culture, InfectionWorkUp } from '@kerfside/calc/vocabulary/case-content.js';
import { InfectionFigure } from '../figures/infection-figure';
import { bindList, type Binding, newId } from './binding';
import { BoundField } from './bound-field';
import { ListEditor } from './list-editor';
import styles from './form.module.css';

const make = (): Culture => ({ id: newId('culture'), specimen: '', result: '' });

export function InfectionForm({ of }: { of: Binding<InfectionWorkUp> }) {
  return (
    <>
      <div className={styles.row}>
        <BoundField of={of} name="suspicion" none="Not said" />
        <BoundField of={of} name="timing" none="Not said" />
        <BoundField of={of} name="sampling" label="Samples taken" hint="As an interval: ‘2 weeks ago, 3 weeks off antibiotics’." />
      </div>
      <h3 className={styles.sub}>Serum</h3>
      <div className={styles.row}>
        <BoundField of={of} name="crpMgL" hint="mg/L is 10 times mg/dL." />
        <BoundField of={of} name="esrMmH" />
        <BoundField of={of} name="dDimerUgL" />
      </div>
      <h3 className={styles.sub}>Joint fluid</h3>
      <div className={styles.row}>
        <BoundField of={of} name="synovialWbcPerUl" label="Cell count" hint="/µL is 1000 times 10⁹/L." />
        <BoundField of={of} name="pmnPercent" label="Neutrophils (PMN)" />
        <BoundField of={of} name="leukocyteEsterase" />
        <BoundField of={of} name="alphaDefensin" />
        <BoundField of={of} name="synovialCrpMgL" label="Synovial CRP" />
      </div>
      <h3 className={styles.sub}>Cultures</h3>
      <ListEditor of={bindList<InfectionWorkUp, Culture>(of, 'cultures')} noun="culture" make={make} disabled={of.disabled} empty="None listed.">
        {(culture) => (
          <div className={styles.row}>
            <BoundField of={culture} name="specimen" />
            <BoundField of={culture} name="result" hint="Growth, no growth after … days." />
            <BoundField of={culture} name="organism" />
            <BoundField of={culture} name="sensitivities" rows={1} />
          </div>
        )}
      </ListEditor>
      <div className={styles.row}>
        <BoundField of={of} name="sameOrganismCultures" hint="How many grew the same organism." />
        <BoundField of={of} name="singlePositiveCulture" />
      </div>
      <h3 className={styles.sub}>Seen and taken at operation or examination</h3>
      <div className={styles.row}>
        <BoundField of={of} name="sinusTract" />
        <BoundField of={of} name="purulence" />
        <BoundField of={of} name="histologyPositive" />
      </div>
      <BoundField of={of} name="histology" rows={2} />
      <InfectionFigure infection={of.value} />
    </>
  );
}
