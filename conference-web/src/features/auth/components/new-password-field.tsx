import { useState } from 'react';
import { CheckField, TextField } from '@/components/field';

interface NewPasswordFieldProps {
  label: string;
  value: string;
  error?: string;
  onChange: (value: string) => void;
}

const FEWEST = 15;

/** Says the rule before it is broken, and counts along. */
export function NewPasswordField({ label, value, error, onChange }: NewPasswordFieldProps) {
  const [isShown, setShown] = useState(false);
  const length = [...value.normalize('NFKC')].length;
  const count = length === 0 ? '' : length < FEWEST ? ` ${FEWEST - length} more to go.` : ' Long enough.';
  return (
    <>
      <TextField
        label={label}
        hint={
          <>
            At least {FEWEST} characters; several words with spaces between them do well. Capitals, digits and signs are not asked for.
            <span className="tabular">{count}</span>
          </>
        }
        error={error}
        type={isShown ? 'text' : 'password'}
        autoComplete="new-password"
        maxLength={256}
        required
        spellCheck={false}
        value={value}
        onChange={(event) => onChange(event.target.value)}
      />
      <div style={{ margin: '-6px 0 14px' }}>
        <CheckField label="Show the password" checked={isShown} onChange={(event) => setShown(event.target.checked)} />
      </div>
    </>
  );
}
