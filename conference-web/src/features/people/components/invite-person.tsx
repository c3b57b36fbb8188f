import { DISCIPLINE_WORDS, type Discipline, ROLE_WORDS, type Role } from '@kerfside/calc/vocabulary/people.js';
import { Button } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { type FormEvent, useState } from 'react';
import { SelectField, TextField } from '@/components/field';
import { FormButtons } from '@/components/form-buttons';
import { FormDialog } from '@/components/form-dialog';
import { FormProblem } from '@/components/form-problem';
import { Loaded, TextSkeleton } from '@/components/page-states';
import { conferencesQuery } from '@/features/conferences/api/list-conferences';
import { fieldMessages } from '@/lib/api/field-messages';
import type { Schemas } from '@/lib/api/types';
import { useInvitePerson } from '../api/invite-person';
import { unitsQuery } from '../api/list-units';
import styles from './people.module.css';

export function InvitePerson() {
  const units = useQuery(unitsQuery());
  return (
    <FormDialog
      trigger={<Button>Invite person</Button>}
      title="Invite a person"
      description="The person gets a mail with a link, chooses a password, and can then sign in."
    >
      {(close) => (
        <Loaded query={units} skeleton={<TextSkeleton lines={5} />}>
          {({ items }) =>
            items.length === 0 ? <p>Add a unit first: each person belongs to one.</p> : <InviteForm units={items} onDone={close} />
          }
        </Loaded>
      )}
    </FormDialog>
  );
}

function InviteForm({ units, onDone }: { units: Schemas['UnitDto'][]; onDone: () => void }) {
  const invite = useInvitePerson();
  const conferences = useQuery(conferencesQuery());
  const [name, setName] = useState('');
  const [email, setEmail] = useState('');
  const [discipline, setDiscipline] = useState<string>('');
  const [unitId, setUnitId] = useState('');
  const [roles, setRoles] = useState<Record<string, string>>({});
  const fields = fieldMessages(invite.error);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const memberships = Object.entries(roles).flatMap(([conferenceId, role]) => (role ? [{ conferenceId, role: role as Role }] : []));
    invite.mutate({ name: name.trim(), email: email.trim(), discipline: discipline as Discipline, unitId, memberships }, { onSuccess: onDone });
  };
  return (
    <form onSubmit={submit}>
      <FormProblem error={invite.error} shown={['name', 'email', 'discipline', 'unitId']} />
      <TextField label="Name" error={fields['name']} maxLength={120} required value={name} onChange={({ target }) => setName(target.value)} />
      <TextField label="E-mail address" type="email" error={fields['email']} required value={email} onChange={({ target }) => setEmail(target.value)} />
      <SelectField label="Discipline" none="Choose" required error={fields['discipline']} words={DISCIPLINE_WORDS} value={discipline} onChange={({ target }) => setDiscipline(target.value)} />
      <SelectField
        label="Unit"
        none="Choose"
        required
        error={fields['unitId']}
        words={Object.fromEntries(units.map((unit) => [unit.id, unit.name]))}
        value={unitId}
        onChange={({ target }) => setUnitId(target.value)}
      />
      <fieldset className={styles.memberships}>
        <legend>Roles in conferences</legend>
        {(conferences.data?.items ?? []).map((conference) => (
          <SelectField
            key={conference.id}
            label={conference.name}
            none="Not a member"
            words={ROLE_WORDS}
            value={roles[conference.id] ?? ''}
            onChange={({ target }) => setRoles({ ...roles, [conference.id]: target.value })}
          />
        ))}
      </fieldset>
      <FormButtons word="Send invitation" isBusy={invite.isPending} onCancel={onDone} />
    </form>
  );
}
