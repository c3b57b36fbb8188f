import type { BoneAndPosition } from '@kerfside/calc/vocabulary/case-content.js';
import { DefectFigure } from '../figures/defect-figure';
import type { Binding } from './binding';
import { BoundField } from './bound-field';
import styles from './form.module.css';

export function BoneForm({ of, isHip }: { of: Binding<BoneAndPosition>; isHip: boolean }) {
  return (
    <>
      {isHip && (
        <>
          <h3 className={styles.sub}>Read off the images</h3>
          <div className={styles.row}>
            <BoundField of={of} name="migrationMm" hint="From the superior obturator line." />
            <BoundField of={of} name="direction" />
            <BoundField of={of} name="ischialLysis" />
            <BoundField of={of} name="teardrop" />
            <BoundField of={of} name="kohler" />
            <BoundField of={of} name="superiorRim" />
            <BoundField of={of} name="transverseLine" />
            <BoundField of={of} name="readersClass" label="Your own defect class" none="Not said" />
          </div>
          <BoundField of={of} name="column" rows={1} label="Columns" />
          <DefectFigure bone={of.value} />
          <h3 className={styles.sub}>Position</h3>
          <div className={styles.row}>
            <BoundField of={of} name="inclinationDeg" label="Cup inclination" />
            <BoundField of={of} name="versionDeg" label="Cup version" hint="Retroversion is negative." />
            <BoundField of={of} name="hipCentreHeightMm" hint="Above the line between the teardrops." />
          </div>
        </>
      )}
      <div className={styles.row}>
        <BoundField of={of} name="legLengthMm" hint="Against the other side; shorter is negative." />
      </div>
      <BoundField of={of} name="note" rows={3} />
    </>
  );
}
