import { ROLE_WORDS, ROLES, type Role } from '@kerfside/calc/vocabulary/people.js';
import { Button, Flex } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { SelectField } from '@/components/field';
import { FormProblem } from '@/components/form-problem';
import { conferencesQuery } from '@/features/conferences/api/list-conferences';
import { useRemoveMember, useSetMember } from '@/features/conferences/api/set-member';
import type { Schemas } from '@/lib/api/types';
import styles from './people.module.css';

const isRole = (name: string): name is Role => ROLES.some((role) => role === name);

/** A person's roles; each change takes effect at once. */
export function MembershipEditor({ person }: { person: Schemas['PersonDto'] }) {
  const { data } = useQuery(conferencesQuery());
  const set = useSetMember();
  const remove = useRemoveMember();
  const [conferenceId, setConferenceId] = useState('');
  const [role, setRole] = useState<Role>('panellist');
  const member = new Set(person.memberships.map((membership) => membership.conferenceId));
  const others = Object.fromEntries((data?.items ?? []).flatMap(({ id, name }) => (member.has(id) ? [] : [[id, name]])));
  const add = () => set.mutate({ conferenceId, personId: person.id, role }, { onSuccess: () => setConferenceId('') });
  return (
    <fieldset className={styles.memberships}>
      <legend>Roles in conferences</legend>
      <FormProblem error={set.error ?? remove.error} />
      {person.memberships.length === 0 && <p className="label-text">None yet.</p>}
      {person.memberships.map((membership) => (
        <Flex key={membership.conferenceId} gap="3" align="end" wrap="wrap">
          <div className={styles.grow}>
            <SelectField
              label={membership.conferenceName}
              words={ROLE_WORDS}
              value={membership.role}
              disabled={set.isPending}
              onChange={({ target }) =>
                isRole(target.value) && set.mutate({ conferenceId: membership.conferenceId, personId: person.id, role: target.value })
              }
            />
          </div>
          <Button
            variant="soft"
            color="gray"
            mb="4"
            aria-label={`Remove from ${membership.conferenceName}`}
            loading={remove.isPending && remove.variables.conferenceId === membership.conferenceId}
            onClick={() => remove.mutate({ conferenceId: membership.conferenceId, personId: person.id })}
          >
            Remove
          </Button>
        </Flex>
      ))}
      {Object.keys(others).length > 0 && (
        <Flex gap="3" align="end" wrap="wrap">
          <div className={styles.grow}>
            <SelectField label="Add to" none="Choose a conference" words={others} value={conferenceId} onChange={({ target }) => setConferenceId(target.value)} />
          </div>
          <div className={styles.grow}>
            <SelectField label="As" words={ROLE_WORDS} value={role} onChange={({ target }) => isRole(target.value) && setRole(target.value)} />
          </div>
          <Button variant="soft" mb="4" disabled={set.isPending || !conferenceId} loading={set.isPending} onClick={add}>
            Add
          </Button>
        </Flex>
      )}
    </fieldset>
  );
}
