import { PROJECTION_WORDS, type Projection } from '@kerfside/calc/vocabulary/images.js';
import { SelectField, TextField } from '@/components/field';
import type { ImageFields } from '../upload/upload-queue';
import styles from './images.module.css';

interface ImageFieldsProps {
  value: ImageFields;
  errors?: Record<string, string>;
  disabled?: boolean;
  onChange: (fields: Partial<ImageFields>) => void;
  /** The typing rests or a choice is made. */
  onRest?: (fields: Partial<ImageFields>) => void;
}

/** Projection, interval and caption of a picture. */
export function ImageFieldsForm({ value, errors = {}, disabled, onChange, onRest }: ImageFieldsProps) {
  return (
    <div className={styles.fields}>
      <SelectField
        label="Projection"
        words={PROJECTION_WORDS}
        error={errors.projection}
        value={value.projection}
        disabled={disabled}
        onChange={({ target }) => {
          const projection = target.value as Projection;
          onChange({ projection });
          onRest?.({ projection });
        }}
      />
      <TextField
        label="Interval"
        optional
        hint="Such as ‘9 years after the index operation’; never a date."
        maxLength={120}
        error={errors.interval}
        value={value.interval}
        disabled={disabled}
        onChange={({ target }) => onChange({ interval: target.value })}
        onBlur={({ target }) => onRest?.({ interval: target.value })}
      />
      <TextField
        label="Caption"
        optional
        maxLength={300}
        error={errors.caption}
        value={value.caption}
        disabled={disabled}
        onChange={({ target }) => onChange({ caption: target.value })}
        onBlur={({ target }) => onRest?.({ caption: target.value })}
      />
    </div>
  );
}
