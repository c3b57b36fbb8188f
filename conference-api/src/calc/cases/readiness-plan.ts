import type { CaseOption, PlanStep, RemovalPlan } from '../vocabulary/case-content.js';
import { STEP_KIND } from '../vocabulary/case-content.js';
import { saysNothing } from './field-words.js';
import type { ReadinessItem } from './readiness.js';

const said = (value: unknown) => !saysNothing(value);

/** The removal in the trade's own order. Common practice, no source. */
export const TRADE_ORDER = ['exposure', 'liner', 'screws', 'interface', 'extraction', 'bone-inventory', 'reconstruction'] as const satisfies PlanStep['kind'][];

/** The first step that stands before one it should follow; null where the order is the trade's. */
export function firstOutOfOrder(steps: readonly PlanStep[]): { step: PlanStep; before: PlanStep } | null {
  const place = (step: PlanStep) => (TRADE_ORDER as readonly string[]).indexOf(step.kind);
  let last: PlanStep | null = null;
  for (const step of steps) {
    if (place(step) < 0) continue;
    if (last && place(step) < place(last)) return { step, before: last };
    last = step;
  }
  return null;
}

export function planPoints(plan: RemovalPlan): ReadinessItem[] {
  const section = 'plan' as const;
  const steps = plan.steps ?? [];
  const has = (kind: PlanStep['kind']) => steps.some((step) => step.kind === kind && said(step.method));
  const astray = firstOutOfOrder(steps);
  const bare = steps.filter((step) => !said(step.fallback));
  return [
    {
      id: 'plan-steps',
      section,
      label: 'Removal plan from exposure to extraction',
      done: has('exposure') && has('extraction'),
      weight: 'blocks-listing',
      remedy: 'Write at least how you expose and how you take the part out, each with its method.',
    },
    {
      id: 'plan-order',
      section,
      label: 'Steps in the usual order',
      done: steps.length > 0 && !astray,
      weight: 'advice',
      remedy: astray
        ? `${STEP_KIND[astray.step.kind]} stands after ${STEP_KIND[astray.before.kind].toLowerCase()}: move it, or say in its method why.`
        : 'The usual order: exposure, liner, screws, interface, extraction, bone inventory, reconstruction.',
    },
    {
      id: 'plan-fallbacks',
      section,
      label: 'A fallback for each step',
      done: steps.length > 0 && bare.length === 0,
      weight: 'advice',
      remedy: 'Say what you do where a step fails.',
    },
    { id: 'kit', section, label: 'The kit list', done: said(plan.kit), weight: 'advice', remedy: 'List the tools and say whether they are in stock or on loan.' },
    {
      id: 'reconstruction',
      section,
      label: 'Reconstruction intended',
      done: said(plan.reconstruction),
      weight: 'advice',
      remedy: 'Say what goes in afterwards, and what if more bone is lost than expected.',
    },
  ];
}

export function optionPoints(options: readonly CaseOption[]): ReadinessItem[] {
  const titles = options.map(({ title }) => title.trim().toLowerCase());
  return [
    {
      id: 'options',
      section: 'options',
      label: 'Two to six options, each with a title of its own',
      done: options.length >= 2 && options.length <= 6 && titles.every(Boolean) && new Set(titles).size === titles.length,
      weight: 'blocks-posting',
      remedy: 'Give the panel two to six options to rate, each with its own title.',
    },
    {
      id: 'proposal',
      section: 'options',
      label: 'Your own proposal among them',
      done: options.filter(({ isProposal }) => isProposal === true).length === 1,
      weight: 'blocks-posting',
      remedy: 'Mark exactly one option as your own proposal.',
    },
  ];
}
