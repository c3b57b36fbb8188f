import { Button } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Caution } from '@/components/caution';
import { Loaded, TextSkeleton } from '@/components/page-states';
import { Section } from '@/components/section';
import { formatDate } from '@/lib/dates';
import { useHasKept } from '@/lib/use-kept';
import { type Round, roundsQuery } from '../api/get-rounds';
import { SMALLEST_PANEL } from '../figures-words';
import { OwnBallots } from './own-ballots';
import { PanelFigures } from './panel-figures';
import { RatingForm } from './rating-form';
import { Reasons } from './reasons';
import styles from './ratings.module.css';

/** The panel's ratings of a case: giving the own one, and what all gave. */
export function RatingPanel({ caseId }: { caseId: string }) {
  const query = useQuery(roundsQuery(caseId));
  return (
    <Section title="Ratings">
      <Loaded query={query} skeleton={<TextSkeleton lines={6} />} what="case">
        {({ rounds, mayRate }) => <Rounds {...{ caseId, rounds, mayRate }} />}
      </Loaded>
    </Section>
  );
}

function Rounds({ caseId, rounds, mayRate }: { caseId: string; rounds: Round[]; mayRate: boolean }) {
  const current = rounds.at(-1);
  if (!current) return <p className="label-text">The first round opens when the case is released to the conference.</p>;
  const mayRateNow = mayRate && current.state === 'open';
  return (
    <>
      <p role="status" className={styles.state}>
        {stateWords(current)}
      </p>
      <Blindness round={current} mayRate={mayRateNow} />
      <Body key={current.id} {...{ caseId, rounds, current, mayRateNow }} />
      {rounds.some(({ figures }) => figures !== null) && (
        <>
          <Reasons rounds={rounds} />
          <Footnote rounds={rounds} />
        </>
      )}
      {rounds.map((round) => (
        <OwnBallots key={round.id} round={round} />
      ))}
    </>
  );
}

function Body({ caseId, rounds, current, mayRateNow }: { caseId: string; rounds: Round[]; current: Round; mayRateNow: boolean }) {
  const [isChanging, setChanging] = useState(useHasKept(`rating:${current.id}`) && current.mine !== null);
  const stop = () => setChanging(false);
  if (mayRateNow && (!current.mine || isChanging))
    return <RatingForm caseId={caseId} round={current} rounds={rounds} onDone={stop} onCancel={current.mine ? stop : undefined} />;
  return (
    <>
      <PanelFigures rounds={rounds} numbering={current} />
      {mayRateNow && (
        <Button variant="soft" onClick={() => setChanging(true)} className="print-hidden">
          Change my rating
        </Button>
      )}
    </>
  );
}

function stateWords({ number, state, given, eligible, closedAt }: Round): string {
  const count = `${given} of ${eligible} have rated`;
  return state === 'open' ? `Round ${number} is open. ${count}.` : `Round ${number} was closed on ${formatDate(closedAt!)}. ${count}.`;
}

/** Why nothing is shown yet. */
function Blindness({ round, mayRate }: { round: Round; mayRate: boolean }) {
  if (round.figures !== null) return null;
  return (
    <p className="label-text">
      {mayRate
        ? 'What the others gave is shown when your own rating is in. Nobody sees yours before they have rated.'
        : 'What the panel gave is shown when this round is closed.'}
    </p>
  );
}

function Footnote({ rounds }: { rounds: Round[] }) {
  const isSmall = rounds.some(({ figures }) => figures !== null && figures.some(({ n }) => n > 0 && n < SMALLEST_PANEL));
  return (
    <>
      <p className="label-text">
        Dots are ratings, round 1 in outline and round 2 filled; the tall tick is the median, the bar goes from lowest to highest; the triangle is
        yours. 1 to 3 inappropriate, 4 to 6 uncertain, 7 to 9 appropriate (RAND/UCLA method).
        {isSmall && ` Fewer than ${SMALLEST_PANEL} ratings are given as counts, without a verdict.`}
      </p>
      <Caution />
    </>
  );
}
