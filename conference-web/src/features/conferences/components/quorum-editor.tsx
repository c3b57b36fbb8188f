import type { QuorumRule } from '@kerfside/calc/vocabulary/conference.js';
import { DISCIPLINE_WORDS, DISCIPLINES, type Discipline } from '@kerfside/calc/vocabulary/people.js';
import { Button } from '@radix-ui/themes';
import { CheckField, SelectField, TextField } from '@/components/field';
import styles from './conferences.module.css';

interface QuorumEditorProps {
  rule: QuorumRule;
  errors: Record<string, string>;
  onChange: (rule: QuorumRule) => void;
}

/** How many, and of which disciplines, must be present for a decision; without them it is advice. */
export function QuorumEditor({ rule, errors, onChange }: QuorumEditorProps) {
  const change = (index: number, changes: Partial<QuorumRule['disciplines'][number]>) =>
    onChange({ ...rule, disciplines: rule.disciplines.map((row, at) => (at === index ? { ...row, ...changes } : row)) });
  const remove = (index: number) => onChange({ ...rule, disciplines: rule.disciplines.filter((_, at) => at !== index) });
  const free = DISCIPLINES.find((name) => name !== 'administration' && !rule.disciplines.some(({ discipline }) => discipline === name));
  return (
    <fieldset className={styles.group}>
      <legend>Quorum</legend>
      <div className={styles.single}>
        <TextField
          label="Members present who may rate, at least"
          type="number"
          min={1}
          max={100}
          required
          error={errors['quorumRule.raters']}
          value={rule.raters}
          onChange={({ target }) => onChange({ ...rule, raters: target.valueAsNumber || 0 })}
        />
      </div>
      {rule.disciplines.map((row, index) => (
        <div key={row.discipline} className={styles['rule-row']}>
          <SelectField
            label="Discipline"
            words={DISCIPLINE_WORDS}
            value={row.discipline}
            onChange={({ target }) => change(index, { discipline: target.value as Discipline })}
          />
          <TextField
            label="At least"
            type="number"
            min={1}
            max={20}
            required
            error={errors[`quorumRule.disciplines[${index}].atLeast`]}
            value={row.atLeast}
            onChange={({ target }) => change(index, { atLeast: target.valueAsNumber || 0 })}
          />
          <CheckField
            label="Infected cases only"
            checked={row.infectionOnly ?? false}
            onChange={({ target }) => change(index, { infectionOnly: target.checked || undefined })}
          />
          <Button type="button" variant="soft" color="gray" size="2" aria-label={`Remove ${DISCIPLINE_WORDS[row.discipline]}`} onClick={() => remove(index)}>
            Remove
          </Button>
        </div>
      ))}
      {free && (
        <Button type="button" variant="soft" mb="3" onClick={() => onChange({ ...rule, disciplines: [...rule.disciplines, { discipline: free, atLeast: 1 }] })}>
          Add a discipline
        </Button>
      )}
    </fieldset>
  );
}
