import { SECTION_WORDS, SECTIONS, type Section } from '@kerfside/calc/vocabulary/case.js';
import { useEffect, useState } from 'react';
import type { Schemas } from '@/lib/api/types';
import { goToPlace, sectionId } from './go-to-place';
import styles from './edit-case.module.css';

type Items = Schemas['ReadinessItemDto'][];

/** The section that is being read: the last one whose head has passed the upper third of the window. */
function useSectionInView(): Section {
  const [current, setCurrent] = useState<Section>('heading');
  useEffect(() => {
    const look = () => {
      const passed = SECTIONS.filter((section) => (document.getElementById(sectionId(section))?.getBoundingClientRect().top ?? Infinity) < innerHeight / 3);
      setCurrent(passed.at(-1) ?? 'heading');
    };
    addEventListener('scroll', look, { passive: true });
    return () => removeEventListener('scroll', look);
  }, []);
  return current;
}

const missingWords = (items: Items, section: Section) => {
  const missing = items.filter((item) => item.section === section && !item.done);
  const blocks = missing.some(({ weight }) => weight === 'blocks-posting');
  return missing.length ? `${missing.length} missing${blocks ? ', blocks' : ''}` : '';
};

/** The sections one below the other, with what each still lacks; on a phone a choice. */
export function SectionNav({ items }: { items: Items }) {
  const current = useSectionInView();
  return (
    <nav aria-label="Sections" className={styles.nav}>
      <ol>
        {SECTIONS.map((section, index) => (
          <li key={section}>
            <button type="button" aria-current={section === current ? 'true' : undefined} onClick={() => goToPlace(section)}>
              <span className="tabular">{index + 1}</span>
              <span>
                {SECTION_WORDS[section]}
                <small>{missingWords(items, section)}</small>
              </span>
            </button>
          </li>
        ))}
      </ol>
      <label className={styles.jump}>
        <span className="visually-hidden">Go to section</span>
        <select value={current} onChange={(event) => goToPlace(event.target.value)}>
          {SECTIONS.map((section, index) => (
            <option key={section} value={section}>
              {index + 1} {SECTION_WORDS[section]} {missingWords(items, section) && `(${missingWords(items, section)})`}
            </option>
          ))}
        </select>
      </label>
    </nav>
  );
}
