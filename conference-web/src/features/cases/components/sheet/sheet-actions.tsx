import { Button } from '@radix-ui/themes';
import { Link, useNavigate } from 'react-router-dom';
import { paths } from '@/app/paths';
import { Confirm } from '@/components/confirm';
import type { Schemas } from '@/lib/api/types';
import { useReleaseCase, useReturnCase, useWithdrawCase } from '../../api/move-case';
import { sectionId } from '../edit/go-to-place';
import { PostDialog } from '../post-dialog';

type Found = Schemas['CaseDto'];

/** Where the options are rated, on the same page. */
export const RATINGS_ID = 'ratings';

/** What the reader can do with the case now; each button says what happens. */
export function SheetActions({ found }: { found: Found }) {
  const { actions } = found;
  const navigate = useNavigate();
  const goToForm = (section: string) => void navigate(`${paths.editCase(found.id)}#${sectionId(section)}`);
  return (
    <>
      {actions.rate && (
        <Button asChild variant="soft">
          <a href={`#${RATINGS_ID}`}>Rate options</a>
        </Button>
      )}
      {actions.edit && (
        <Button asChild variant="soft">
          <Link to={paths.editCase(found.id)}>Edit</Link>
        </Button>
      )}
      {actions.post && <PostDialog caseId={found.id} trigger={<Button>Post case</Button>} versionToPost={async () => found.version} onGoTo={goToForm} />}
      {actions.writeOutcome && (
        <Button asChild variant="soft">
          <Link to={paths.caseOutcome(found.id)}>{found.stage === 'reported' ? 'Amend outcome' : 'Report outcome'}</Link>
        </Button>
      )}
      <Button asChild variant="soft" color="gray">
        <Link to={paths.caseHistory(found.id)}>History</Link>
      </Button>
      {actions.withdraw && <Withdraw found={found} />}
    </>
  );
}

export function CheckActions({ found }: { found: Found }) {
  const navigate = useNavigate();
  const release = useReleaseCase(found.id);
  const giveBack = useReturnCase(found.id);
  return (
    <>
      <Confirm
        trigger={<Button>Release case</Button>}
        title={`Release ${found.code}`}
        confirmWord="Release case"
        onConfirm={() => release.mutateAsync(found.version)}
      >
        You have read all text and looked at each image, also for what is burned into it, and found no identifier. All members of {found.conferenceName}{' '}
        then see the case, and the first round of ratings opens.
      </Confirm>
      <Confirm
        trigger={<Button variant="soft">Return with remark</Button>}
        title={`Return ${found.code}`}
        confirmWord="Return case"
        reason={{ label: 'What is to be mended', hint: 'The presenter reads this. Name the section; do not repeat the identifier itself.', maxLength: 4000 }}
        onConfirm={async (remark) => {
          await giveBack.mutateAsync(remark);
          void navigate(paths.cases);
        }}
      >
        The case goes back to its presenter as a draft. You will not see it until it is posted again.
      </Confirm>
    </>
  );
}

function Withdraw({ found }: { found: Found }) {
  const withdraw = useWithdrawCase(found.id);
  return (
    <Confirm
      trigger={
        <Button variant="soft" color="gray">
          Withdraw
        </Button>
      }
      title={`Withdraw ${found.code}`}
      confirmWord="Withdraw case"
      tone="grave"
      reason={{ label: 'Reason', maxLength: 2000 }}
      onConfirm={(reason) => withdraw.mutateAsync(reason)}
    >
      It goes no further, comes off any agenda, and its images are deleted when their retention is over. This can not be taken back.
    </Confirm>
  );
}
