import { type CaseContent, SEX } from '@kerfside/calc/vocabulary/case-content.js';
import { saysNothing } from '@kerfside/calc/cases/field-words.js';
import { URGENCY_WORDS } from '@kerfside/calc/vocabulary/case.js';
import { Known, Line, NotKnown, Paragraphs } from './known';
import { SheetSection } from './sheet-row';
import styles from './sheet.module.css';

export function QuestionSection({ heading }: Pick<CaseContent, 'heading'>) {
  const { urgency, urgencyReason } = heading;
  return (
    <SheetSection section="heading">
      {saysNothing(heading.question) ? (
        <p>
          <NotKnown>No question has been put yet.</NotKnown>
        </p>
      ) : (
        <p className={styles.question}>{heading.question!.trim()}</p>
      )}
      {urgency && urgency !== 'routine' && (
        <Line name={URGENCY_WORDS[urgency]}>{saysNothing(urgencyReason) ? <NotKnown>no reason given</NotKnown> : urgencyReason}</Line>
      )}
    </SheetSection>
  );
}

export const ageWords = (years: number | null | undefined): string | null =>
  years === null || years === undefined ? null : years >= 90 ? '90 years or over' : `${years} years`;

export function PatientSection({ patient }: Pick<CaseContent, 'patient'>) {
  const { ageYears, sex, comorbidityNote, anticoagulationNote } = patient;
  const known = (name: keyof typeof patient & string, none?: string) => <Known of={patient} section="patient" name={name} none={none} />;
  return (
    <SheetSection section="patient">
      <p>
        {sex ? SEX[sex] : <NotKnown>Sex not known</NotKnown>}, {ageWords(ageYears) ?? <NotKnown>age not known</NotKnown>}, BMI {known('bmiBand')}, ASA
        class {known('asa')}.
      </p>
      <Line name="Comorbidities">
        {known('comorbidities', comorbidityNote ? 'none of the list' : undefined)}
        {comorbidityNote && `; ${comorbidityNote}`}
      </Line>
      <Line name="Allergies">
        metal: {known('metalAllergy')}; cement: {known('cementAllergy')}; antibiotics: {known('antibioticAllergy')}
      </Line>
      <Line name="Anticoagulation">
        {known('anticoagulation')}
        {anticoagulationNote && `; ${anticoagulationNote}`}
      </Line>
      <Line name="Function">{known('function')}</Line>
    </SheetSection>
  );
}

export function HistorySection({ history }: Pick<CaseContent, 'history'>) {
  const operations = history.operations ?? [];
  const known = (name: keyof typeof history & string) => <Known of={history} section="history" name={name} />;
  return (
    <SheetSection section="history">
      <Line name="Index diagnosis">
        {known('indexDiagnosis')}
      </Line>
      <Line name="Since the index operation">{known('indexInterval')}</Line>
      <Line name="Reason for revision">{known('reasons')}</Line>
      {operations.length > 0 ? (
        <>
          <p className={styles.name}>Earlier operations</p>
          <ol className={styles.operations}>
            {operations.map(({ id, interval, procedure }) => (
              <li key={id}>
                {interval || <NotKnown>when, not known</NotKnown>}: {procedure || <NotKnown>what, not known</NotKnown>}
              </li>
            ))}
          </ol>
        </>
      ) : (
        <Line name="Earlier operations">
          <NotKnown>none listed</NotKnown>
        </Line>
      )}
      <Paragraphs text={history.course} />
    </SheetSection>
  );
}
