import { STAGE_WORDS, type Stage } from '@kerfside/calc/vocabulary/case.js';

// how far round the ring a case has come, in sixths; the word says it, the ring only backs it up
const SIXTHS: Record<Stage, number> = { draft: 0, checking: 1, open: 2, listed: 3, decided: 4, final: 5, reported: 6, withdrawn: 0 };
const ROUND = 2 * Math.PI * 5;

/** A case's stage in its word, with a ring that fills as the case goes on. */
export function StageWord({ stage }: { stage: Stage }) {
  const done = (SIXTHS[stage] / 6) * ROUND;
  return (
    <span style={{ whiteSpace: 'nowrap' }}>
      <svg width="14" height="14" viewBox="0 0 14 14" aria-hidden="true" style={{ verticalAlign: '-2px', marginRight: 6 }}>
        <circle cx="7" cy="7" r="5" fill="none" stroke="var(--gray-9)" strokeWidth="1" strokeDasharray={stage === 'draft' ? '2 2' : undefined} />
        {done > 0 && (
          <circle cx="7" cy="7" r="5" fill="none" stroke="var(--cut)" strokeWidth="3" strokeDasharray={`${done} ${ROUND}`} transform="rotate(-90 7 7)" />
        )}
        {stage === 'withdrawn' && <path d="M2 12 12 2" stroke="var(--gray-11)" strokeWidth="1.5" />}
      </svg>
      {STAGE_WORDS[stage]}
    </span>
  );
}
