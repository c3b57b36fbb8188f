import { FINAL_DECISION_WORDS, type FinalDecisionKind } from '@kerfside/calc/vocabulary/decisions.js';
import { Button, Flex } from '@radix-ui/themes';
import { type FormEvent, useState } from 'react';
import { Caution } from '@/components/caution';
import { SelectField, TextAreaField, TextField } from '@/components/field';
import { FormProblem } from '@/components/form-problem';
import { fieldMessages } from '@/lib/api/field-messages';
import { useKept } from '@/lib/use-kept';
import { useWriteFinalDecision } from '../api/write-final-decision';
import { mondayOf } from '../planned-week';
import styles from './decisions.module.css';

interface Draft {
  kind: FinalDecisionKind | '';
  reason: string;
  plannedWeek: string;
  patientInformed: '' | 'yes' | 'no';
}

const BLANK: Draft = { kind: '', reason: '', plannedWeek: '', patientInformed: '' };
const HINTS: Record<FinalDecisionKind, string> = {
  'as-agreed': 'Operate as the conference agreed.',
  'with-variation': 'Operate, but in some point otherwise than agreed: say in which, and why.',
  'not-proceeding': 'Do not operate: say why.',
};

interface FinalDecisionFormProps {
  caseId: string;
  isFirst: boolean;
  onDone: () => void;
  onCancel?: () => void;
}

/** What the treating surgeon will do. A reason is asked for wherever it is not what was agreed. */
export function FinalDecisionForm({ caseId, isFirst, onDone, onCancel }: FinalDecisionFormProps) {
  const { value: draft, set, forget } = useKept<Draft>(`final-decision:${caseId}`, BLANK);
  const [isChecked, setChecked] = useState(false);
  const write = useWriteFinalDecision(caseId);
  const needsReason = draft.kind === 'with-variation' || draft.kind === 'not-proceeding';
  const mine = isChecked ? faultsOf(draft, needsReason) : {};
  const fields = { ...fieldMessages(write.error), ...mine };
  const submit = (event: FormEvent) => {
    event.preventDefault();
    setChecked(true);
    if (write.isPending || !draft.kind || Object.keys(faultsOf(draft, needsReason)).length > 0) return;
    const body = {
      kind: draft.kind,
      reason: draft.reason.trim(),
      plannedWeek: draft.kind === 'not-proceeding' ? null : draft.plannedWeek || null,
      patientInformed: draft.patientInformed === '' ? null : draft.patientInformed === 'yes',
    };
    write.mutate(body, {
      onSuccess: () => {
        forget(BLANK);
        onDone();
      },
    });
  };
  return (
    <form onSubmit={submit} noValidate className={styles.finalForm}>
      <fieldset className={styles.kinds} aria-describedby={fields['kind'] ? 'final-kind-error' : undefined}>
        <legend>What will you do?</legend>
        {(Object.keys(FINAL_DECISION_WORDS) as FinalDecisionKind[]).map((kind) => (
          <label key={kind}>
            <input type="radio" name="final-kind" value={kind} checked={draft.kind === kind} onChange={() => set({ ...draft, kind })} />
            <span>
              <strong>{FINAL_DECISION_WORDS[kind]}</strong> <span className="label-text">{HINTS[kind]}</span>
            </span>
          </label>
        ))}
        {fields['kind'] && (
          <p id="final-kind-error" className={styles.error}>
            {fields['kind']}
          </p>
        )}
      </fieldset>
      <TextAreaField
        label="Reason"
        optional={!needsReason}
        required={needsReason}
        error={fields['reason']}
        maxLength={4000}
        value={draft.reason}
        onChange={(event) => set({ ...draft, reason: event.target.value })}
      />
      {draft.kind !== 'not-proceeding' && (
        <TextField
          label="Planned week"
          optional
          hint="As year and week, for example 2026-W51. No exact date."
          type="week"
          pattern="20[0-9]{2}-W[0-5][0-9]"
          error={fields['plannedWeek']}
          value={draft.plannedWeek}
          onChange={(event) => set({ ...draft, plannedWeek: event.target.value.toUpperCase() })}
        />
      )}
      <SelectField
        label="Patient informed of the conference’s advice"
        none="Not known"
        words={{ yes: 'Yes', no: 'No' }}
        value={draft.patientInformed}
        onChange={(event) => set({ ...draft, patientInformed: event.target.value as Draft['patientInformed'] })}
      />
      <Caution>
        The responsibility stays with the treating team. The conference’s decision supports it; the implant maker’s instructions and local policy go first.
      </Caution>
      <FormProblem error={write.error} shown={['kind', 'reason', 'plannedWeek']} />
      {write.error !== null && <p className="label-text">What you wrote is kept here.</p>}
      <Flex gap="3" wrap="wrap">
        <Button type="submit" size="3" loading={write.isPending}>
          {isFirst ? 'Record final decision' : 'Record new version'}
        </Button>
        {onCancel && (
          <Button
            type="button"
            size="3"
            variant="soft"
            color="gray"
            onClick={() => {
              forget(BLANK);
              onCancel();
            }}
          >
            Discard
          </Button>
        )}
      </Flex>
    </form>
  );
}

function faultsOf(draft: Draft, needsReason: boolean): Record<string, string> {
  const faults: Record<string, string> = {};
  if (!draft.kind) faults['kind'] = 'Choose what you will do.';
  if (needsReason && !draft.reason.trim()) faults['reason'] = 'Say why: a variation, or not proceeding, needs its reason.';
  if (draft.plannedWeek && mondayOf(draft.plannedWeek) === null) faults['plannedWeek'] = 'Give year and week, for example 2026-W51.';
  return faults;
}
