import { Link } from 'react-router-dom';
import { paths } from '@/app/paths';
import { Caution } from '@/components/caution';
import { formatDateTimeWithZone, localZone } from '@/lib/dates';
import type { Decision } from '../api/list-decisions-of-case';
import { decisionName, grouped } from '../present';
import { ResolutionFigures } from './resolution-figures';
import { Dissent, Present } from './resolution-people';
import styles from './resolution.module.css';

interface ResolutionProps {
  decision: Decision;
  /** Name of the decision that came in its place, linked where its id is known. */
  replacedBy?: { id: string; number: number } | null;
  replaces?: { id: string; number: number } | null;
}

/** A decision set like a printed resolution. An advice (no quorum) is framed differently and says so. */
export function Resolution({ decision, replacedBy, replaces }: ResolutionProps) {
  const { content, kind, chosenOptionTitle } = decision;
  return (
    <article className={styles.paper} data-kind={kind} data-state={decision.state} aria-label={decisionName(decision)}>
      <header className={styles.head}>
        <p className={styles.conference}>{decision.conferenceName}</p>
        <h1 className={styles.title}>{decisionName(decision)}</h1>
        <p className={styles.facts}>
          on case <Link to={paths.case(decision.caseId)}>{decision.caseCode}</Link>
          {decision.meetingAt && <>, at the meeting of {formatDateTimeWithZone(decision.meetingAt, localZone())}</>}
        </p>
      </header>
      <Standing decision={decision} replacedBy={replacedBy} replaces={replaces} />
      <div className={styles.text}>
        {chosenOptionTitle ? <p className={styles.chosen}>{chosenOptionTitle}</p> : <p className={styles.none}>No option chosen yet.</p>}
        <Words text={content.text} />
        <Named name="Conditions" text={content.conditions} />
        <Named name="Timing" text={content.timing} />
      </div>
      <Present decision={decision} />
      <ResolutionFigures decision={decision} />
      <Dissent decision={decision} />
      <Signature decision={decision} />
      <Caution />
    </article>
  );
}

const Words = ({ text }: { text: string }) => (text ? <p className={styles.words}>{text}</p> : null);

const Named = ({ name, text }: { name: string; text: string }) =>
  text ? (
    <p className={styles.words}>
      <strong>{name}.</strong> {text}
    </p>
  ) : null;

/** What it is not, what it replaces, and what came in its place. */
function Standing({ decision, replacedBy, replaces }: ResolutionProps) {
  const { kind, quorumMissing, amendmentReason, replacesNumber, replacedByNumber, version } = decision;
  return (
    <>
      {replacedByNumber !== null && (
        <p className={styles.notice} role="note">
          <strong>No longer in force.</strong> Replaced by{' '}
          {replacedBy ? <Link to={paths.decision(replacedBy.id)}>number {replacedByNumber}</Link> : `number ${replacedByNumber}`}.
        </p>
      )}
      {kind === 'advice' && (
        <p className={styles.notice} role="note">
          <strong>An advice, not a decision of the conference:</strong> the quorum was not met
          {quorumMissing.length > 0 && ` (lacking ${quorumMissing.join('; ')})`}.
        </p>
      )}
      {amendmentReason !== null && (
        <p className={styles.notice} role="note">
          <strong>Version {version}, an amendment</strong>
          {replacesNumber !== null && (
            <>
              {' '}
              of {replaces ? <Link to={paths.decision(replaces.id)}>number {replacesNumber}</Link> : `number ${replacesNumber}`}, which it replaces
            </>
          )}
          . Reason: {amendmentReason}
        </p>
      )}
    </>
  );
}

function Signature({ decision }: { decision: Decision }) {
  const { signedBy, signedAt, hash, previousHash } = decision;
  if (signedAt === null || hash === null)
    return <p className={styles.unsigned}>Draft: not signed, and not in force.</p>;
  return (
    <footer className={styles.signature}>
      <p className={styles.line}>
        <span className={styles.name}>{signedBy}</span>
        <span>
          signed for the conference, <time dateTime={signedAt}>{formatDateTimeWithZone(signedAt, localZone())}</time>
        </span>
      </p>
      <dl className={styles.prints}>
        <dt>Fingerprint (SHA-256)</dt>
        <dd>{grouped(hash)}</dd>
        <dt>of the one before</dt>
        <dd>{previousHash === null ? 'none: the first of this conference' : grouped(previousHash)}</dd>
      </dl>
    </footer>
  );
}
