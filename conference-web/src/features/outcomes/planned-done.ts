import { STEP_KIND } from '@kerfside/calc/vocabulary/case-content.js';
import type { Schemas } from '@/lib/api/types';
import { quantity } from '@/lib/units';
import type { Outcome } from './api/list-outcomes';

export interface PlannedDone {
  key: string;
  name: string;
  planned: string;
  done: string;
  /** Null where one of the two is not known. */
  differs: boolean | null;
}

type Content = Schemas['CaseDto']['content'];
const UNKNOWN = 'Not known';

/** The planned steps beside what was done for each. */
export function compareSteps(content: Pick<Content, 'plan'>, outcome: Outcome): PlannedDone[] {
  return (content.plan.steps ?? []).map((step, index) => {
    const done = outcome.steps.find(({ stepId }) => stepId === step.id);
    const asPlanned = done?.asPlanned ?? null;
    const otherwise = done?.method || 'Otherwise, not said how';
    return {
      key: step.id,
      name: `${index + 1}. ${STEP_KIND[step.kind]}`,
      planned: [step.method, step.tool].filter(Boolean).join('; '),
      done: asPlanned === null ? done?.method || UNKNOWN : asPlanned ? ['As planned', done?.method].filter(Boolean).join('; ') : otherwise,
      differs: asPlanned === null ? null : !asPlanned,
    };
  });
}

/** The figures of the plan beside those of the operation. */
export function compareFindings(content: Pick<Content, 'plan' | 'bone' | 'implants'>, outcome: Outcome): PlannedDone[] {
  const shell = content.implants.parts?.find(({ part }) => part === 'shell')?.outerDiameterMm ?? null;
  const mm = (value: number | null | undefined) => (value == null ? UNKNOWN : quantity(value, 'mm'));
  const row = <T>(key: string, name: string, planned: T | null | undefined, done: T | null, words: (value: T | null | undefined) => string): PlannedDone => ({
    key,
    name,
    planned: words(planned),
    done: words(done),
    differs: planned == null || done === null ? null : planned !== done,
  });
  return [
    row('removed', 'Shell taken out, outer diameter', shell, outcome.removedShellMm, mm),
    row('implanted', 'Shell put in, outer diameter', content.plan.expectedNextShellMm, outcome.implantedShellMm, mm),
    row<string>('defect', 'Defect class', content.bone.readersClass, outcome.defectFound, (value) => value ?? UNKNOWN),
  ];
}
