import type { CaseContent } from '../vocabulary/case-content.js';
import type { Section } from '../vocabulary/case.js';
import type { Projection } from '../vocabulary/images.js';
import { bonePoints, historyPoints, imagePoints, infectionPoints, questionPoints, patientPoints, textPoints } from './readiness-findings.js';
import { implantPoints } from './readiness-implants.js';
import { optionPoints, planPoints } from './readiness-plan.js';

export const READINESS_WEIGHTS = ['blocks-posting', 'blocks-listing', 'advice'] as const;
export type ReadinessWeight = (typeof READINESS_WEIGHTS)[number];

/** One thing that a case should have before it goes on. */
export interface ReadinessItem {
  /** Stays the same; the words may change. */
  id: string;
  section: Section;
  label: string;
  done: boolean;
  weight: ReadinessWeight;
  /** What to do where it is not done. */
  remedy: string;
}

export interface Readiness {
  items: ReadinessItem[];
  canBePosted: boolean;
  canBeListed: boolean;
}

/**
 * What is there, what is missing and what blocks, in the order of the sheet. An item asked only of some
 * cases (a reason for urgency, the diameter of a shell) is left out of the others. Common practice, no source.
 *
 * @param images the projections of the case's pictures
 */
export function caseReadiness(content: CaseContent, images: readonly Projection[]): Readiness {
  const items = [
    ...questionPoints(content),
    ...textPoints(content),
    ...patientPoints(content.patient),
    ...historyPoints(content.history),
    ...implantPoints(content),
    ...infectionPoints(content.infection),
    ...bonePoints(content),
    ...imagePoints(images),
    ...planPoints(content.plan),
    ...optionPoints(content.options.options ?? []),
  ];
  const blocks = (weights: ReadinessWeight[]) => items.some((item) => !item.done && weights.includes(item.weight));
  return { items, canBePosted: !blocks(['blocks-posting']), canBeListed: !blocks(['blocks-posting', 'blocks-listing']) };
}
