import type { Outcome } from './api/list-outcomes';
import { draftOf, faultsOf, toBody, toggleComplication } from './outcome-draft';
import { compareFindings, compareSteps } from './planned-done';

const OUTCOME = {
  id: 'o1',
  version: 1,
  steps: [
    { stepId: 's1', method: '', asPlanned: true },
    { stepId: 's2', method: 'Head ground off', asPlanned: false },
  ],
  missingKit: 'Carbide cutter',
  minutes: 214,
  bloodLoss: '500-999',
  complications: ['fracture'],
  defectFound: 'IIB',
  removedShellMm: 54,
  implantedShellMm: 62,
  boneLostHours: [6, 7],
  cultures: '',
  lesson: 'Bring the cutter',
  amendmentReason: null,
  by: {},
  at: '2026-12-01T10:00:00.000Z',
} as unknown as Outcome;

const CONTENT = {
  plan: {
    steps: [
      { id: 's1', kind: 'liner', method: 'Drilled hole and screw', tool: '' },
      { id: 's2', kind: 'screws', method: 'Universal driver', tool: 'Set of drivers' },
      { id: 's3', kind: 'interface', method: 'Curved blade' },
    ],
    expectedNextShellMm: 60,
  },
  bone: { readersClass: 'IIB' },
  implants: { parts: [{ id: 'p1', part: 'shell', outerDiameterMm: null }] },
} as unknown as Parameters<typeof compareFindings>[0];

it('sends what it began with, unchanged', () => {
  const { id: _id, version: _version, by: _by, at: _at, amendmentReason: _reason, ...reported } = OUTCOME;
  expect(toBody(draftOf(OUTCOME), ['s1', 's2'])).toEqual(reported);
});

it('tells not known from no: an empty form claims nothing', () => {
  expect(toBody(draftOf(undefined), ['s1'])).toMatchObject({
    steps: [{ stepId: 's1', method: '', asPlanned: null }],
    minutes: null,
    bloodLoss: null,
    defectFound: null,
    removedShellMm: null,
    complications: [],
  });
});

it('takes a decimal comma, and refuses what is out of range', () => {
  const draft = { ...draftOf(undefined), removedShellMm: '54,5', implantedShellMm: '5', minutes: '12.5' };
  expect(toBody(draft, []).removedShellMm).toBe(54.5);
  expect(Object.keys(faultsOf(draft, false)).sort()).toEqual(['implantedShellMm', 'minutes']);
  expect(faultsOf(draftOf(OUTCOME), true)).toHaveProperty('amendmentReason');
});

it('lets no complication stand beside none', () => {
  expect(toggleComplication(['fracture', 'infection'], 'none')).toEqual(['none']);
  expect(toggleComplication(['none'], 'fracture')).toEqual(['fracture']);
  expect(toggleComplication(['fracture'], 'fracture')).toEqual([]);
});

it('marks what was done otherwise than planned, and what is not known as neither', () => {
  const rows = compareSteps(CONTENT, OUTCOME);
  expect(rows.map(({ differs }) => differs)).toEqual([false, true, null]);
  expect(rows[1]).toMatchObject({ name: '2. Screws', planned: 'Universal driver; Set of drivers', done: 'Head ground off' });
  expect(rows[2]!.done).toBe('Not known');
  const findings = Object.fromEntries(compareFindings(CONTENT, OUTCOME).map(({ key, differs }) => [key, differs]));
  expect(findings).toEqual({ removed: null, implanted: true, defect: false });
});
