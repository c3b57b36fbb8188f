import { useRef } from 'react';
import type { Schemas } from '@/lib/api/types';
import { DecisionPanel } from '@/features/decisions/components/decision-panel';
import { RatingPanel } from '@/features/ratings/components/rating-panel';
import { contentOf } from '../draft/use-case-draft';
import { BoneSection } from './sheet/bone-section';
import { CheckEnd, CheckView } from './sheet/check-view';
import { ImagesSection } from './sheet/images-section';
import { ImplantsSection } from './sheet/implants-section';
import { InfectionSection } from './sheet/infection-section';
import { OptionsSection } from './sheet/options-section';
import { PlanSection } from './sheet/plan-section';
import { RATINGS_ID } from './sheet/sheet-actions';
import { SheetHead } from './sheet/sheet-head';
import { SheetCase, SheetRow } from './sheet/sheet-row';
import { HistorySection, PatientSection, QuestionSection } from './sheet/text-sections';
import { useMarginFlow } from './sheet/use-margin-flow';
import styles from './sheet/sheet.module.css';

const DISCUSSED = ['open', 'listed', 'decided', 'final', 'reported', 'withdrawn'];

/** The case as one text, with the margin beside it. */
export function CaseSheet({ found }: { found: Schemas['CaseDto'] }) {
  const sheet = useRef<HTMLDivElement>(null);
  useMarginFlow(sheet);
  const { heading, patient, history, implants, infection, bone, plan, options } = contentOf(found);
  const isHip = heading.joint !== 'knee';
  const side = heading.side ?? null;
  const isDiscussed = DISCUSSED.includes(found.stage) && found.releasedAt !== null;
  return (
    <SheetCase value={isDiscussed ? found.id : null}>
      <div ref={sheet} className={styles.page} data-alone={isDiscussed ? undefined : ''}>
        <SheetRow anchorKind="case">
          <SheetHead found={found} />
          {found.returnRemark && (
            <div className={styles.note}>
              <strong>Returned by the coordinator</strong>
              <p className={styles.text}>{found.returnRemark}</p>
            </div>
          )}
          {found.withdrawnReason && (
            <div className={styles.note}>
              <strong>Withdrawn</strong>
              <p className={styles.text}>{found.withdrawnReason}</p>
            </div>
          )}
          {found.actions.check && <CheckView found={found} />}
        </SheetRow>
        <QuestionSection heading={heading} />
        <PatientSection patient={patient} />
        <HistorySection history={history} />
        <ImplantsSection implants={implants} />
        <InfectionSection infection={infection} />
        <BoneSection bone={bone} isHip={isHip} />
        <ImagesSection caseId={found.id} images={found.images} areLarge={found.stage === 'checking'} />
        <PlanSection {...{ plan, implants, side, isHip }} />
        <OptionsSection options={options} />
        {found.actions.check && <CheckEnd found={found} />}
        {isDiscussed && (
          <div id={RATINGS_ID} className={styles.panels}>
            <RatingPanel caseId={found.id} />
            <DecisionPanel caseId={found.id} />
          </div>
        )}
      </div>
    </SheetCase>
  );
}
