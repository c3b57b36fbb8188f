import { Button } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { paths } from '@/app/paths';
import { Confirm } from '@/components/confirm';
import { FormProblem } from '@/components/form-problem';
import { Loaded, TextSkeleton } from '@/components/page-states';
import { Section } from '@/components/section';
import { caseQuery } from '@/features/cases/api/get-case';
import type { Schemas } from '@/lib/api/types';
import { formatDate } from '@/lib/dates';
import { useAmendDecision } from '../api/amend-decision';
import { type Decision, decisionsOfCaseQuery } from '../api/list-decisions-of-case';
import { useBeginDecision } from '../api/write-decision';
import { decisionName } from '../present';
import { DecisionDraft } from './decision-draft';
import { FinalDecisions } from './final-decisions';
import styles from './decisions.module.css';

type Case = Schemas['CaseDto'];

/** The decision on a case from its draft to the treating surgeon's final word. */
export function DecisionPanel({ caseId }: { caseId: string }) {
  const found = useQuery(caseQuery(caseId));
  const decisions = useQuery(decisionsOfCaseQuery(caseId));
  return (
    <>
      <Section title="Decision">
        <Loaded query={decisions} skeleton={<TextSkeleton lines={4} />} what="case">
          {({ items }) => (found.data ? <Decisions found={found.data} items={items} /> : <TextSkeleton lines={4} />)}
        </Loaded>
      </Section>
      {found.data && ['decided', 'final', 'reported'].includes(found.data.stage) && <FinalDecisions found={found.data} />}
    </>
  );
}

function Decisions({ found, items }: { found: Case; items: Decision[] }) {
  const draft = items.find(({ state }) => state === 'draft');
  const signed = items.filter(({ state }) => state === 'signed');
  const mayWrite = found.actions.writeDecision;
  return (
    <>
      {signed.map((decision, index) => (
        <Signed key={decision.id} decision={decision} isNewest={index === 0} mayAmend={index === 0 && mayWrite && !draft} />
      ))}
      {draft && mayWrite && <DecisionDraft key={draft.id} draft={draft} found={found} />}
      {!draft && signed.length === 0 && (mayWrite ? <Begin caseId={found.id} /> : <p className="label-text">{WAITING[found.stage] ?? 'No decision yet.'}</p>)}
    </>
  );
}

const WAITING: Partial<Record<Case['stage'], string>> = {
  open: 'No decision yet: the case is not on a meeting’s agenda.',
  listed: 'No decision yet: the chair writes it at the meeting.',
};

function Signed({ decision, isNewest, mayAmend }: { decision: Decision; isNewest: boolean; mayAmend: boolean }) {
  const { id, signedAt, signedBy, content, chosenOptionTitle, kind, replacedByNumber } = decision;
  if (!isNewest)
    return (
      <p className="label-text">
        <Link to={paths.decision(id)}>{decisionName(decision)}</Link>, {formatDate(signedAt!)}
        {replacedByNumber !== null && `: replaced by number ${replacedByNumber}`}
      </p>
    );
  return (
    <div className={styles.signed} data-kind={kind}>
      <p className={styles.name}>
        <Link to={paths.decision(id)}>{decisionName(decision)}</Link>
        {kind === 'advice' && ' (the quorum was not met)'}
      </p>
      <p className={styles.chosen}>{chosenOptionTitle}</p>
      <p className={styles.words}>{content.text}</p>
      {content.conditions && <p className={styles.words}>Conditions: {content.conditions}</p>}
      {content.timing && <p className={styles.words}>Timing: {content.timing}</p>}
      <p className="label-text">
        Signed by {signedBy}, <time dateTime={signedAt!}>{formatDate(signedAt!)}</time>
        {content.dissent.length > 0 && `. Dissent of ${content.dissent.length} on record`}
      </p>
      {mayAmend && <Amend decision={decision} />}
    </div>
  );
}

function Amend({ decision }: { decision: Decision }) {
  const amend = useAmendDecision(decision.caseId);
  return (
    <Confirm
      title={`Amend ${decisionName(decision).toLowerCase()}`}
      confirmWord="Begin amendment"
      reason={{ label: 'Reason of the amendment', hint: 'Stands in the new version for all to read.', maxLength: 2000 }}
      onConfirm={(reason) => amend.mutateAsync({ id: decision.id, reason })}
      trigger={<Button variant="soft">Amend</Button>}
    >
      The signed version stays as it is. A new version begins with its text; once signed it replaces this one.
    </Confirm>
  );
}

function Begin({ caseId }: { caseId: string }) {
  const begin = useBeginDecision(caseId);
  return (
    <>
      <p className="label-text">No decision yet. It is written once the meeting has begun, and signed after the second round is closed.</p>
      <FormProblem error={begin.error} />
      <Button loading={begin.isPending} onClick={() => begin.mutate()}>
        Write the decision
      </Button>
    </>
  );
}
