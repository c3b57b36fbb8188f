import type { CaseContent, ContentSection, Patient } from '../vocabulary/case-content.js';
import { FIELD_WORDS, type FieldWords, OLDEST_AGE_YEARS } from './field-words.js';

/** A section as it is kept: ages of 90 and over as one group, absent fields left out. */
export function keptSection<S extends ContentSection>(section: S, value: CaseContent[S]): CaseContent[S] {
  // a plain copy: instances of the request's classes would keep undefined fields
  const copy = JSON.parse(JSON.stringify(value)) as CaseContent[S];
  if (section === 'patient') {
    const patient = copy as Patient;
    if (typeof patient.ageYears === 'number' && patient.ageYears > OLDEST_AGE_YEARS) patient.ageYears = OLDEST_AGE_YEARS;
  }
  return copy;
}

/** Where an id (of the rim: an hour) is there a second time in its list, for example `parts[1].screws[3].id`. */
export function repeatedKeys(section: ContentSection, value: object): string[] {
  return repeatedIn(FIELD_WORDS[section], value as Record<string, unknown>, '');
}

function repeatedIn(fields: Record<string, FieldWords>, holder: Record<string, unknown>, prefix: string): string[] {
  return Object.entries(fields).flatMap(([name, field]) => {
    const items = holder[name];
    if (field.kind !== 'list' || !Array.isArray(items)) return [];
    const seen = new Set<unknown>();
    return (items as Record<string, unknown>[]).flatMap((item, index) => {
      const at = `${prefix}${name}[${index}]`;
      const key = item[field.item.key];
      const repeated = seen.has(key) ? [`${at}.${field.item.key}`] : [];
      seen.add(key);
      return [...repeated, ...repeatedIn(field.item.fields, item, `${at}.`)];
    });
  });
}
