import type { FieldWords } from '@kerfside/calc/cases/field-words.js';
import type { Words } from '@kerfside/calc/vocabulary/case-content.js';
import { type ReactNode, useId, useState } from 'react';
import { Field, SelectField, TextAreaField, TextField } from '@/components/field';
import type { Schemas } from '@/lib/api/types';
import { identifierRemedy, identifierWords, strengthWords } from '../identifier-words';
import { type Binding, fieldPlace } from './binding';
import { useFindingsAt } from './findings-context';
import { NUMBER_LIMITS, TEXT_LIMITS } from './field-limits';
import { NumberInput } from './number-input';
import styles from './form.module.css';

interface BoundFieldProps<T extends object> {
  of: Binding<T>;
  name: keyof T & string;
  label?: string;
  hint?: ReactNode;
  /** The words for 'nothing chosen'. */
  none?: string;
  /** Lines of text; without it, one line for short texts. */
  rows?: number;
}

const LONG_TEXT = 1000;
const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

/** One field of the case by its name; the shared vocabulary says what kind it is and what it is called. */
export function BoundField<T extends object>({ of, name, label, hint, none = 'Not known', rows }: BoundFieldProps<T>) {
  const words = of.fields[name];
  const [problem, setProblem] = useState<string>();
  if (!words) throw new Error(`${of.kind} has no field ${name}`);
  const value = (of.value as Record<string, unknown>)[name];
  const set = (next: unknown) => of.update((old) => ({ ...old, [name]: next }));
  const error = problem ?? of.refusals.find(({ field }) => field === name)?.message;
  const place = fieldPlace(of.section, of.path ? `${of.path}.${name}` : name);
  const findings = useFindingsAt(place);
  const shared = { label: label ?? capital(words.label), hint, error };
  return (
    <div className={styles.place} data-place={place}>
      {control(words)}
      {findings.length > 0 && typeof value === 'string' && (
        <FieldFindings findings={findings.filter(({ text }) => value.includes(text))} />
      )}
    </div>
  );

  function control(field: FieldWords): ReactNode {
    switch (field.kind) {
      case 'number':
        return (
          <Field {...shared}>
            {(props) => (
              <NumberInput
                control={props}
                value={value as number | null}
                onChange={set}
                limit={NUMBER_LIMITS[of.kind]?.[name]}
                unit={field.unit}
                onProblem={setProblem}
                disabled={of.disabled}
              />
            )}
          </Field>
        );
      case 'one':
        return (
          <SelectField
            {...shared}
            words={field.words}
            none={none || undefined}
            disabled={of.disabled}
            value={(value as string | null) ?? ''}
            onChange={(event) => set(event.target.value || null)}
          />
        );
      case 'many':
        return <ManyField {...shared} words={field.words} value={(value as string[] | undefined) ?? []} onChange={set} disabled={of.disabled} />;
      case 'flag':
        return <FlagField {...shared} value={value as boolean | null | undefined} onChange={set} disabled={of.disabled} />;
      default:
        return <BoundText {...shared} length={TEXT_LIMITS[of.kind]?.[name]} rows={rows} value={(value as string) ?? ''} onChange={set} disabled={of.disabled} />;
    }
  }
}

/** Stands at the field for as long as the text found is still in it. */
const FieldFindings = ({ findings }: { findings: Schemas['IdentifierFindingDto'][] }) =>
  findings.map(({ kind, text, start, strength }) => (
    <p key={`${start} ${kind}`} className={styles.finding}>
      ‘{text}’ {strengthWords[strength]} a {identifierWords(kind)}. {identifierRemedy(kind)}
    </p>
  ));

interface ControlProps<V> {
  label: ReactNode;
  hint?: ReactNode;
  error?: string;
  value: V;
  onChange: (value: V) => void;
  disabled?: boolean;
}

function BoundText({ length = 0, rows, onChange, ...props }: ControlProps<string> & { length?: number; rows?: number }) {
  const text = { ...props, maxLength: length || undefined, onChange: (event: { target: { value: string } }) => onChange(event.target.value) };
  return length >= LONG_TEXT || rows ? <TextAreaField {...text} rows={rows ?? 3} className={styles.textarea} /> : <TextField {...text} />;
}

/** Yes, no, or not known: never a box that means both 'no' and 'nobody looked'. */
function FlagField({ label, hint, error, value, onChange, disabled }: ControlProps<boolean | null | undefined>) {
  const name = useId();
  const choices: [string, boolean | null][] = [
    ['Yes', true],
    ['No', false],
    ['Not known', null],
  ];
  return (
    <fieldset className={styles.choice} disabled={disabled}>
      <legend>{label}</legend>
      {hint && <span className={styles.hint}>{hint}</span>}
      <div className={styles.radios}>
        {choices.map(([word, state]) => (
          <label key={word}>
            <input type="radio" name={name} checked={(value ?? null) === state} onChange={() => onChange(state)} />
            {word}
          </label>
        ))}
      </div>
      {error && <span className={styles.error}>{error}</span>}
    </fieldset>
  );
}

function ManyField({ label, hint, error, words, value, onChange, disabled }: ControlProps<string[]> & { words: Words }) {
  return (
    <fieldset className={styles.choice} disabled={disabled}>
      <legend>{label}</legend>
      {hint && <span className={styles.hint}>{hint}</span>}
      <div className={styles.checks}>
        {Object.entries(words).map(([name, word]) => (
          <label key={name}>
            <input
              type="checkbox"
              checked={value.includes(name)}
              onChange={(event) => onChange(event.target.checked ? [...value, name] : value.filter((other) => other !== name))}
            />
            {word}
          </label>
        ))}
      </div>
      {error && <span className={styles.error}>{error}</span>}
    </fieldset>
  );
}
