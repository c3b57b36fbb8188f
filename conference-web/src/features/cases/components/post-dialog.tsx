import type { Section } from '@kerfside/calc/vocabulary/case.js';
import { Button, Dialog, Flex } from '@radix-ui/themes';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { type ReactNode, useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { paths } from '@/app/paths';
import { FormProblem } from '@/components/form-problem';
import { Loaded, TextSkeleton } from '@/components/page-states';
import { keys } from '@/lib/query-keys';
import { readinessQuery } from '../api/get-readiness';
import { usePostCase } from '../api/move-case';
import { ReadinessList, readinessWords } from './readiness-list';

interface PostDialogProps {
  caseId: string;
  trigger: ReactNode;
  /** Saves what is written, and gives the version that is then posted; null where it can't be saved. */
  versionToPost: () => Promise<number | null>;
  onGoTo: (section: Section) => void;
}

/** Saves, shows what is ready and what is not, then posts. */
export function PostDialog({ caseId, trigger, versionToPost, onGoTo }: PostDialogProps) {
  const client = useQueryClient();
  const [isOpen, setOpen] = useState(false);
  const prepare = useMutation({
    mutationFn: async () => {
      const version = await versionToPost();
      await client.invalidateQueries({ queryKey: keys.cases.readiness(caseId) });
      return version;
    },
  });
  const change = (open: boolean) => {
    setOpen(open);
    if (open) prepare.mutate();
  };
  return (
    <Dialog.Root open={isOpen} onOpenChange={change}>
      <Dialog.Trigger>{trigger}</Dialog.Trigger>
      <Dialog.Content maxWidth="560px" aria-describedby={undefined}>
        <Dialog.Title size="4">Post case</Dialog.Title>
        <PostForm
          caseId={caseId}
          version={prepare.data ?? null}
          isPreparing={prepare.isPending}
          onGoTo={(section) => {
            setOpen(false);
            // once the dialog has given the focus back
            setTimeout(() => onGoTo(section));
          }}
        />
      </Dialog.Content>
    </Dialog.Root>
  );
}

interface PostFormProps extends Pick<PostDialogProps, 'caseId' | 'onGoTo'> {
  /** What is posted; null where what was written could not be saved. */
  version: number | null;
  isPreparing: boolean;
}

function PostForm({ caseId, version, isPreparing, onGoTo }: PostFormProps) {
  const navigate = useNavigate();
  const post = usePostCase(caseId, () => void navigate(paths.case(caseId)));
  const query = useQuery(readinessQuery(caseId));
  const isNotSaved = !isPreparing && version === null;
  const submit = () => {
    if (version !== null) post.mutate(version);
  };
  return (
    <>
      <FormProblem error={post.error} />
      {isNotSaved && <p role="alert">Not all that you wrote is saved. Close this and see what is said at the top of the form.</p>}
      <Loaded query={query} skeleton={<TextSkeleton lines={5} />} what="case">
        {(readiness) => (
          <>
            <p>{readinessWords(readiness)}</p>
            <ReadinessList readiness={readiness} onGoTo={onGoTo} />
            <p>
              A coordinator then looks for identifiers in text and images, and releases the case to the conference or returns it to you. Until then it
              can not be changed.
            </p>
            <Flex gap="3" justify="end" wrap="wrap" mt="4">
              <Dialog.Close>
                <Button variant="soft" color="gray">
                  Not yet
                </Button>
              </Dialog.Close>
              <Button loading={post.isPending || isPreparing} disabled={post.isPending || isPreparing || !readiness.canBePosted || isNotSaved} onClick={submit}>
                Post case
              </Button>
            </Flex>
          </>
        )}
      </Loaded>
    </>
  );
}
