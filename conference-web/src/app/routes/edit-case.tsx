import { Button } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { paths } from '@/app/paths';
import { Page } from '@/components/page';
import { Loaded, NoPermission, TextSkeleton } from '@/components/page-states';
import { caseQuery } from '@/features/cases/api/get-case';
import { EditCase } from '@/features/cases/components/edit/edit-case';

export function Component() {
  const { id = '' } = useParams();
  const query = useQuery(caseQuery(id));
  return (
    <Page title={query.data ? `Edit ${query.data.code}` : 'Edit case'} heading={query.data ? `Edit ${query.data.code}` : 'Edit case'} width="wide">
      <Loaded query={query} skeleton={<TextSkeleton lines={12} />} what="case">
        {(found) =>
          found.actions.edit ? (
            <EditCase key={found.id} found={found} />
          ) : (
            <NoPermission
              action={
                <Button asChild variant="soft">
                  <Link to={paths.case(found.id)}>To the sheet</Link>
                </Button>
              }
            >
              The case can be changed by its presenter only, as a draft and while it is open or listed; not while it is being checked, and not after
              the decision.
            </NoPermission>
          )
        }
      </Loaded>
    </Page>
  );
}
