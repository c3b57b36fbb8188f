import type { Patient } from '@kerfside/calc/vocabulary/case-content.js';
import type { Binding } from './binding';
import { BoundField } from './bound-field';
import styles from './form.module.css';

export function PatientForm({ of }: { of: Binding<Patient> }) {
  const age = of.value.ageYears;
  return (
    <>
      <div className={styles.row}>
        <BoundField of={of} name="ageYears" label="Age" hint={typeof age === 'number' && age >= 90 ? 'Kept as 90 and over.' : undefined} />
        <BoundField of={of} name="sex" />
        <BoundField of={of} name="bmiBand" label="BMI, kg/m²" />
        <BoundField of={of} name="asa" />
      </div>
      <BoundField of={of} name="comorbidities" />
      <BoundField of={of} name="comorbidityNote" rows={2} hint="Also the other ones that matter for this operation." />
      <div className={styles.row}>
        <BoundField of={of} name="metalAllergy" hint="Or none, or not tested." />
        <BoundField of={of} name="cementAllergy" hint="Or none, or not tested." />
        <BoundField of={of} name="antibioticAllergy" hint="Which, and what happened." />
      </div>
      <div className={styles.row}>
        <BoundField of={of} name="anticoagulation" />
        <BoundField of={of} name="anticoagulationNote" />
      </div>
      <BoundField of={of} name="function" hint="Walking, aids, what the patient wants to get back to." />
    </>
  );
}
