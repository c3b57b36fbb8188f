import type { CaseContent, ImplantPart, KitItem, PlanStep, RimSector, Screw } from '../../calc/vocabulary/case-content.js';
import type { AnchorKind, ThreadKind } from '../../calc/vocabulary/discussions.js';
import type { FinalDecisionKind } from '../../calc/vocabulary/decisions.js';
import type { OutcomeContent } from '../../calc/vocabulary/outcomes.js';

/** One thing said beside a case. */
export interface DemoRemark {
  by: string;
  text: string;
  anchor?: [AnchorKind, string];
  kind?: ThreadKind;
  replies?: { by: string; text: string; answers?: boolean }[];
}

/** What the panel gave: one figure for each option, by who gave it. */
export type DemoRatings = Record<string, number[]>;

export interface DemoCase {
  key: string;
  presenter: string;
  /** How far the story goes. */
  until: 'draft' | 'returned' | 'checking' | 'open' | 'listed' | 'decided' | 'final' | 'reported' | 'withdrawn';
  /** Which meeting decided it, or lists it: weeks from now, negative in the past. */
  meetingWeek?: number;
  minutes?: number;
  /** Keys of the drawn images that belong to it. */
  images: string[];
  content: CaseContent;
  talk?: DemoRemark[];
  first?: DemoRatings;
  second?: DemoRatings;
  decision?: { option: string; text: string; conditions: string; timing: string; dissent?: { by: string; words: string }[] };
  final?: { kind: FinalDecisionKind; reason?: string; informed?: boolean };
  outcome?: Partial<OutcomeContent>;
  withdrawnReason?: string;
  returnRemark?: string;
}

const numbered = <T>(prefix: string, items: T[]): (T & { id: string })[] => items.map((item, index) => ({ ...item, id: `${prefix}-${index + 1}` }));

export const parts = (...items: Omit<ImplantPart, 'id'>[]): ImplantPart[] => numbered('part', items);
export const screws = (...items: Omit<Screw, 'id'>[]): Screw[] => numbered('screw', items);
export const kit = (...items: Omit<KitItem, 'id'>[]): KitItem[] => numbered('kit', items);

/** kind, method, tool, fallback, hazard */
export const steps = (...rows: [PlanStep['kind'], string, string?, string?, string?][]): PlanStep[] =>
  numbered(
    'step',
    rows.map(([kind, method, tool, fallback, hazard]) => ({ kind, method, tool: tool ?? '', fallback: fallback ?? '', hazard: hazard ?? '', who: '' })),
  );

/** The twelve sectors with the order in which they are cut; the slow ones are named. */
export const rim = (order: number[], slow: number[], free: number[] = []): RimSector[] =>
  Array.from({ length: 12 }, (_, index) => index + 1).map((hour) => ({
    hour,
    state: free.includes(hour) ? 'free' : slow.includes(hour) ? 'slow' : 'fixed',
    order: order.includes(hour) ? order.indexOf(hour) + 1 : null,
  }));

/** The usual way round: from the open superior rim to the slow inferior and medial part. */
export const USUAL_ORDER = [12, 1, 2, 3, 11, 10, 9, 4, 8, 5, 7, 6];

/** What most of the cases plan alike for a fixed shell with a polyethylene liner. */
export const shellSteps = (reconstruction: string) =>
  steps(
    ['exposure', 'Posterior approach through the old scar; the whole rim seen before anything else', 'Self-retaining and pointed retractors', 'Extended trochanteric osteotomy', 'Sciatic nerve in scar behind the rim'],
    ['liner', 'Screw driven through a drilled hole pushes the liner out', '3.2 mm drill, 6.5 mm cancellous screw', 'Ream the polyethylene away', 'Thin polyethylene holds the thread badly'],
    ['screws', 'Take out all screws with the driver that fits', 'Universal driver set', 'Carbide cutter for a stripped head, shank taken after the shell', 'A stripped head stops everything that follows'],
    ['interface', 'Curved blades turned about a centring ball in a trial liner: short starter blade, then full radius, hour by hour', 'Curved blade osteotome of the shell’s diameter, trial liner of its inner diameter', 'Cut the shell in sectors', 'Inferior and medial parts are slow; blade must stay seated'],
    ['extraction', 'Pull only when the shell shifts as a whole', 'Shell extractor', 'Round the rim again, hour by hour', 'Pulling early takes bone with the shell'],
    ['bone-inventory', 'Look at rim, columns and medial wall; class the defect as found', 'Trial reamers by hand', '', ''],
    ['reconstruction', reconstruction, 'Shells in 2 mm steps, screws 15 to 50 mm', 'Augment or cage in the room', ''],
  );

export const shellKit = (outer: number, inner: number) =>
  kit(
    { item: 'Curved blade osteotome, short and full radius', size: `${outer} mm`, stepId: 'step-4', source: 'loan', confirmed: false },
    { item: 'Trial liner for the centring ball', size: `${inner} mm inner diameter`, stepId: 'step-4', source: 'loan', confirmed: false },
    { item: 'Universal driver set', stepId: 'step-3', source: 'hospital', confirmed: true },
    { item: 'Carbide cutters', stepId: 'step-3', source: 'hospital', confirmed: true },
    { item: 'Porous shells', size: `${outer + 2} to ${outer + 12} mm`, stepId: 'step-7', source: 'loan', confirmed: false },
  );

export const options = (...rows: [title: string, description: string, isProposal?: true][]) => ({
  options: numbered(
    'option',
    rows.map(([title, description, isProposal]) => ({ title, description, isProposal: isProposal ?? false })),
  ),
});
