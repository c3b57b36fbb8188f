import { JOINT_WORDS, SIDE_WORDS, URGENCY_WORDS } from '@kerfside/calc/vocabulary/case.js';
import { Link } from 'react-router-dom';
import { paths } from '@/app/paths';
import { PersonLine } from '@/components/person-line';
import { StageWord } from '@/components/stage-word';
import type { Schemas } from '@/lib/api/types';
import { formatDate, formatDateTime } from '@/lib/dates';
import { contentOf } from '../../draft/use-case-draft';
import styles from './sheet.module.css';

type Found = Schemas['CaseDto'];

/** What the case is and where it stands, above the first section. */
export function SheetHead({ found }: { found: Found }) {
  const { heading } = contentOf(found);
  const joint = JOINT_WORDS[heading.joint ?? 'hip'].toLowerCase();
  const isSame = found.presenter.id === found.treatingSurgeon.id;
  return (
    <dl className={styles.head}>
      <div>
        <dt>Stage</dt>
        <dd>
          <StageWord stage={found.stage} />
        </dd>
      </div>
      <div>
        <dt>Joint</dt>
        <dd>{heading.side ? `${SIDE_WORDS[heading.side]} ${joint}` : `${JOINT_WORDS[heading.joint ?? 'hip']}, side not known`}</dd>
      </div>
      <div>
        <dt>Urgency</dt>
        <dd className={heading.urgency === 'urgent' ? styles.urgent : undefined}>
          {heading.urgency === 'urgent' && '▲ '}
          {heading.urgency ? URGENCY_WORDS[heading.urgency] : 'not said'}
        </dd>
      </div>
      <div>
        <dt>{isSame ? 'Presenter and treating surgeon' : 'Presenter'}</dt>
        <dd>
          <PersonLine person={found.presenter} />
        </dd>
      </div>
      {!isSame && (
        <div>
          <dt>Treating surgeon</dt>
          <dd>
            <PersonLine person={found.treatingSurgeon} />
          </dd>
        </div>
      )}
      <div>
        <dt>Conference</dt>
        <dd>
          {found.conferenceName}
          {found.meeting && (
            <>
              , <Link to={paths.meeting(found.meeting.id)}>meeting of {formatDate(found.meeting.startsAt)}</Link>
            </>
          )}
        </dd>
      </div>
      <div>
        <dt>Last changed</dt>
        <dd>
          <time dateTime={found.updatedAt}>{formatDateTime(found.updatedAt)}</time>, version {found.version}
        </dd>
      </div>
    </dl>
  );
}
