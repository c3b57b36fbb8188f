import { DISCIPLINE_WORDS, ROLE_WORDS, ROLES, type Role } from '@kerfside/calc/vocabulary/people.js';
import { Button } from '@radix-ui/themes';
import { useInfiniteQuery } from '@tanstack/react-query';
import { type FormEvent, useState } from 'react';
import { SelectField } from '@/components/field';
import { FormButtons } from '@/components/form-buttons';
import { FormDialog } from '@/components/form-dialog';
import { FormProblem } from '@/components/form-problem';
import { SearchBox } from '@/components/search-box';
import { peopleQuery } from '@/features/people/api/list-people';
import { useSetMember } from '../api/set-member';

interface AddMemberProps {
  conferenceId: string;
  memberIds: string[];
}

export function AddMember(props: AddMemberProps) {
  return (
    <FormDialog trigger={<Button variant="soft">Add member</Button>} title="Add a member" description="People who have no account yet are invited under People.">
      {(close) => <AddMemberForm {...props} onDone={close} />}
    </FormDialog>
  );
}

function AddMemberForm({ conferenceId, memberIds, onDone }: AddMemberProps & { onDone: () => void }) {
  const [text, setText] = useState('');
  const people = useInfiniteQuery(peopleQuery(text ? { query: text } : {}));
  const [personId, setPersonId] = useState('');
  const [role, setRole] = useState<Role>('panellist');
  const set = useSetMember();
  const found = people.data?.pages.flatMap((page) => page.items).filter(({ id, isActive }) => isActive && !memberIds.includes(id)) ?? [];
  const words = Object.fromEntries(found.map((person) => [person.id, `${person.name}, ${DISCIPLINE_WORDS[person.discipline]}, ${person.unit}`]));
  const submit = (event: FormEvent) => {
    event.preventDefault();
    set.mutate({ conferenceId, personId, role }, { onSuccess: onDone });
  };
  return (
    <form onSubmit={submit}>
      <FormProblem error={set.error} />
      <div style={{ marginBottom: 16 }}>
        <SearchBox label="Name or e-mail address" value={text} onSearch={setText} />
      </div>
      <SelectField
        label="Person"
        required
        none={found.length > 0 ? 'Choose' : 'Nobody fits'}
        words={words}
        value={personId in words ? personId : ''}
        onChange={({ target }) => setPersonId(target.value)}
      />
      <SelectField
        label="Role"
        words={ROLE_WORDS}
        value={role}
        onChange={({ target }) => setRole(ROLES.find((name) => name === target.value) ?? role)}
      />
      <FormButtons word="Add member" isBusy={set.isPending} onCancel={onDone} />
    </form>
  );
}
