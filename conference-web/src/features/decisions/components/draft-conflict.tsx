import { Button, Flex } from '@radix-ui/themes';
import type { DecisionContent } from '../api/list-decisions-of-case';
import type { DraftConflict } from '../draft-saver';
import styles from './decisions.module.css';

interface NoticeProps {
  conflict: DraftConflict;
  mine: DecisionContent;
  options: { id: string; title: string }[];
  onSettle: (choice: 'mine' | 'theirs') => void;
}

/** Two people, or two windows, wrote the draft: both texts side by side, and the choice between them. */
export function DraftConflictNotice({ conflict: { theirs }, mine, options, onSettle }: NoticeProps) {
  const words = (content: DecisionContent): [string, string][] => [
    ['Option agreed', options.find(({ id }) => id === content.chosenOptionId)?.title ?? 'Not chosen'],
    ['Decision', content.text],
    ['Conditions', content.conditions],
    ['Timing', content.timing],
    ['Dissent', content.dissent.map((entry) => entry.words).join('\n')],
  ];
  const here = words(mine);
  const rows = words(theirs).flatMap(([name, text], index) => (text === here[index]![1] ? [] : [{ name, theirs: text, mine: here[index]![1] }]));
  return (
    <div role="alert" className={styles.conflict}>
      <p>
        <strong>This draft was saved in another window meanwhile.</strong> Nothing is lost: choose which to go on with.
      </p>
      <table>
        <thead>
          <tr>
            <th scope="col">Part</th>
            <th scope="col">Saved there</th>
            <th scope="col">Written here</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.name}>
              <th scope="row">{row.name}</th>
              <td>{row.theirs || 'empty'}</td>
              <td>{row.mine || 'empty'}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <Flex gap="3" wrap="wrap" mt="3">
        <Button type="button" variant="soft" onClick={() => onSettle('theirs')}>
          Take what is saved there
        </Button>
        <Button type="button" variant="soft" onClick={() => onSettle('mine')}>
          Keep what is written here
        </Button>
      </Flex>
    </div>
  );
}
