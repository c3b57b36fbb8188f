import type { COMPLICATIONS } from '@kerfside/calc/vocabulary/outcomes.js';
import type { Schemas } from '@/lib/api/types';
import type { Outcome } from './api/list-outcomes';

export type Complication = keyof typeof COMPLICATIONS;

export interface StepDraft {
  done: '' | 'as-planned' | 'otherwise';
  method: string;
}

/** The form as it is typed: numbers as text until they are sent. */
export interface OutcomeDraft {
  steps: Record<string, StepDraft>;
  missingKit: string;
  minutes: string;
  bloodLoss: string;
  complications: Complication[];
  defectFound: string;
  removedShellMm: string;
  implantedShellMm: string;
  boneLostHours: number[];
  cultures: string;
  lesson: string;
  amendmentReason: string;
}

const textOf = (value: number | null | undefined) => (value == null ? '' : String(value));

/** Begins empty, or with what is reported already. */
export function draftOf(outcome: Outcome | undefined): OutcomeDraft {
  return {
    steps: Object.fromEntries(
      (outcome?.steps ?? []).map(({ stepId, method, asPlanned }) => [
        stepId,
        { done: asPlanned == null ? '' : asPlanned ? 'as-planned' : 'otherwise', method: method ?? '' } satisfies StepDraft,
      ]),
    ),
    missingKit: outcome?.missingKit ?? '',
    minutes: textOf(outcome?.minutes),
    bloodLoss: outcome?.bloodLoss ?? '',
    complications: (outcome?.complications ?? []) as Complication[],
    defectFound: outcome?.defectFound ?? '',
    removedShellMm: textOf(outcome?.removedShellMm),
    implantedShellMm: textOf(outcome?.implantedShellMm),
    boneLostHours: outcome?.boneLostHours ?? [],
    cultures: outcome?.cultures ?? '',
    lesson: outcome?.lesson ?? '',
    amendmentReason: '',
  };
}

/** 'None' stands alone: choosing it clears the others, and choosing another clears it. */
export function toggleComplication(chosen: readonly Complication[], name: Complication): Complication[] {
  if (chosen.includes(name)) return chosen.filter((other) => other !== name);
  return name === 'none' ? ['none'] : [...chosen.filter((other) => other !== 'none'), name];
}

const NUMBERS = {
  minutes: { low: 1, high: 1440, whole: true, message: 'Give whole minutes from 1 to 1440.' },
  removedShellMm: { low: 20, high: 100, whole: false, message: 'Give millimetres from 20 to 100.' },
  implantedShellMm: { low: 20, high: 100, whole: false, message: 'Give millimetres from 20 to 100.' },
} as const;

const read = (text: string) => (text.trim() === '' ? null : Number(text.replace(',', '.')));

/** Messages by field, for what the server would refuse. */
export function faultsOf(draft: OutcomeDraft, isAmendment: boolean): Record<string, string> {
  const faults: Record<string, string> = {};
  for (const [name, { low, high, whole, message }] of Object.entries(NUMBERS)) {
    const value = read(draft[name as keyof typeof NUMBERS]);
    if (value !== null && !(value >= low && value <= high && (!whole || Number.isInteger(value)))) faults[name] = message;
  }
  if (isAmendment && !draft.amendmentReason.trim()) faults['amendmentReason'] = 'Say why the reported outcome is amended.';
  return faults;
}

/** @param stepIds the steps that were planned, in their order */
export function toBody(draft: OutcomeDraft, stepIds: readonly string[]): Schemas['WriteOutcomeDto'] {
  return {
    steps: stepIds.map((stepId) => {
      const { done, method } = draft.steps[stepId] ?? { done: '', method: '' };
      return { stepId, method: method.trim(), asPlanned: done === '' ? null : done === 'as-planned' };
    }),
    missingKit: draft.missingKit.trim(),
    minutes: read(draft.minutes),
    bloodLoss: (draft.bloodLoss || null) as Schemas['WriteOutcomeDto']['bloodLoss'],
    complications: draft.complications,
    defectFound: (draft.defectFound || null) as Schemas['WriteOutcomeDto']['defectFound'],
    removedShellMm: read(draft.removedShellMm),
    implantedShellMm: read(draft.implantedShellMm),
    boneLostHours: draft.boneLostHours,
    cultures: draft.cultures.trim(),
    lesson: draft.lesson.trim(),
    ...(draft.amendmentReason.trim() ? { amendmentReason: draft.amendmentReason.trim() } : {}),
  };
}
