import { FIELD_WORDS, saysNothing, valueInWords } from '@kerfside/calc/cases/field-words.js';
import type { CaseContent, ContentSection } from '@kerfside/calc/vocabulary/case-content.js';
import type { ReactNode } from 'react';
import styles from './sheet.module.css';

/** Said where it matters that nobody knows; never left out in silence. */
export const NotKnown = ({ children = 'not known' }: { children?: string }) => <span className={styles.unknown}>{children}</span>;

interface KnownProps<S extends ContentSection> {
  of: CaseContent[S];
  section: S;
  name: keyof CaseContent[S] & string;
  none?: string;
}

/** A field of a section in words, or 'not known'. */
export function Known<S extends ContentSection>({ of, section, name, none }: KnownProps<S>): ReactNode {
  const words = FIELD_WORDS[section][name];
  const text = words && valueInWords(words, (of as Record<string, unknown>)[name]);
  return text ? <>{text}</> : <NotKnown>{none}</NotKnown>;
}

/** Text as it was typed, with its line breaks; nothing where there is none. */
export const Paragraphs = ({ text }: { text: string | undefined }) =>
  saysNothing(text) ? null : <p className={styles.text}>{text!.trim()}</p>;

/** `Function: walks with a stick.` */
export const Line = ({ name, children }: { name: string; children: ReactNode }) => (
  <p className={styles.line}>
    <span className={styles.name}>{name}</span> {children}
  </p>
);
