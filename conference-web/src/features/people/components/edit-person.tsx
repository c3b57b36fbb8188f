import { DISCIPLINE_WORDS, type Discipline } from '@kerfside/calc/vocabulary/people.js';
import { Button } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { type FormEvent, useState } from 'react';
import { Confirm } from '@/components/confirm';
import { CheckField, SelectField, TextField } from '@/components/field';
import { FormButtons } from '@/components/form-buttons';
import { FormDialog } from '@/components/form-dialog';
import { FormProblem } from '@/components/form-problem';
import { fieldMessages } from '@/lib/api/field-messages';
import type { Schemas } from '@/lib/api/types';
import { unitsQuery } from '../api/list-units';
import { useUpdatePerson } from '../api/update-person';
import { MembershipEditor } from './membership-editor';

type Person = Schemas['PersonDto'];

export function EditPerson({ person }: { person: Person }) {
  const edit = (
    <Button variant="soft" size="2" data-list-item aria-label={`Edit ${person.name}`}>
      Edit
    </Button>
  );
  return (
    <FormDialog trigger={edit} title={person.name} description={person.email}>
      {(close) => (
        <>
          <MembershipEditor person={person} />
          <PersonForm person={person} onDone={close} />
        </>
      )}
    </FormDialog>
  );
}

function PersonForm({ person, onDone }: { person: Person; onDone: () => void }) {
  const units = useQuery(unitsQuery());
  const update = useUpdatePerson(person.id);
  const [name, setName] = useState(person.name);
  const [discipline, setDiscipline] = useState<string>(person.discipline);
  const [unitId, setUnitId] = useState(person.unitId);
  const [isAdministrator, setAdministrator] = useState(person.isAdministrator);
  const fields = fieldMessages(update.error);
  const unitWords = Object.fromEntries((units.data?.items ?? [{ id: person.unitId, name: person.unit }]).map((unit) => [unit.id, unit.name]));
  const submit = (event: FormEvent) => {
    event.preventDefault();
    update.mutate({ name: name.trim(), discipline: discipline as Discipline, unitId, isAdministrator }, { onSuccess: onDone });
  };
  return (
    <form onSubmit={submit}>
      <FormProblem error={update.error} shown={['name', 'discipline', 'unitId']} />
      <TextField label="Name" error={fields['name']} maxLength={120} required value={name} onChange={({ target }) => setName(target.value)} />
      <SelectField label="Discipline" error={fields['discipline']} words={DISCIPLINE_WORDS} value={discipline} onChange={({ target }) => setDiscipline(target.value)} />
      <SelectField label="Unit" error={fields['unitId']} words={unitWords} value={unitId} onChange={({ target }) => setUnitId(target.value)} />
      <CheckField
        label="Administrator of this installation: people, units, conferences, mail and audit. Sees no case by that."
        checked={isAdministrator}
        onChange={({ target }) => setAdministrator(target.checked)}
      />
      <Activity person={person} />
      <FormButtons word="Save person" isBusy={update.isPending} onCancel={onDone} />
    </form>
  );
}

/** Shutting a person out, or letting the person in again. */
function Activity({ person }: { person: Person }) {
  const { mutateAsync } = useUpdatePerson(person.id);
  const trigger = (
    <Button type="button" variant="soft" color={person.isActive ? 'red' : undefined} my="3">
      {person.isActive ? 'Deactivate person' : 'Activate person'}
    </Button>
  );
  return (
    <Confirm
      trigger={trigger}
      title={person.isActive ? `Deactivate ${person.name}` : `Activate ${person.name}`}
      tone={person.isActive ? 'grave' : 'plain'}
      confirmWord={person.isActive ? 'Deactivate' : 'Activate'}
      onConfirm={() => mutateAsync({ isActive: !person.isActive })}
    >
      {person.isActive
        ? 'All sessions of this person end and no new one can begin. What the person wrote, rated and signed stays.'
        : 'The person can sign in again with the password used before.'}
    </Confirm>
  );
}
