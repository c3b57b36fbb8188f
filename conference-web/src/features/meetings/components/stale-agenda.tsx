import { Button, Flex } from '@radix-ui/themes';
import { agendaChanges } from '../agenda-draft';
import type { AgendaDraft } from '../use-agenda-draft';
import styles from './agenda.module.css';

/** Somebody else saved the agenda while I edited it: both are shown, and I say what becomes of them. */
export function StaleAgenda({ draft, nameOf }: { draft: AgendaDraft; nameOf: (caseId: string) => string }) {
  const lists: [string, string[]][] = [
    ['Saved by someone else', agendaChanges(draft.base, draft.saved, nameOf)],
    ['Yours, not saved', agendaChanges(draft.base, draft.entries, nameOf)],
  ];
  return (
    <div className={styles.stale} role="alert">
      <strong>The agenda was changed meanwhile. Nothing of either is lost.</strong>
      <div className={styles.both}>
        {lists.map(([title, changes]) => (
          <div key={title}>
            <h4>{title}</h4>
            <ul>
              {changes.map((line) => (
                <li key={line}>{line}</li>
              ))}
            </ul>
          </div>
        ))}
      </div>
      <Flex gap="3" wrap="wrap">
        <Button onClick={draft.putTogether}>Put both together</Button>
        <Button variant="soft" onClick={draft.keepMine}>
          Keep mine only
        </Button>
        <Button variant="soft" color="gray" onClick={draft.discard}>
          Take theirs only
        </Button>
      </Flex>
    </div>
  );
}
