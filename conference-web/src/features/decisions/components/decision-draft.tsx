import { useQuery } from '@tanstack/react-query';
import { Caution } from '@/components/caution';
import { SelectField, TextAreaField, TextField } from '@/components/field';
import { FormProblem } from '@/components/form-problem';
import { SaveState } from '@/components/save-state';
import { meetingQuery } from '@/features/meetings/api/get-meeting';
import { roundsQuery } from '@/features/ratings/api/get-rounds';
import type { Schemas } from '@/lib/api/types';
import type { Decision } from '../api/list-decisions-of-case';
import { useDecisionDraft } from '../use-decision-draft';
import { DraftConflictNotice } from './draft-conflict';
import { DissentFields } from './dissent-fields';
import { SignDecision } from './sign-decision';
import styles from './decisions.module.css';

interface DecisionDraftProps {
  draft: Decision;
  found: Schemas['CaseDto'];
}

/** The chair's form, saved as it is typed. */
export function DecisionDraft({ draft, found }: DecisionDraftProps) {
  const { content, saving, problem, conflict, saver } = useDecisionDraft(draft);
  const options = found.content.options.options ?? [];
  const { data: meeting } = useQuery({ ...meetingQuery(draft.meetingId ?? ''), enabled: draft.meetingId !== null });
  const present = (meeting?.attendance ?? []).filter(({ state }) => state === 'present' || state === 'remote').map(({ person }) => person);
  const lacks = useLacks(draft, found, content);
  return (
    <form className={styles.draft} onSubmit={(event) => event.preventDefault()} aria-label={draft.version === 1 ? 'Draft of the decision' : 'Draft of the amendment'}>
      <div className={styles.draftHead}>
        <h3>{draft.version === 1 ? 'Draft' : `Draft of version ${draft.version}`}</h3>
        <SaveState state={saving} />
      </div>
      {draft.amendmentReason !== null && <p className="label-text">Amendment. Reason: {draft.amendmentReason}</p>}
      {draft.kind === 'advice' && (
        <p className={styles.advice} role="note">
          The quorum is not met ({draft.quorumMissing.join('; ')}). If it is signed like this, it is an advice and not a decision.
        </p>
      )}
      {conflict && <DraftConflictNotice conflict={conflict} mine={content} options={options} onSettle={saver.settle} />}
      {problem && !problem.isPassing && <FormProblem error={problem} />}
      <SelectField
        label="Option agreed"
        none="Not chosen yet"
        words={Object.fromEntries(options.map(({ id, title }) => [id, title]))}
        value={content.chosenOptionId ?? ''}
        onChange={(event) => saver.change({ chosenOptionId: event.target.value || null })}
      />
      <TextAreaField
        label="Decision"
        hint="What the conference recommends, in whole sentences."
        rows={6}
        maxLength={8000}
        value={content.text}
        onChange={(event) => saver.change({ text: event.target.value })}
      />
      <TextAreaField
        label="Conditions"
        optional
        hint="What has to be so before or during the operation: cultures, kit, people, what would change the plan."
        maxLength={4000}
        value={content.conditions}
        onChange={(event) => saver.change({ conditions: event.target.value })}
      />
      <TextField
        label="Timing"
        optional
        hint="For example: within two weeks, once antibiotics have been stopped."
        maxLength={1000}
        value={content.timing}
        onChange={(event) => saver.change({ timing: event.target.value })}
      />
      <DissentFields present={present} known={draft.dissenters} dissent={content.dissent} onChange={(dissent) => saver.change({ dissent })} />
      <Caution />
      <SignDecision draft={draft} saver={saver} lacks={lacks} />
    </form>
  );
}

/** What has to be done before it can be signed, in words. The server asks for the same. */
function useLacks(draft: Decision, found: Schemas['CaseDto'], content: Decision['content']): string[] {
  const { data: rounds } = useQuery(roundsQuery(found.id));
  const lacks: string[] = [];
  if (!content.chosenOptionId) lacks.push('Choose the option that was agreed.');
  if (!content.text.trim()) lacks.push('Write the decision.');
  if (content.dissent.some(({ words }) => !words.trim())) lacks.push('Write the words of each dissent, or take it out.');
  if (draft.version > 1 || found.stage !== 'listed' || !rounds) return lacks;
  const second = rounds.rounds.find(({ number }) => number === 2);
  if (!second) lacks.push('Open and close the second round.');
  else if (second.state === 'open') lacks.push('Close the second round.');
  return lacks;
}
