import { type ComponentProps, type ReactNode, useId } from 'react';
import styles from './field.module.css';

export interface FieldControlProps {
  id: string;
  'aria-describedby'?: string;
  'aria-invalid'?: true;
  required?: boolean;
}

interface FieldProps {
  label: ReactNode;
  hint?: ReactNode;
  error?: string;
  required?: boolean;
  /** Says '(optional)' beside the label. */
  optional?: boolean;
  children: (control: FieldControlProps) => ReactNode;
}

/** A label, its control, its hint and its error, tied together for screen readers. */
export function Field({ label, hint, error, required, optional, children }: FieldProps) {
  const id = useId();
  const describedBy = [hint ? `${id}-hint` : '', error ? `${id}-error` : ''].filter(Boolean).join(' ');
  return (
    <div className={styles.field}>
      <label className={styles.label} htmlFor={id}>
        {label}
        {optional && <span className={styles.optional}> (optional)</span>}
      </label>
      {hint && (
        <span id={`${id}-hint`} className={styles.hint}>
          {hint}
        </span>
      )}
      {children({ id, 'aria-describedby': describedBy || undefined, 'aria-invalid': error ? true : undefined, required })}
      {error && (
        <span id={`${id}-error`} className={styles.error}>
          {error}
        </span>
      )}
    </div>
  );
}

type FieldOf<T extends 'input' | 'textarea' | 'select'> = Omit<FieldProps, 'children'> & Omit<ComponentProps<T>, 'id' | 'required'>;

/** One line of text, a number or a date. */
export function TextField({ label, hint, error, required, optional, ...input }: FieldOf<'input'>) {
  return (
    <Field {...{ label, hint, error, required, optional }}>{(control) => <input className={styles.input} {...input} {...control} />}</Field>
  );
}

export function TextAreaField({ label, hint, error, required, optional, ...input }: FieldOf<'textarea'>) {
  return (
    <Field {...{ label, hint, error, required, optional }}>{(control) => <textarea className={styles.input} {...input} {...control} />}</Field>
  );
}

interface SelectFieldProps extends FieldOf<'select'> {
  /** Names with the words shown for them, as the shared vocabulary has them. */
  words: Record<string, string>;
  /** The words for 'nothing chosen'; without them something must be. */
  none?: string;
}

/** A choice of a few, by the browser's own control: it works on every phone and with every reader. */
export function SelectField({ label, hint, error, required, optional, words, none, ...select }: SelectFieldProps) {
  return (
    <Field {...{ label, hint, error, required, optional }}>
      {(control) => (
        <select className={styles.input} {...select} {...control}>
          {none !== undefined && <option value="">{none}</option>}
          {Object.entries(words).map(([value, word]) => (
            <option key={value} value={value}>
              {word}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}

export function CheckField({ label, ...input }: { label: ReactNode } & Omit<ComponentProps<'input'>, 'type'>) {
  return (
    <label className={styles.check}>
      <input type="checkbox" {...input} />
      <span>{label}</span>
    </label>
  );
}
