import { DISCIPLINE_WORDS, ROLE_WORDS } from '@kerfside/calc/vocabulary/people.js';
import { Button } from '@radix-ui/themes';
import { type Column, DataTable } from '@/components/data-table';
import { asProblem } from '@/lib/api/problem';
import type { Schemas } from '@/lib/api/types';
import { useInviteAgain } from '../api/invite-again';
import { EditPerson } from './edit-person';
import styles from './people.module.css';

type Person = Schemas['PersonDto'];

function InviteAgain({ person }: { person: Person }) {
  const invite = useInviteAgain();
  if (invite.isSuccess) return <span role="status">Invitation sent</span>;
  return (
    <>
      <Button variant="soft" color="gray" size="2" loading={invite.isPending} aria-label={`Invite again: ${person.name}`} onClick={() => invite.mutate(person.id)}>
        Invite again
      </Button>
      {invite.error && <span role="alert">{asProblem(invite.error).detail}</span>}
    </>
  );
}

function state({ isActive, hasAccepted, isAdministrator }: Person) {
  if (!isActive) return <span className={styles.state}>Not active</span>;
  if (!hasAccepted) return 'Invited';
  return isAdministrator ? 'Active, administrator' : 'Active';
}

const columns: Column<Person>[] = [
  {
    key: 'name',
    head: 'Person',
    cell: ({ name, email }) => (
      <>
        <span className={styles.name}>{name}</span>
        <span className={styles.mail}>{email}</span>
      </>
    ),
  },
  { key: 'discipline', head: 'Discipline', cell: ({ discipline }) => DISCIPLINE_WORDS[discipline] },
  { key: 'unit', head: 'Unit', cell: ({ unit }) => unit },
  {
    key: 'roles',
    head: 'Roles',
    cell: ({ memberships }) =>
      memberships.length === 0 ? null : memberships.map(({ conferenceId, conferenceName, role }) => <div key={conferenceId}>{`${conferenceName}: ${ROLE_WORDS[role].toLowerCase()}`}</div>),
  },
  { key: 'state', head: 'State', cell: state },
  {
    key: 'edit',
    head: 'Change',
    fold: 'bare',
    align: 'right',
    cell: (person) => (
      <div className={styles['row-buttons']}>
        {person.isActive && !person.hasAccepted && <InviteAgain person={person} />}
        <EditPerson person={person} />
      </div>
    ),
  },
];

export function PeopleTable({ people }: { people: Person[] }) {
  return <DataTable caption="People" columns={columns} rows={people} rowKey={({ id }) => id} />;
}
