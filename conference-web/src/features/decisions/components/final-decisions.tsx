import { FINAL_DECISION_WORDS } from '@kerfside/calc/vocabulary/decisions.js';
import { Button } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { paths } from '@/app/paths';
import { Loaded, TextSkeleton } from '@/components/page-states';
import { PersonLine } from '@/components/person-line';
import { Facts, Section } from '@/components/section';
import type { Schemas } from '@/lib/api/types';
import { formatDate, formatDateTime } from '@/lib/dates';
import { useHasKept } from '@/lib/use-kept';
import { type FinalDecision, finalDecisionsQuery } from '../api/list-final-decisions';
import { mondayOf } from '../planned-week';
import { FinalDecisionForm } from './final-decision-form';
import styles from './decisions.module.css';

/** What the treating surgeon will do, and what was said before. */
export function FinalDecisions({ found }: { found: Schemas['CaseDto'] }) {
  const query = useQuery(finalDecisionsQuery(found.id));
  return (
    <Section title="Final decision of the treating surgeon" actions={<OutcomeLink found={found} finals={query.data?.items ?? []} />}>
      <Loaded query={query} skeleton={<TextSkeleton lines={3} />} what="case">
        {({ items }) => <Finals found={found} items={items} />}
      </Loaded>
    </Section>
  );
}

function Finals({ found, items }: { found: Schemas['CaseDto']; items: FinalDecision[] }) {
  const [isChanging, setChanging] = useState(useHasKept(`final-decision:${found.id}`));
  const [newest, ...earlier] = items;
  const mayWrite = found.actions.writeFinalDecision;
  if (mayWrite && (!newest || isChanging))
    return (
      <>
        {newest && <FinalText decision={newest} />}
        <FinalDecisionForm caseId={found.id} isFirst={!newest} onDone={() => setChanging(false)} onCancel={newest ? () => setChanging(false) : undefined} />
      </>
    );
  return (
    <>
      {newest ? <FinalText decision={newest} /> : <p className="label-text">Not recorded yet. {found.treatingSurgeon.name} records it.</p>}
      {mayWrite && (
        <Button variant="soft" onClick={() => setChanging(true)}>
          Record a change
        </Button>
      )}
      {earlier.length > 0 && (
        <details className={styles.earlier}>
          <summary>Earlier versions: {earlier.length}</summary>
          {earlier.map((decision) => (
            <FinalText key={decision.id} decision={decision} />
          ))}
        </details>
      )}
    </>
  );
}

function FinalText({ decision }: { decision: FinalDecision }) {
  const { kind, reason, plannedWeek, patientInformed, by, at, version } = decision;
  return (
    <div className={styles.final}>
      <Facts
        facts={[
          ['What the surgeon will do', <strong key="kind">{FINAL_DECISION_WORDS[kind]}</strong>],
          ...(reason ? ([['Reason', <span key="reason" className={styles.words}>{reason}</span>]] as [string, React.ReactNode][]) : []),
          ...(kind === 'not-proceeding' ? [] : ([['Planned week', plannedWeek ? weekWords(plannedWeek) : 'Not known']] as [string, string][])),
          ['Patient informed', patientInformed === null ? 'Not known' : patientInformed ? 'Yes' : 'No'],
        ]}
      />
      <p className="label-text">
        Version {version}, <time dateTime={at}>{formatDateTime(at)}</time>, <PersonLine person={by} short />
      </p>
    </div>
  );
}

function weekWords(week: string): string {
  const monday = mondayOf(week);
  return monday ? `${week}, from ${formatDate(monday, 'UTC')}` : week;
}

function OutcomeLink({ found, finals }: { found: Schemas['CaseDto']; finals: FinalDecision[] }) {
  if (found.stage === 'reported') return <Link to={paths.caseOutcome(found.id)}>Outcome, planned beside done</Link>;
  if (!found.actions.writeOutcome || finals[0]?.kind === 'not-proceeding') return null;
  return (
    <Button asChild variant="soft">
      <Link to={paths.caseOutcome(found.id)}>Report outcome</Link>
    </Button>
  );
}
