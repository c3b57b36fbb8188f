import { type KeyboardEvent, useId } from 'react';
import { BANDS, SCALE } from '@/components/rating-rule/rule-geometry';
import styles from './ratings.module.css';

interface RatingScaleProps {
  /** The option that is rated. */
  title: string;
  value: number | null;
  onChange: (value: number) => void;
  error?: string;
}

/** Nine radio buttons in three named bands. Arrow keys go through them, a digit chooses at once. */
export function RatingScale({ title, value, onChange, error }: RatingScaleProps) {
  const id = useId();
  const onKeyDown = (event: KeyboardEvent) => {
    const digit = Number(event.key);
    if (event.ctrlKey || event.metaKey || event.altKey || !(digit >= 1 && digit <= 9)) return;
    event.preventDefault();
    onChange(digit);
    document.getElementById(`${id}-${digit}`)?.focus();
  };
  return (
    <fieldset className={styles.scale} onKeyDown={onKeyDown} aria-describedby={error ? `${id}-error` : undefined} aria-invalid={error ? true : undefined} role="radiogroup">
      <legend className="visually-hidden">How appropriate is: {title}</legend>
      {BANDS.map(({ word, from, to }) => (
        <div key={word} className={styles.scaleBand}>
          <div className={styles.places}>
            {SCALE.filter((rating) => rating >= from && rating <= to).map((rating) => (
              <label key={rating} className={styles.place} data-chosen={value === rating || undefined}>
                <input
                  id={`${id}-${rating}`}
                  type="radio"
                  name={id}
                  value={rating}
                  checked={value === rating}
                  aria-label={`${rating}, ${word}`}
                  onChange={() => onChange(rating)}
                />
                <span aria-hidden="true">{rating}</span>
              </label>
            ))}
          </div>
          <span className={styles.scaleWord} aria-hidden="true">
            {word}
          </span>
        </div>
      ))}
      {error && (
        <p id={`${id}-error`} className={styles.error}>
          {error}
        </p>
      )}
    </fieldset>
  );
}
