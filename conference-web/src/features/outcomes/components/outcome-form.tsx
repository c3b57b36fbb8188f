import { DEFECT_CLASS } from '@kerfside/calc/vocabulary/case-content.js';
import { BLOOD_LOSS_BANDS, COMPLICATIONS } from '@kerfside/calc/vocabulary/outcomes.js';
import { Button, Flex } from '@radix-ui/themes';
import { type FormEvent, useState } from 'react';
import { CheckField, SelectField, TextAreaField, TextField } from '@/components/field';
import { FormProblem } from '@/components/form-problem';
import { RimClock } from '@/components/rim-clock/rim-clock';
import { Section } from '@/components/section';
import { fieldMessages } from '@/lib/api/field-messages';
import type { Schemas } from '@/lib/api/types';
import { useKept } from '@/lib/use-kept';
import type { Outcome } from '../api/list-outcomes';
import { useWriteOutcome } from '../api/write-outcome';
import { type Complication, draftOf, faultsOf, type OutcomeDraft, toBody, toggleComplication } from '../outcome-draft';
import { OutcomeSteps } from './outcome-steps';
import styles from './outcomes.module.css';

interface OutcomeFormProps {
  found: Schemas['CaseDto'];
  /** What is reported already: then this is an amendment. */
  newest: Outcome | undefined;
  onDone: () => void;
  onCancel?: () => void;
}

type Setter = (changes: Partial<OutcomeDraft>) => void;
interface PartProps {
  draft: OutcomeDraft;
  set: Setter;
  fields: Record<string, string>;
}

/** What was found and done. Kept in the browser until it is sent; nothing but an amendment's reason is required. */
export function OutcomeForm({ found, newest, onDone, onCancel }: OutcomeFormProps) {
  const { value: draft, wasKept, set: keep, forget } = useKept(`outcome:${found.id}`, draftOf(newest));
  const [isChecked, setChecked] = useState(false);
  const write = useWriteOutcome(found.id);
  const steps = found.content.plan.steps ?? [];
  const set: Setter = (changes) => keep({ ...draft, ...changes });
  const faults = faultsOf(draft, newest !== undefined);
  const fields = { ...fieldMessages(write.error), ...(isChecked ? faults : {}) };
  const submit = (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    setChecked(true);
    if (write.isPending) return;
    const [first] = Object.keys(faults);
    if (first) return (event.currentTarget.elements.namedItem(first) as HTMLElement | null)?.focus();
    write.mutate(toBody(draft, steps.map(({ id }) => id)), {
      onSuccess: () => {
        forget(draft);
        onDone();
      },
    });
  };
  return (
    <form onSubmit={submit} noValidate className={styles.form}>
      {wasKept && <p className="label-text">Kept from before: not sent yet.</p>}
      <Section title="Steps, planned and done">
        <OutcomeSteps steps={steps} value={draft.steps} onChange={(next) => set({ steps: next })} />
        <TextAreaField label="Kit that was missing" optional maxLength={2000} value={draft.missingKit} onChange={(event) => set({ missingKit: event.target.value })} />
      </Section>
      <Operation {...{ draft, set, fields }} />
      <Findings {...{ draft, set, fields, found }} />
      <Section title="Afterwards">
        <TextAreaField label="Cultures taken, and their results" optional maxLength={2000} value={draft.cultures} onChange={(event) => set({ cultures: event.target.value })} />
        <TextAreaField
          label="Lesson for the next one"
          optional
          hint="What you would plan otherwise. Members of the conference read it."
          maxLength={4000}
          value={draft.lesson}
          onChange={(event) => set({ lesson: event.target.value })}
        />
        {newest && (
          <TextAreaField
            name="amendmentReason"
            label="Why the report is amended"
            required
            error={fields['amendmentReason']}
            maxLength={2000}
            value={draft.amendmentReason}
            onChange={(event) => set({ amendmentReason: event.target.value })}
          />
        )}
      </Section>
      <FormProblem error={write.error} shown={['minutes', 'removedShellMm', 'implantedShellMm', 'amendmentReason']} />
      {write.error !== null && <p className="label-text">What you wrote is kept here.</p>}
      <Flex gap="3" wrap="wrap">
        <Button type="submit" size="3" loading={write.isPending}>
          {newest ? 'Amend outcome' : 'Report outcome'}
        </Button>
        {onCancel && (
          <Button type="button" size="3" variant="soft" color="gray" onClick={() => (forget(draftOf(newest)), onCancel())}>
            Discard
          </Button>
        )}
      </Flex>
    </form>
  );
}

function Operation({ draft, set, fields }: PartProps) {
  return (
    <Section title="Operation">
      <div className={styles.grid}>
        <TextField
          name="minutes"
          label="Duration, min"
          optional
          inputMode="numeric"
          error={fields['minutes']}
          value={draft.minutes}
          onChange={(event) => set({ minutes: event.target.value })}
        />
        <SelectField label="Blood loss" none="Not known" words={BLOOD_LOSS_BANDS} value={draft.bloodLoss} onChange={(event) => set({ bloodLoss: event.target.value })} />
      </div>
      <fieldset className={styles.complications}>
        <legend>Complications</legend>
        {Object.entries(COMPLICATIONS).map(([name, word]) => (
          <CheckField
            key={name}
            label={word}
            checked={draft.complications.includes(name as Complication)}
            onChange={() => set({ complications: toggleComplication(draft.complications, name as Complication) })}
          />
        ))}
      </fieldset>
    </Section>
  );
}

function Findings({ draft, set, fields, found }: PartProps & { found: Schemas['CaseDto'] }) {
  const { heading, plan, implants } = found.content;
  const number = (name: 'removedShellMm' | 'implantedShellMm', label: string) => (
    <TextField
      name={name}
      label={label}
      optional
      inputMode="decimal"
      error={fields[name]}
      value={draft[name]}
      onChange={(event) => set({ [name]: event.target.value })}
    />
  );
  return (
    <Section title="Bone and implants">
      <div className={styles.grid}>
        <SelectField
          label="Defect class found"
          none="Not known"
          words={DEFECT_CLASS}
          value={draft.defectFound}
          onChange={(event) => set({ defectFound: event.target.value })}
        />
        {number('removedShellMm', 'Shell taken out, outer diameter, mm')}
        {number('implantedShellMm', 'Shell put in, outer diameter, mm')}
      </div>
      {heading.joint !== 'knee' && (
        <>
          <h3 className={styles.sub}>Where bone was lost at the rim</h3>
          <RimClock
            side={heading.side ?? null}
            sectors={plan.rim ?? []}
            screws={implants.parts?.find(({ part }) => part === 'shell')?.screws ?? []}
            lost={draft.boneLostHours}
            onLostChange={(boneLostHours) => set({ boneLostHours })}
          />
        </>
      )}
    </Section>
  );
}
