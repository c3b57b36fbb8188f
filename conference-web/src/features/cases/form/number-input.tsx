import { type ComponentProps, useState } from 'react';
import type { FieldControlProps } from '@/components/field';
import type { NumberLimit } from './field-limits';
import styles from './form.module.css';

/** A number as people write it: a comma is a decimal point, spaces and apostrophes part thousands. */
export function parseNumber(text: string): number | null {
  const plain = text.trim().replace(/[\s'’\u00a0\u202f]/g, '').replace(',', '.').replace('−', '-');
  return /^-?\d+(\.\d+)?$/.test(plain) ? Number(plain) : null;
}

/** Why a text is no number that can be kept here; undefined where it is one, or nothing at all. */
export function numberProblem(text: string, limit: NumberLimit | undefined): string | undefined {
  if (text.trim() === '') return undefined;
  const value = parseNumber(text);
  if (value === null) return 'Not saved: this is not a number.';
  if (limit?.whole && !Number.isInteger(value)) return 'Not saved: give a whole number.';
  if (limit && (value < limit.min || value > limit.max)) return `Not saved: give a number from ${limit.min} to ${limit.max}.`;
  return undefined;
}

interface NumberInputProps extends Pick<ComponentProps<'input'>, 'disabled'> {
  control: FieldControlProps;
  value: number | null | undefined;
  onChange: (value: number | null) => void;
  limit?: NumberLimit;
  unit?: string;
  onProblem: (problem: string | undefined) => void;
}

/** Keeps what is typed on the screen as it is, also while it is no number yet, and gives on only what is one. */
export function NumberInput({ control, value, onChange, limit, unit, onProblem, disabled }: NumberInputProps) {
  const shown = value === null || value === undefined ? '' : String(value);
  const [text, setText] = useState(shown);
  const [given, setGiven] = useState(value ?? null);
  // changed from outside: by another tab, or taken back
  if ((value ?? null) !== given) {
    setGiven(value ?? null);
    if (parseNumber(text) !== (value ?? null)) setText(shown);
  }
  const type = (next: string) => {
    setText(next);
    const problem = numberProblem(next, limit);
    onProblem(problem);
    if (problem) return;
    setGiven(parseNumber(next));
    onChange(parseNumber(next));
  };
  return (
    <span className={styles.number}>
      <input
        {...control}
        className={styles.input}
        type="text"
        inputMode={limit && limit.min < 0 ? 'text' : 'decimal'}
        autoComplete="off"
        disabled={disabled}
        value={text}
        onChange={(event) => type(event.target.value)}
      />
      {unit && <span className={styles.unit}>{unit}</span>}
    </span>
  );
}
