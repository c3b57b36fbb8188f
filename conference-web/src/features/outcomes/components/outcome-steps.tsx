import { STEP_KIND } from '@kerfside/calc/vocabulary/case-content.js';
import { SelectField, TextField } from '@/components/field';
import type { Schemas } from '@/lib/api/types';
import type { OutcomeDraft, StepDraft } from '../outcome-draft';
import styles from './outcomes.module.css';

interface OutcomeStepsProps {
  steps: NonNullable<Schemas['RemovalPlanDto']['steps']>;
  value: OutcomeDraft['steps'];
  onChange: (steps: OutcomeDraft['steps']) => void;
}

/** For each planned step: was it done as planned, and if not, how. */
export function OutcomeSteps({ steps, value, onChange }: OutcomeStepsProps) {
  if (steps.length === 0) return <p className="label-text">The plan had no steps.</p>;
  const of = (id: string): StepDraft => value[id] ?? { done: '', method: '' };
  return (
    <ol className={styles.steps}>
      {steps.map(({ id, kind, method, tool }, index) => {
        const { done } = of(id);
        const set = (changes: Partial<StepDraft>) => onChange({ ...value, [id]: { ...of(id), ...changes } });
        return (
          <li key={id}>
            <div className={styles.planned}>
              <strong>
                {index + 1}. {STEP_KIND[kind]}
              </strong>
              <p>{[method, tool].filter(Boolean).join('; ') || 'No method planned'}</p>
            </div>
            <div>
              <SelectField
                label={
                  <>
                    Done<span className="visually-hidden"> at step {index + 1}</span>
                  </>
                }
                none="Not known"
                words={{ 'as-planned': 'As planned', otherwise: 'Otherwise' }}
                value={done}
                onChange={(event) => set({ done: event.target.value as StepDraft['done'] })}
              />
              {done === 'otherwise' && (
                <TextField
                  label={`What was done at step ${index + 1}`}
                  maxLength={1000}
                  value={of(id).method}
                  onChange={(event) => set({ method: event.target.value })}
                />
              )}
            </div>
          </li>
        );
      })}
    </ol>
  );
}
