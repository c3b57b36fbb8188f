import { Button } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useParams } from 'react-router-dom';
import { paths } from '@/app/paths';
import { Caution } from '@/components/caution';
import { Page } from '@/components/page';
import { EmptyState, Loaded, NoPermission, TextSkeleton } from '@/components/page-states';
import { caseQuery } from '@/features/cases/api/get-case';
import { type Outcome, outcomesQuery } from '@/features/outcomes/api/list-outcomes';
import { OutcomeForm } from '@/features/outcomes/components/outcome-form';
import { OutcomeView } from '@/features/outcomes/components/outcome-view';
import type { Schemas } from '@/lib/api/types';
import { useHasKept } from '@/lib/use-kept';

export function Component() {
  const { id = '' } = useParams();
  const found = useQuery(caseQuery(id));
  const outcomes = useQuery(outcomesQuery(id));
  const code = found.data?.code;
  return (
    <Page title={code ? `Outcome of ${code}` : 'Outcome'} heading={code ? `Outcome of ${code}` : 'Outcome'} actions={<Link to={paths.case(id)}>Back to the case</Link>}>
      <Loaded query={found} skeleton={<TextSkeleton lines={10} />} what="case">
        {(data) => (
          <Loaded query={outcomes} skeleton={<TextSkeleton lines={10} />} what="case">
            {({ items }) => <Outcomes key={id} found={data} items={items} />}
          </Loaded>
        )}
      </Loaded>
    </Page>
  );
}

function Outcomes({ found, items }: { found: Schemas['CaseDto']; items: Outcome[] }) {
  const [isAmending, setAmending] = useState(useHasKept(`outcome:${found.id}`));
  const [newest, ...earlier] = items;
  const mayWrite = found.actions.writeOutcome;
  const stop = () => setAmending(false);
  if (mayWrite && (!newest || isAmending)) return <OutcomeForm {...{ found, newest }} onDone={stop} onCancel={newest ? stop : undefined} />;
  if (!newest) return <Nothing found={found} />;
  return (
    <>
      <OutcomeView found={found} outcome={newest} />
      <Caution>One operation proves little: read it with the case, and do not carry it over to another patient without thought.</Caution>
      {mayWrite && (
        <Button variant="soft" onClick={() => setAmending(true)}>
          Amend outcome
        </Button>
      )}
      {earlier.map((outcome) => (
        <details key={outcome.id}>
          <summary>Version {outcome.version}</summary>
          <OutcomeView found={found} outcome={outcome} />
        </details>
      ))}
    </>
  );
}

function Nothing({ found: { stage, treatingSurgeon } }: { found: Schemas['CaseDto'] }) {
  if (stage === 'final') return <NoPermission>{treatingSurgeon.name} reports the outcome after the operation.</NoPermission>;
  return <EmptyState title="No outcome yet">It is reported after the operation, once the final decision is recorded.</EmptyState>;
}
