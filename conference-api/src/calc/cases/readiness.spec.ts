import { type CaseContent, emptyContent, type PlanStep } from '../vocabulary/case-content.js';
import type { Projection } from '../vocabulary/images.js';
import { caseReadiness, type ReadinessItem } from './readiness.js';
import { firstOutOfOrder } from './readiness-plan.js';

// What a case must have is common practice, no source: the tests hold each rule against a case that breaks it alone.
const step = (kind: PlanStep['kind'], id: string = kind): PlanStep => ({ id, kind, method: 'as usual', fallback: 'another way' });

const complete = (): CaseContent => ({
  heading: { title: 'Loose shell', side: 'left', joint: 'hip', question: 'One stage or two?', urgency: 'routine' },
  patient: { ageYears: 71, sex: 'female', asa: 'II', anticoagulation: 'none', metalAllergy: 'none', cementAllergy: 'none', antibioticAllergy: 'unknown', function: 'Two sticks' },
  history: { indexDiagnosis: 'Dysplasia', indexInterval: '9 years', reasons: ['loosening'] },
  implants: {
    parts: [
      { id: 'a', part: 'shell', fixation: 'loose', maker: 'unknown', certainty: 'unsure', knownFrom: 'radiograph-only', outerDiameterMm: 54, screwHoles: false },
      { id: 'b', part: 'liner', fixation: 'unknown', maker: 'unknown', certainty: 'unsure', knownFrom: 'radiograph-only', linerKind: 'unknown' },
    ],
  },
  infection: { suspicion: 'none', crpMgL: 4, synovialWbcPerUl: 200 },
  bone: { direction: 'none', ischialLysis: 'none', teardrop: 'intact', kohler: 'intact', readersClass: 'I' },
  plan: {
    steps: (['exposure', 'liner', 'screws', 'interface', 'extraction', 'bone-inventory', 'reconstruction'] as const).map((kind) => step(kind)),
    kit: [{ id: 'k', item: 'Curved blades' }],
    reconstruction: 'Porous shell',
  },
  options: { options: [{ id: 'x', title: 'One stage', isProposal: true }, { id: 'y', title: 'Two stages' }] },
});
const FILMS: Projection[] = ['ap-pelvis', 'lateral'];

const open = (content: CaseContent, images: Projection[] = FILMS): ReadinessItem[] => caseReadiness(content, images).items.filter((item) => !item.done);
const openIds = (change: (content: CaseContent) => void, images?: Projection[]) => {
  const content = complete();
  change(content);
  return open(content, images).map(({ id }) => id);
};

it('asks nothing more of a complete case', () => {
  expect(open(complete())).toEqual([]);
  expect(caseReadiness(complete(), FILMS)).toMatchObject({ canBePosted: true, canBeListed: true });
});

it('has an item for every section of the sheet, each id once, with a remedy in plain words', () => {
  const { items } = caseReadiness(emptyContent(), []);
  expect(new Set(items.map(({ section }) => section))).toEqual(new Set(['heading', 'patient', 'history', 'implants', 'infection', 'bone', 'images', 'plan', 'options']));
  const full = caseReadiness(complete(), FILMS).items;
  expect(new Set(full.map(({ id }) => id)).size).toBe(full.length);
  for (const item of [...items, ...full]) expect(item.remedy).toMatch(/^[A-Z].+\.$/);
});

it.each<[string, (content: CaseContent) => void]>([
  ['title', (content) => (content.heading.title = ' ')],
  ['side', (content) => (content.heading.side = null)],
  ['question', (content) => (content.heading.question = '')],
  ['urgency-reason', (content) => (content.heading.urgency = 'urgent')],
  ['identifiers', (content) => (content.bone.note = 'Mail to someone@ward.example')],
  ['reason', (content) => (content.history.reasons = [])],
  ['shell-diameter', (content) => (content.implants.parts![0]!.outerDiameterMm = null)],
  ['options', (content) => (content.options.options![1]!.title = 'one STAGE ')],
  ['options', (content) => content.options.options!.pop()],
  ['proposal', (content) => (content.options.options![0]!.isProposal = false)],
  ['proposal', (content) => (content.options.options![1]!.isProposal = true)],
])('%s alone blocks posting', (id, change) => {
  const content = complete();
  change(content);
  const left = open(content);
  expect(left.filter(({ weight }) => weight === 'blocks-posting').map((item) => item.id)).toEqual([id]);
  expect(caseReadiness(content, FILMS).canBePosted).toBe(false);
});

it.each<[string, (content: CaseContent) => void]>([
  ['age', (content) => (content.patient.ageYears = null)],
  ['sex', (content) => (content.patient.sex = null)],
  ['asa', (content) => (content.patient.asa = null)],
  ['anticoagulation', (content) => (content.patient.anticoagulation = null)],
  ['fixation', (content) => (content.implants.parts![1]!.fixation = null)],
  ['liner', (content) => content.implants.parts!.pop()],
  ['suspicion', (content) => (content.infection.suspicion = null)],
  ['plan-steps', (content) => content.plan.steps!.shift()],
])('%s alone lets it be posted but not listed', (id, change) => {
  const content = complete();
  change(content);
  expect(open(content).map((item) => item.id)).toEqual([id]);
  expect(caseReadiness(content, FILMS)).toMatchObject({ canBePosted: true, canBeListed: false });
});

it('wants an AP film, and advises a second plane', () => {
  expect(openIds(() => undefined, ['lateral', 'photograph'])).toEqual(['ap-film']);
  expect(openIds(() => undefined, ['ap'])).toEqual(['second-plane']);
});

it('takes unknown for an answer where it is said, and does not take silence for it', () => {
  expect(openIds((content) => Object.assign(content.implants.parts![0]!, { outerDiameterMm: null, note: 'Outer diameter not known' }))).toEqual([]);
  expect(openIds((content) => (content.infection = { suspicion: 'possible', sampling: 'Not done yet, CRP unknown' }))).toEqual([]);
  expect(openIds((content) => (content.infection = { suspicion: 'possible', sampling: 'Last week' }))).toEqual(['crp', 'aspiration']);
});

it('asks what belongs to a shell or a hip only where there is one', () => {
  const knee = complete();
  knee.heading.joint = 'knee';
  knee.bone = {};
  knee.implants.parts = [{ ...knee.implants.parts![0]!, part: 'tibial-component', outerDiameterMm: null, screwHoles: null }];
  expect(open(knee)).toEqual([]);
});

it('asks for the head drive of screws that are seen', () => {
  expect(openIds((content) => (content.implants.parts![0]!.screws = [{ id: 's', hour: 12 }]))).toEqual(['head-drive']);
});

it.each<[PlanStep['kind'][], string | null]>([
  [['exposure', 'liner', 'screws', 'interface', 'extraction'], null],
  [['exposure', 'stem', 'liner', 'cement', 'extraction'], null],
  [['exposure', 'screws', 'screws', 'extraction'], null],
  [['exposure', 'screws', 'liner'], 'liner'],
  [['liner', 'exposure'], 'exposure'],
  [['exposure', 'extraction', 'other', 'interface'], 'interface'],
  [[], null],
])('the order %j has its first slip at %s', (kinds, slip) => {
  expect(firstOutOfOrder(kinds.map((kind, index) => step(kind, String(index))))?.step.kind ?? null).toBe(slip);
});
