import { SECTIONS } from '@kerfside/calc/vocabulary/case.js';

export const sectionId = (section: string): string => `section-${section}`;

/** The section that an address points at: `#section-plan`. */
export const sectionInAddress = (hash: string) => SECTIONS.find((section) => hash === `#${sectionId(section)}`);

/** Leads to a field (or to its section where the field is not there), and puts the cursor into it. */
export function goToPlace(section: string, path?: string): void {
  const field = path ? document.querySelector(`[data-place="${CSS.escape(`${section}.${path}`)}"]`) : null;
  const place = field ?? document.getElementById(sectionId(section));
  place?.scrollIntoView({ block: field ? 'center' : 'start' });
  const control = place?.querySelector<HTMLElement>('input:not([type=file]), textarea, select, button');
  (control ?? (place as HTMLElement | null))?.focus({ preventScroll: true });
}
