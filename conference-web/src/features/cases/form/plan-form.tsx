import { TRADE_ORDER } from '@kerfside/calc/cases/readiness-plan.js';
import type { Side } from '@kerfside/calc/vocabulary/case.js';
import { type ImplantPart, type KitItem, type PlanStep, type RemovalPlan, STEP_KIND } from '@kerfside/calc/vocabulary/case-content.js';
import { CheckField, SelectField } from '@/components/field';
import { Caution } from '@/components/caution';
import { RimClock } from '@/components/rim-clock/rim-clock';
import { BoneVolumeFigure } from '../figures/bone-volume-figure';
import { bindList, type Binding, type BoundList, newId } from './binding';
import { BoundField } from './bound-field';
import { ListEditor } from './list-editor';
import styles from './form.module.css';

interface PlanFormProps {
  of: Binding<RemovalPlan>;
  side: Side | null;
  isHip: boolean;
  parts: ImplantPart[];
}

export function PlanForm({ of, side, isHip, parts }: PlanFormProps) {
  const steps = bindList<RemovalPlan, PlanStep>(of, 'steps');
  const shell = parts.find(({ part }) => part === 'shell');
  return (
    <>
      <Caution />
      <h3 className={styles.sub}>Steps, in their order</h3>
      <ListEditor of={steps} noun="step" make={() => nextStep(steps.items)} ordered disabled={of.disabled} empty="No step yet. The usual order is exposure, liner, screws, interface, extraction, bone inventory, reconstruction.">
        {(step) => <StepForm of={step} />}
      </ListEditor>
      {isHip && (
        <>
          <h3 className={styles.sub}>Rim clock</h3>
          <div className={styles.place} data-place="plan.rim">
            <RimClock
              side={side}
              sectors={of.value.rim ?? []}
              screws={shell?.screws ?? []}
              onChange={of.disabled ? undefined : (rim) => of.update((plan) => ({ ...plan, rim }))}
            />
          </div>
        </>
      )}
      <h3 className={styles.sub}>Kit</h3>
      <ListEditor of={bindList<RemovalPlan, KitItem>(of, 'kit')} noun="kit item" make={() => ({ id: newId('kit'), item: '' })} disabled={of.disabled} empty="Nothing listed yet.">
        {(item) => <KitForm of={item} steps={steps} />}
      </ListEditor>
      <BoundField of={of} name="reconstruction" rows={3} hint="What goes in afterwards, and what if more bone is lost than expected." />
      <div className={styles.row}>
        {isHip && <BoundField of={of} name="expectedNextShellMm" hint="Outer diameter." />}
      </div>
      {isHip && <BoneVolumeFigure shell={shell} nextShellMm={of.value.expectedNextShellMm} />}
      <BoundField of={of} name="expectedBoneLoss" rows={2} hint="Where, and how much you can afford to lose." />
    </>
  );
}

/** A new step is of the kind that usually comes next. */
function nextStep(steps: PlanStep[]): PlanStep {
  const kind = TRADE_ORDER.find((name) => !steps.some((step) => step.kind === name)) ?? 'other';
  return { id: newId('step'), kind, method: '' };
}

const StepForm = ({ of }: { of: Binding<PlanStep> }) => (
  <>
    <div className={styles.row}>
      <BoundField of={of} name="kind" none="" />
      <BoundField of={of} name="who" />
    </div>
    <BoundField of={of} name="method" rows={2} />
    <BoundField of={of} name="tool" />
    <BoundField of={of} name="fallback" rows={2} hint="What you do where it fails." />
    <BoundField of={of} name="hazard" rows={1} />
  </>
);

function KitForm({ of, steps }: { of: Binding<KitItem>; steps: BoundList<RemovalPlan, PlanStep> }) {
  const words = Object.fromEntries(steps.items.map((step, index) => [step.id, `${index + 1}. ${STEP_KIND[step.kind]}`]));
  const { stepId, confirmed } = of.value;
  return (
    <>
      <div className={styles.row}>
        <BoundField of={of} name="item" />
        <BoundField of={of} name="size" />
        <SelectField
          label="For step"
          words={words}
          none="No single step"
          disabled={of.disabled}
          // a step that was removed may still be named
          value={stepId && stepId in words ? stepId : ''}
          onChange={(event) => of.update((item) => ({ ...item, stepId: event.target.value || null }))}
        />
        <BoundField of={of} name="source" none="Not said" />
      </div>
      <CheckField
        label="Confirmed that it will be there"
        checked={confirmed ?? false}
        disabled={of.disabled}
        onChange={(event) => of.update((item) => ({ ...item, confirmed: event.target.checked }))}
      />
    </>
  );
}
