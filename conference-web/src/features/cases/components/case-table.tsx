import { JOINT_WORDS, SIDE_WORDS, URGENCY_WORDS, type Urgency } from '@kerfside/calc/vocabulary/case.js';
import { Link } from 'react-router-dom';
import { paths } from '@/app/paths';
import { type Column, DataTable, type Sorting } from '@/components/data-table';
import { StageWord } from '@/components/stage-word';
import type { Schemas } from '@/lib/api/types';
import { formatDate } from '@/lib/dates';
import { counted } from '@/lib/units';
import styles from './case-table.module.css';

type Item = Schemas['CaseListItemDto'];

function CaseLink({ item }: { item: Item }) {
  const to = item.stage === 'draft' && item.isMine ? paths.editCase(item.id) : paths.case(item.id);
  return (
    <>
      <span className={styles.code}>
        {item.code}
        <span className={styles.presenter}>{item.isMine ? 'You present it' : item.presenter.name}</span>
      </span>
      <Link to={to} className={styles.title} data-list-item>
        {item.title || 'Without a title'}
      </Link>
    </>
  );
}

/** What of the case waits for the reader; nothing where nothing does. */
function ForYou({ item }: { item: Item }) {
  return (
    <div className={styles['for-you']}>
      {item.awaitingMyRating && <span className={styles.due}>Your rating is due</span>}
      {item.unread > 0 && <span>{counted(item.unread, 'unread remark')}</span>}
      {item.openQuestions > 0 && <span>{counted(item.openQuestions, 'open question')}</span>}
    </div>
  );
}

const hasForYou = (item: Item) => item.awaitingMyRating || item.unread > 0 || item.openQuestions > 0;

const UrgencyWord = ({ urgency }: { urgency: Urgency }) =>
  urgency === 'urgent' ? <span className={styles.urgent}>▲ {URGENCY_WORDS[urgency]}</span> : <>{URGENCY_WORDS[urgency]}</>;

const jointAndSide = ({ side, joint }: Item) => (side ? `${SIDE_WORDS[side]} ${JOINT_WORDS[joint].toLowerCase()}` : JOINT_WORDS[joint]);

const columns: Column<Item>[] = [
  { key: 'case', head: 'Case', sort: 'code', cell: (item) => <CaseLink item={item} /> },
  { key: 'joint', head: 'Joint', nowrap: true, fold: 'inline', cell: jointAndSide },
  { key: 'stage', head: 'Stage', fold: 'inline', cell: (item) => <StageWord stage={item.stage} /> },
  { key: 'urgency', head: 'Urgency', sort: 'urgency', nowrap: true, fold: 'inline', cell: (item) => <UrgencyWord urgency={item.urgency} /> },
  { key: 'for-you', head: 'For you', nowrap: true, fold: 'bare', cell: (item) => (hasForYou(item) ? <ForYou item={item} /> : null) },
  { key: 'ratings', head: 'Ratings', align: 'right', cell: (item) => item.ratings },
  { key: 'meeting', head: 'Meeting', nowrap: true, cell: (item) => item.meetingAt && <time dateTime={item.meetingAt}>{formatDate(item.meetingAt)}</time> },
  {
    key: 'updated',
    head: 'Changed',
    sort: 'updated',
    nowrap: true,
    cell: (item) => <time dateTime={item.updatedAt}>{formatDate(item.updatedAt)}</time>,
  },
];

export function CaseTable({ items, sorting, onSort }: { items: Item[]; sorting: Sorting; onSort: (by: string) => void }) {
  return <DataTable caption="Cases" columns={columns} rows={items} rowKey={(item) => item.id} linked sorting={sorting} onSort={onSort} />;
}
