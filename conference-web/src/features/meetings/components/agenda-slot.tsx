import { URGENCY_WORDS } from '@kerfside/calc/vocabulary/case.js';
import { Link } from 'react-router-dom';
import { paths } from '@/app/paths';
import { quantity } from '@/lib/units';
import type { AgendaItem } from '../api/get-meeting';
import styles from './agenda.module.css';

const STATE_WORDS = { listed: null, decided: 'Decided', deferred: 'Deferred' } as const;

/** What the running order says of one case. */
export function SlotText({ item, minutes }: { item: AgendaItem; minutes?: number }) {
  const state = STATE_WORDS[item.state];
  return (
    <div className={styles.text}>
      <Link to={paths.case(item.caseId)} className={styles.title}>
        <span className={styles.code}>{item.code}</span> {item.title}
      </Link>
      <span className={styles.facts}>
        {minutes !== undefined && <span className={styles.minutes}>{quantity(minutes, 'minutes')}</span>}
        {state && <strong>{state}</strong>}
        {item.urgency !== 'routine' && <strong>{URGENCY_WORDS[item.urgency]}</strong>}
        <span>{item.presenter.name}</span>
      </span>
    </div>
  );
}
