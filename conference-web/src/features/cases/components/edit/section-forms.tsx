import { SECTION_WORDS, SECTIONS, type Section, type Side } from '@kerfside/calc/vocabulary/case.js';
import type { CaseContent, ContentSection, ImplantPart } from '@kerfside/calc/vocabulary/case-content.js';
import { memo, type ReactNode } from 'react';
import type { FieldError } from '@/lib/api/problem';
import type { CaseDraft } from '../../draft/case-draft';
import { bindSection } from '../../form/binding';
import { BoneForm } from '../../form/bone-form';
import { HeadingForm } from '../../form/heading-form';
import { HistoryForm } from '../../form/history-form';
import { ImplantsForm } from '../../form/implants-form';
import { InfectionForm } from '../../form/infection-form';
import { OptionsForm } from '../../form/options-form';
import { PatientForm } from '../../form/patient-form';
import { PlanForm } from '../../form/plan-form';
import { sectionId } from './go-to-place';
import styles from './edit-case.module.css';

/** A numbered section of the form, as it is numbered on the sheet. */
export function EditSection({ section, children }: { section: Section; children: ReactNode }) {
  const id = sectionId(section);
  return (
    <section id={id} tabIndex={-1} aria-labelledby={`${id}-title`} className={styles.section}>
      <h2 id={`${id}-title`}>
        <span className={styles.number}>{SECTIONS.indexOf(section) + 1}</span>
        {SECTION_WORDS[section]}
      </h2>
      {children}
    </section>
  );
}

interface SectionFormProps {
  section: ContentSection;
  draft: CaseDraft;
  value: CaseContent[ContentSection];
  refusals: FieldError[];
  disabled?: boolean;
  /** What other sections say that this one needs. */
  side: Side | null;
  isHip: boolean;
  parts?: ImplantPart[];
}

const NONE: ImplantPart[] = [];

/** The fields of one section. Drawn again only when this section changes, not at each letter of another. */
export const SectionForm = memo(function SectionForm({ section, draft, value, refusals, disabled, side, isHip, parts = NONE }: SectionFormProps) {
  const bind = <S extends ContentSection>(of: S) => bindSection(draft, of, value as CaseContent[S], refusals, disabled);
  switch (section) {
    case 'heading':
      return <HeadingForm of={bind('heading')} />;
    case 'patient':
      return <PatientForm of={bind('patient')} />;
    case 'history':
      return <HistoryForm of={bind('history')} />;
    case 'implants':
      return <ImplantsForm of={bind('implants')} />;
    case 'infection':
      return <InfectionForm of={bind('infection')} />;
    case 'bone':
      return <BoneForm of={bind('bone')} isHip={isHip} />;
    case 'plan':
      return <PlanForm of={bind('plan')} side={side} isHip={isHip} parts={parts} />;
    case 'options':
      return <OptionsForm of={bind('options')} />;
  }
});
