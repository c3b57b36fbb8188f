import { SelectField, TextField } from '@/components/field';
import { SLOT_KINDS, type SlotKind, slotKind, slotRule } from '../slot-rule';
import { NextDates } from './next-dates';
import styles from './conferences.module.css';

export interface SlotValues {
  timeZone: string;
  slotStart: string;
  slotRule: string;
  slotMinutes: number;
  agendaHoursBefore: number;
}

interface SlotEditorProps {
  values: SlotValues;
  kind: SlotKind;
  errors: Record<string, string>;
  onChange: (changes: Partial<SlotValues>, kind: SlotKind) => void;
}

const ZONES = Intl.supportedValuesOf('timeZone');
const zoneWords = (own: string) => Object.fromEntries([...new Set(['UTC', own, ...ZONES])].map((zone) => [zone, zone.replaceAll('_', ' ')]));

export const kindOf = ({ slotRule: rule, slotStart }: SlotValues): SlotKind => slotKind(rule, slotStart);

/** When the conference meets, for how long, and when its agenda goes out by itself. */
export function SlotEditor({ values, kind, errors, onChange }: SlotEditorProps) {
  const setStart = (slotStart: string) => {
    const rule = kind === 'own' ? null : slotRule(kind, slotStart);
    onChange({ slotStart, ...(rule ? { slotRule: rule } : {}) }, kind);
  };
  const setKind = (next: SlotKind) => {
    const rule = next === 'own' ? null : slotRule(next, values.slotStart);
    onChange(rule ? { slotRule: rule } : {}, next);
  };
  return (
    <fieldset className={styles.group}>
      <legend>Slot</legend>
      <div className={styles.columns}>
        <SelectField
          label="Time zone"
          words={zoneWords(values.timeZone)}
          error={errors['timeZone']}
          value={values.timeZone}
          onChange={({ target }) => onChange({ timeZone: target.value }, kind)}
        />
        <TextField
          label="First meeting, local time"
          type="datetime-local"
          required
          error={errors['slotStart']}
          value={values.slotStart}
          onChange={({ target }) => setStart(target.value.slice(0, 16))}
        />
        <SelectField label="Meets" words={SLOT_KINDS} value={kind} onChange={({ target }) => setKind(target.value as SlotKind)} />
        {kind === 'own' && (
          <TextField
            label="Rule"
            hint="RFC 5545, such as FREQ=MONTHLY;BYDAY=2TU."
            required
            maxLength={200}
            error={errors['slotRule']}
            value={values.slotRule}
            onChange={({ target }) => onChange({ slotRule: target.value }, kind)}
          />
        )}
        <TextField
          label="Minutes"
          type="number"
          min={5}
          max={480}
          required
          error={errors['slotMinutes']}
          value={values.slotMinutes || ''}
          onChange={({ target }) => onChange({ slotMinutes: target.valueAsNumber || 0 }, kind)}
        />
        <TextField
          label="Agenda sent, hours before"
          type="number"
          min={1}
          max={336}
          required
          error={errors['agendaHoursBefore']}
          value={values.agendaHoursBefore || ''}
          onChange={({ target }) => onChange({ agendaHoursBefore: target.valueAsNumber || 0 }, kind)}
        />
      </div>
      {!errors['slotRule'] && <NextDates slot={{ timeZone: values.timeZone, start: values.slotStart, rrule: values.slotRule }} />}
    </fieldset>
  );
}
