import { Button } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { paths } from '@/app/paths';
import { Page } from '@/components/page';
import { Loaded, TextSkeleton } from '@/components/page-states';
import { decisionQuery } from '@/features/decisions/api/get-decision';
import { type Decision, decisionsOfCaseQuery } from '@/features/decisions/api/list-decisions-of-case';
import { CheckRecord } from '@/features/decisions/components/check-record';
import { Resolution } from '@/features/decisions/components/resolution';
import { decisionName } from '@/features/decisions/present';
import styles from '@/features/decisions/components/decisions.module.css';

export function Component() {
  const { id = '' } = useParams();
  const query = useQuery(decisionQuery(id));
  const title = query.data ? `${decisionName(query.data)} on ${query.data.caseCode}` : 'Decision';
  return (
    <Page title={title}>
      <Loaded query={query} skeleton={<TextSkeleton lines={12} />} what="decision">
        {(decision) => <DecisionPage decision={decision} />}
      </Loaded>
    </Page>
  );
}

function DecisionPage({ decision }: { decision: Decision }) {
  const { data: versions } = useQuery(decisionsOfCaseQuery(decision.caseId));
  const named = (number: number | null) => {
    const found = number === null ? undefined : versions?.items.find((other) => other.number === number);
    return found ? { id: found.id, number: found.number! } : null;
  };
  return (
    <>
      <Resolution decision={decision} replacedBy={named(decision.replacedByNumber)} replaces={named(decision.replacesNumber)} />
      <div className={`${styles.tools} print-hidden`}>
        {decision.state === 'signed' ? (
          <>
            <Button variant="soft" onClick={() => print()}>
              Print
            </Button>
            <CheckRecord id={decision.id} />
          </>
        ) : (
          <Link to={paths.case(decision.caseId)}>Go on writing it at the case</Link>
        )}
      </div>
    </>
  );
}
