import { screenIdentifiers } from '../calc/identifiers/identifier-screen.js';
import { invalid } from '../common/problems/problem.js';

/** Refuses text beside a picture in which an identifier is certain. */
export function refuseIdentifiers(texts: { interval?: string; caption?: string }): void {
  for (const field of ['interval', 'caption'] as const) {
    const certain = screenIdentifiers({ text: texts[field] ?? '' }).findings.find((finding) => finding.strength === 'certain');
    if (certain) throw invalid(field, 'identifier', `'${certain.text}' looks like an identifier (${certain.kind}). Take it out.`);
  }
}
