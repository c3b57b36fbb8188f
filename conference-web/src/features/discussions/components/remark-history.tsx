import { Button, Dialog, Flex } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { RichText } from '@/components/editor/rich-text';
import { Loaded, TextSkeleton } from '@/components/page-states';
import { formatDateTime } from '@/lib/dates';
import type { Remark } from '../api/list-threads';
import { remarkVersionsQuery } from '../api/list-remark-versions';
import styles from './margin.module.css';

/** 'edited', which opens the earlier texts. */
export function RemarkHistory({ remark }: { remark: Remark }) {
  const [isOpen, setOpen] = useState(false);
  return (
    <Dialog.Root open={isOpen} onOpenChange={setOpen}>
      <Dialog.Trigger>
        <button type="button" className={styles.word}>
          edited
        </button>
      </Dialog.Trigger>
      <Dialog.Content maxWidth="640px" aria-describedby={undefined}>
        <Dialog.Title size="4">Texts of this remark</Dialog.Title>
        <Versions remark={remark} />
        <Flex justify="end" mt="4">
          <Dialog.Close>
            <Button variant="soft">Close</Button>
          </Dialog.Close>
        </Flex>
      </Dialog.Content>
    </Dialog.Root>
  );
}

function Versions({ remark }: { remark: Remark }) {
  const query = useQuery(remarkVersionsQuery(remark.id));
  return (
    <Loaded query={query} skeleton={<TextSkeleton lines={4} />} what="remark">
      {({ items }) => (
        <ol className={styles.versions}>
          {[...items]
            .sort((a, b) => b.version - a.version)
            .map(({ version, at, content }) => (
              <li key={version}>
                <p className="label-text">
                  {version === remark.version ? 'Now' : `Text ${version}`}, <time dateTime={at}>{formatDateTime(at)}</time>
                </p>
                <RichText content={content} />
              </li>
            ))}
        </ol>
      )}
    </Loaded>
  );
}
