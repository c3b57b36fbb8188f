import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { Page } from '@/components/page';
import { Loaded, TextSkeleton } from '@/components/page-states';
import { caseQuery } from '@/features/cases/api/get-case';
import { CaseSheet } from '@/features/cases/components/case-sheet';
import { SheetActions } from '@/features/cases/components/sheet/sheet-actions';

export function Component() {
  const { id = '' } = useParams();
  const query = useQuery(caseQuery(id));
  const found = query.data;
  const heading = found && (
    <>
      <span className="label-text">{found.code}</span> {found.content.heading.title || 'Without a title'}
    </>
  );
  return (
    <Page title={found?.code ?? 'Case'} heading={heading} actions={found && <SheetActions found={found} />} width="wide">
      <Loaded query={query} skeleton={<TextSkeleton lines={14} />} what="case">
        {(data) => <CaseSheet found={data} />}
      </Loaded>
    </Page>
  );
}
