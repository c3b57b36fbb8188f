import { DISCIPLINE_WORDS } from '@kerfside/calc/vocabulary/people.js';
import { Button } from '@radix-ui/themes';
import { SelectField, TextAreaField } from '@/components/field';
import type { Schemas } from '@/lib/api/types';
import styles from './decisions.module.css';

type Person = Schemas['PersonRefDto'];
type Dissent = Schemas['DissentDto'];

interface DissentFieldsProps {
  /** Who is at the meeting. */
  present: Person[];
  /** Those who are on record already. */
  known: Person[];
  dissent: Dissent[];
  onChange: (dissent: Dissent[]) => void;
}

/** Who does not agree, of those present, each in their own words. */
export function DissentFields({ present, known, dissent, onChange }: DissentFieldsProps) {
  const people = [...new Map([...known, ...present].map((person) => [person.id, person])).values()];
  const others = present.filter(({ id }) => !dissent.some(({ personId }) => personId === id));
  const label = ({ name, discipline }: Person) => `${name}, ${DISCIPLINE_WORDS[discipline].toLowerCase()}`;
  return (
    <fieldset className={styles.dissent}>
      <legend>Dissent</legend>
      {dissent.map(({ personId, words }) => {
        const person = people.find(({ id }) => id === personId);
        const name = person ? label(person) : 'A member of the panel';
        return (
          <div key={personId}>
            <TextAreaField
              label={name}
              hint="In the dissenter’s own words: read them back before you sign."
              maxLength={4000}
              value={words}
              onChange={(event) => onChange(dissent.map((entry) => (entry.personId === personId ? { personId, words: event.target.value } : entry)))}
            />
            <Button
              type="button"
              variant="soft"
              color="gray"
              aria-label={`Take out the dissent of ${person?.name ?? 'this person'}`}
              onClick={() => onChange(dissent.filter((entry) => entry.personId !== personId))}
            >
              Take out
            </Button>
          </div>
        );
      })}
      {others.length > 0 ? (
        <SelectField
          label="Add a dissent of"
          none="Choose who dissents"
          words={Object.fromEntries(others.map((person) => [person.id, label(person)]))}
          value=""
          onChange={(event) => event.target.value && onChange([...dissent, { personId: event.target.value, words: '' }])}
        />
      ) : (
        dissent.length === 0 && <p className="label-text">Nobody is marked as present at the meeting yet, so no dissent can be recorded.</p>
      )}
    </fieldset>
  );
}
