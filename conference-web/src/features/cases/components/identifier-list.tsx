import { caseTexts } from '@kerfside/calc/cases/case-text.js';
import { SECTION_WORDS } from '@kerfside/calc/vocabulary/case.js';
import type { CaseContent } from '@kerfside/calc/vocabulary/case-content.js';
import type { Schemas } from '@/lib/api/types';
import { identifierRemedy, identifierWords, strengthWords } from '../identifier-words';
import styles from './lists.module.css';

type Finding = Schemas['IdentifierFindingDto'];

interface IdentifierListProps {
  findings: Finding[];
  content: CaseContent;
  onGoTo?: (finding: Finding) => void;
}

const AROUND = 40;

/** A finding in the words around it. */
function Excerpt({ finding, content }: { finding: Finding; content: CaseContent }) {
  const whole = caseTexts(content).find(({ section, path }) => section === finding.section && path === finding.path)?.text;
  // the text may have been changed since it was looked through
  const at = whole?.slice(finding.start, finding.end) === finding.text ? finding.start : -1;
  if (!whole || at < 0) return <mark>{finding.text}</mark>;
  const from = Math.max(0, at - AROUND);
  const to = Math.min(whole.length, finding.end + AROUND);
  return (
    <>
      {from > 0 && '…'}
      {whole.slice(from, at)}
      <mark>{finding.text}</mark>
      {whole.slice(finding.end, to)}
      {to < whole.length && '…'}
    </>
  );
}

/** What looks like an identifier, each with its field and its words. */
export function IdentifierList({ findings, content, onGoTo }: IdentifierListProps) {
  if (findings.length === 0) return <p className={styles.none}>The screening of the text found nothing. It can miss names and places, and it can not read images.</p>;
  return (
    <ul className={styles.findings}>
      {findings.map((finding) => {
        const name = `${SECTION_WORDS[finding.section]}, ${finding.label}`;
        return (
          <li key={`${finding.section} ${finding.path} ${finding.start} ${finding.kind}`} data-strength={finding.strength}>
            {onGoTo ? (
              <button type="button" className={styles.link} onClick={() => onGoTo(finding)}>
                {name}
              </button>
            ) : (
              <strong>{name}</strong>
            )}
            <span className={styles.excerpt}>
              <Excerpt finding={finding} content={content} />
            </span>
            <span className={styles.remedy}>
              This {strengthWords[finding.strength]} a {identifierWords(finding.kind)}. {identifierRemedy(finding.kind)}
            </span>
          </li>
        );
      })}
    </ul>
  );
}
