import { CONSENSUS_RULE_WORDS, type ConsensusRule, NAMES_SHOWN_WORDS, type NamesShown } from '@kerfside/calc/vocabulary/conference.js';
import { Button } from '@radix-ui/themes';
import { type FormEvent, useState } from 'react';
import { SelectField, TextField } from '@/components/field';
import { FormProblem } from '@/components/form-problem';
import { fieldMessages } from '@/lib/api/field-messages';
import type { Schemas } from '@/lib/api/types';
import { useMe } from '@/lib/auth/session';
import { useUpdateConference } from '../api/write-conference';
import { QuorumEditor } from './quorum-editor';
import { kindOf, SlotEditor } from './slot-editor';
import styles from './conferences.module.css';

type Conference = Schemas['ConferenceDto'];

const SHOWN = ['name', 'timeZone', 'slotStart', 'slotRule', 'slotMinutes', 'agendaHoursBefore', 'quorumRule.raters'];

/** Slot and rules. What is being edited stays as it is while others change the same: saving then says so. */
export function ConferenceSettingsForm({ conference }: { conference: Conference }) {
  const { isAdministrator } = useMe();
  const update = useUpdateConference(conference.id);
  const [baseVersion, setBaseVersion] = useState(conference.version);
  const [values, setValues] = useState(conference);
  const [kind, setKind] = useState(() => kindOf(conference));
  const errors = fieldMessages(update.error);
  const set = (changes: Partial<Conference>) => setValues((now) => ({ ...now, ...changes }));
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const { name, timeZone, slotStart, slotRule, slotMinutes, agendaHoursBefore, quorumRule, consensusRule, namesShown } = values;
    const rules = { timeZone, slotStart, slotRule, slotMinutes, agendaHoursBefore, quorumRule, consensusRule, namesShown };
    update.mutate(
      { baseVersion, ...rules, ...(isAdministrator ? { name: name.trim() } : {}) },
      { onSuccess: ({ version }) => setBaseVersion(version) },
    );
  };
  const startAgain = () => {
    setValues(conference);
    setBaseVersion(conference.version);
    setKind(kindOf(conference));
    update.reset();
  };
  return (
    <form onSubmit={submit}>
      <FormProblem error={update.error} shown={SHOWN} />
      {conference.version !== baseVersion && !update.isPending && (
        <p role="status">
          Somebody has changed these settings meanwhile.{' '}
          <Button type="button" variant="soft" size="2" onClick={startAgain}>
            Show what is there now
          </Button>
        </p>
      )}
      {isAdministrator && (
        <div className={styles.single}>
          <TextField label="Name" required maxLength={120} error={errors['name']} value={values.name} onChange={({ target }) => set({ name: target.value })} />
        </div>
      )}
      <SlotEditor
        values={values}
        kind={kind}
        errors={errors}
        onChange={(changes, next) => {
          set(changes);
          setKind(next);
        }}
      />
      <QuorumEditor rule={values.quorumRule} errors={errors} onChange={(quorumRule) => set({ quorumRule })} />
      <fieldset className={styles.group}>
        <legend>Ratings</legend>
        <div className={styles.columns}>
          <SelectField
            label="Consensus is"
            words={CONSENSUS_RULE_WORDS}
            value={values.consensusRule}
            onChange={({ target }) => set({ consensusRule: target.value as ConsensusRule })}
          />
          <SelectField
            label="Who sees which member gave which rating"
            words={NAMES_SHOWN_WORDS}
            value={values.namesShown}
            onChange={({ target }) => set({ namesShown: target.value as NamesShown })}
          />
        </div>
      </fieldset>
      <Button type="submit" loading={update.isPending}>
        Save settings
      </Button>
      {update.isSuccess && (
        <span role="status" style={{ marginLeft: 12 }}>
          Saved
        </span>
      )}
    </form>
  );
}
