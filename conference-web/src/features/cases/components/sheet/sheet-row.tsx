import { SECTION_WORDS, SECTIONS, type Section } from '@kerfside/calc/vocabulary/case.js';
import { createContext, type ReactNode, useContext } from 'react';
import { Margin } from '@/features/discussions/components/margin';
import { sectionId } from '../edit/go-to-place';
import styles from './sheet.module.css';

/** The case whose margins are drawn; null where there are none to draw, as in print. */
export const SheetCase = createContext<string | null>(null);

interface SheetRowProps {
  anchorKind: 'case' | 'section' | 'step' | 'image';
  anchorRef?: string;
  /** What a remark here is about, in words. */
  about?: string;
  children: ReactNode;
}

/** A piece of the sheet, with what colleagues say beside it; on a phone below it. */
export function SheetRow({ anchorKind, anchorRef, about, children }: SheetRowProps) {
  const caseId = useContext(SheetCase);
  const name = about ?? (anchorKind === 'section' ? SECTION_WORDS[anchorRef as Section].toLowerCase() : 'the whole case');
  return (
    <div className={styles.row}>
      <div className={styles.sheet}>{children}</div>
      <div className={styles.margin} data-margin-slot>
        <div data-about={name}>{caseId && <Margin {...{ caseId, anchorKind, anchorRef, about }} />}</div>
      </div>
    </div>
  );
}

interface SheetSectionProps {
  section: Section;
  children: ReactNode;
  /** Rows of their own after the section's first: steps, images. */
  rows?: ReactNode;
}

/** A numbered section, its text beside its margin. */
export function SheetSection({ section, children, rows }: SheetSectionProps) {
  const id = sectionId(section);
  return (
    <section id={id} aria-labelledby={`${id}-title`} tabIndex={-1} className={styles.section}>
      <SheetRow anchorKind="section" anchorRef={section}>
        <h2 id={`${id}-title`}>
          <span className={styles.number}>{SECTIONS.indexOf(section) + 1}</span>
          {SECTION_WORDS[section]}
        </h2>
        {children}
      </SheetRow>
      {rows}
    </section>
  );
}
