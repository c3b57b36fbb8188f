import { useQuery } from '@tanstack/react-query';
import { Button } from '@radix-ui/themes';
import { Link, useParams } from 'react-router-dom';
import { paths } from '@/app/paths';
import { Page } from '@/components/page';
import { caseQuery } from '@/features/cases/api/get-case';
import { CaseHistory } from '@/features/cases/components/history/case-history';

export function Component() {
  const { id = '' } = useParams();
  const { data: found } = useQuery(caseQuery(id));
  const title = found ? `History of ${found.code}` : 'History';
  const back = (
    <Button asChild variant="soft" color="gray">
      <Link to={paths.case(id)}>Sheet</Link>
    </Button>
  );
  return (
    <Page title={title} heading={title} actions={back}>
      <CaseHistory caseId={id} />
    </Page>
  );
}
