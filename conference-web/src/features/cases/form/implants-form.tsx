import type { CaseContent, ImplantPart, Screw } from '@kerfside/calc/vocabulary/case-content.js';
import { bindList, type Binding, newId } from './binding';
import { BoundField } from './bound-field';
import { ListEditor } from './list-editor';
import { hasScrews, partFields } from './part-fields';
import styles from './form.module.css';

type Implants = CaseContent['implants'];

export function ImplantsForm({ of }: { of: Binding<Implants> }) {
  const parts = bindList<Implants, ImplantPart>(of, 'parts');
  // the next part that is not there yet, in the order they are met
  const make = (): ImplantPart => ({
    id: newId('part'),
    part: (['shell', 'liner', 'head', 'stem'] as const).find((kind) => !parts.items.some(({ part }) => part === kind)) ?? 'other',
  });
  return (
    <ListEditor of={parts} noun="part" make={make} disabled={of.disabled} empty="No part yet. List all that is in place, also what you know little of.">
      {(part) => <PartForm of={part} />}
    </ListEditor>
  );
}

function PartForm({ of }: { of: Binding<ImplantPart> }) {
  return (
    <>
      <div className={styles.row}>
        <BoundField of={of} name="part" none="" />
        <BoundField of={of} name="fixation" none="Not said" />
        <BoundField of={of} name="maker" hint="Or unknown." />
        <BoundField of={of} name="model" hint="Or unknown." />
        <BoundField of={of} name="certainty" none="Not said" />
        <BoundField of={of} name="knownFrom" none="Not said" />
        {partFields(of.value).map((name) => (
          <BoundField key={name} of={of} name={name} />
        ))}
      </div>
      {hasScrews(of.value) && (
        <>
          <p className={styles.sub}>Screws seen</p>
          <ListEditor of={bindList<ImplantPart, Screw>(of, 'screws')} noun="screw" make={() => ({ id: newId('screw') })} disabled={of.disabled} empty="None listed.">
            {(screw) => <ScrewForm of={screw} />}
          </ListEditor>
        </>
      )}
      <BoundField of={of} name="note" rows={2} hint={of.value.part === 'shell' ? 'Where the diameter can not be found out, write here that it is unknown.' : undefined} />
    </>
  );
}

const ScrewForm = ({ of }: { of: Binding<Screw> }) => (
  <div className={styles.row}>
    <BoundField of={of} name="hour" label="Hour on the rim clock" />
    {!of.value.hour && <BoundField of={of} name="quadrant" />}
    <BoundField of={of} name="lengthMm" />
    <BoundField of={of} name="headDrive" />
    <BoundField of={of} name="tipInsidePelvis" />
  </div>
);
