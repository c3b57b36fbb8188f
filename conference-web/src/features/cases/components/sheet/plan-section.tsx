import { saysNothing } from '@kerfside/calc/cases/field-words.js';
import type { Side } from '@kerfside/calc/vocabulary/case.js';
import { type CaseContent, KIT_SOURCE, type KitItem, type PlanStep, STEP_KIND } from '@kerfside/calc/vocabulary/case-content.js';
import { Caution } from '@/components/caution';
import { RimClock } from '@/components/rim-clock/rim-clock';
import { BoneVolumeFigure } from '../../figures/bone-volume-figure';
import { Line, NotKnown, Paragraphs } from './known';
import { SheetRow, SheetSection } from './sheet-row';
import styles from './sheet.module.css';

interface PlanSectionProps extends Pick<CaseContent, 'plan' | 'implants'> {
  side: Side | null;
  isHip: boolean;
}

export function PlanSection({ plan, implants, side, isHip }: PlanSectionProps) {
  const steps = plan.steps ?? [];
  return (
    <SheetSection
      section="plan"
      rows={
        <>
          {steps.map((step, index) => (
            <SheetRow key={step.id} anchorKind="step" anchorRef={step.id} about={`step ${index + 1}, ${STEP_KIND[step.kind].toLowerCase()}`}>
              <Step step={step} place={index + 1} />
            </SheetRow>
          ))}
          <div className={styles.row}>
            <div className={styles.sheet}>
              <AfterSteps {...{ plan, implants, side, isHip, steps }} />
            </div>
          </div>
        </>
      }
    >
      <Caution>Decision support. Not a substitute for the treating team’s judgement, the implant maker’s instructions and local policy.</Caution>
      {steps.length === 0 && (
        <p>
          <NotKnown>No step has been planned yet.</NotKnown>
        </p>
      )}
    </SheetSection>
  );
}

function Step({ step, place }: { step: PlanStep; place: number }) {
  const { kind, method, tool, fallback, hazard, who } = step;
  return (
    <div className={styles.step} id={`step-${step.id}`}>
      <h3>
        <span className={styles.number}>8.{place}</span> {STEP_KIND[kind]}
        {who && <span className="label-text"> {who}</span>}
      </h3>
      {saysNothing(method) ? (
        <p>
          <NotKnown>method not said</NotKnown>
        </p>
      ) : (
        <Paragraphs text={method} />
      )}
      <dl className={styles.asides}>
        <dt>Tool</dt>
        <dd>{tool || <NotKnown>not said</NotKnown>}</dd>
        <dt>Fallback</dt>
        <dd>{fallback || <NotKnown>not said</NotKnown>}</dd>
        {!saysNothing(hazard) && (
          <>
            <dt className={styles.hazard}>Hazard</dt>
            <dd>{hazard}</dd>
          </>
        )}
      </dl>
    </div>
  );
}

function AfterSteps({ plan, implants, side, isHip, steps }: PlanSectionProps & { steps: PlanStep[] }) {
  const shell = implants.parts?.find(({ part }) => part === 'shell');
  return (
    <>
      {isHip && (
        <>
          <h3>Rim clock</h3>
          <RimClock side={side} sectors={plan.rim ?? []} screws={shell?.screws ?? []} />
        </>
      )}
      <h3>Kit</h3>
      <Kit kit={plan.kit ?? []} steps={steps} />
      <h3>Afterwards</h3>
      <Line name="Reconstruction intended">{plan.reconstruction?.trim() || <NotKnown>not said</NotKnown>}</Line>
      <Line name="Expected bone loss">{plan.expectedBoneLoss?.trim() || <NotKnown>not said</NotKnown>}</Line>
      {isHip && <BoneVolumeFigure shell={shell} nextShellMm={plan.expectedNextShellMm} />}
    </>
  );
}

function Kit({ kit, steps }: { kit: KitItem[]; steps: PlanStep[] }) {
  if (kit.length === 0)
    return (
      <p>
        <NotKnown>No kit listed.</NotKnown>
      </p>
    );
  const stepNumber = (stepId: string | null | undefined) => {
    const index = steps.findIndex(({ id }) => id === stepId);
    return index < 0 ? '' : `8.${index + 1}`;
  };
  return (
    <table className={styles.table}>
      <caption className="visually-hidden">Kit</caption>
      <thead>
        <tr>
          <th scope="col">Item</th>
          <th scope="col">Size</th>
          <th scope="col">Step</th>
          <th scope="col">From</th>
          <th scope="col">Confirmed</th>
        </tr>
      </thead>
      <tbody>
        {kit.map((item) => (
          <tr key={item.id}>
            <th scope="row">{item.item || <NotKnown>no name</NotKnown>}</th>
            <td>{item.size}</td>
            <td>{stepNumber(item.stepId)}</td>
            <td>{item.source && item.source !== 'unknown' ? KIT_SOURCE[item.source] : <NotKnown>not settled</NotKnown>}</td>
            <td>{item.confirmed ? 'yes' : 'not yet'}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
