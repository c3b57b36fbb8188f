import { DISCIPLINE_WORDS, ROLE_WORDS, ROLES } from '@kerfside/calc/vocabulary/people.js';
import { Button } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { Confirm } from '@/components/confirm';
import { type Column, DataTable } from '@/components/data-table';
import { SelectField } from '@/components/field';
import { EmptyState, Loaded, TableSkeleton } from '@/components/page-states';
import { Section } from '@/components/section';
import { asProblem } from '@/lib/api/problem';
import type { Schemas } from '@/lib/api/types';
import { useMe } from '@/lib/auth/session';
import { membersQuery } from '../api/list-members';
import { useRemoveMember, useSetMember } from '../api/set-member';
import { AddMember } from './add-member';

type Member = Schemas['MemberDto'];

function RoleChoice({ conferenceId, member }: { conferenceId: string; member: Member }) {
  const set = useSetMember();
  return (
    <SelectField
      label={<span className="visually-hidden">Role of {member.person.name}</span>}
      words={ROLE_WORDS}
      value={member.role}
      disabled={set.isPending}
      error={set.error ? asProblem(set.error).detail : undefined}
      onChange={({ target }) => {
        const role = ROLES.find((name) => name === target.value);
        if (role) set.mutate({ conferenceId, personId: member.person.id, role });
      }}
    />
  );
}

function RemoveMember({ conferenceId, member }: { conferenceId: string; member: Member }) {
  const { mutateAsync } = useRemoveMember();
  return (
    <Confirm
      title={`Remove ${member.person.name}`}
      tone="grave"
      confirmWord="Remove member"
      onConfirm={() => mutateAsync({ conferenceId, personId: member.person.id })}
      trigger={
        <Button variant="soft" color="gray" size="2" data-list-item aria-label={`Remove ${member.person.name}`}>
          Remove
        </Button>
      }
    >
      The person no longer sees the cases of this conference. What the person wrote and rated stays.
    </Confirm>
  );
}

function columnsFor(conferenceId: string, mayChange: boolean): Column<Member>[] {
  const read: Column<Member>[] = [
    { key: 'name', head: 'Member', cell: ({ person }) => person.name },
    { key: 'discipline', head: 'Discipline', cell: ({ person }) => DISCIPLINE_WORDS[person.discipline] },
    { key: 'unit', head: 'Unit', cell: ({ person }) => person.unit },
    { key: 'role', head: 'Role', cell: (member) => (mayChange ? <RoleChoice conferenceId={conferenceId} member={member} /> : ROLE_WORDS[member.role]) },
  ];
  if (!mayChange) return read;
  return [...read, { key: 'remove', head: 'Remove', fold: 'bare', align: 'right', cell: (member) => <RemoveMember conferenceId={conferenceId} member={member} /> }];
}

export function MemberTable({ conferenceId }: { conferenceId: string }) {
  const { isAdministrator } = useMe();
  const query = useQuery(membersQuery(conferenceId));
  const members = query.data?.items ?? [];
  return (
    <Section
      title="Members"
      actions={isAdministrator && query.data && <AddMember conferenceId={conferenceId} memberIds={members.map(({ person }) => person.id)} />}
    >
      <Loaded query={query} skeleton={<TableSkeleton rows={5} columns={4} />}>
        {({ items }) =>
          items.length === 0 ? (
            <EmptyState title="No members yet">Nobody sees the cases of this conference until members are added.</EmptyState>
          ) : (
            <DataTable caption="Members" columns={columnsFor(conferenceId, isAdministrator)} rows={items} rowKey={({ person }) => person.id} />
          )
        }
      </Loaded>
    </Section>
  );
}
