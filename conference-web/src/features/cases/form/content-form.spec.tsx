import { type CaseContent, CONTENT_SECTIONS, type ContentSection, emptyContent } from '@kerfside/calc/vocabulary/case-content.js';
import { Theme } from '@radix-ui/themes';
import { act, render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useSyncExternalStore } from 'react';
import { EditSection, SectionForm } from '../components/edit/section-forms';
import { CaseDraft } from '../draft/case-draft';
import { localCopies } from '../draft/local-copy';

// many fields and few processors
jest.setTimeout(30_000);

let sent: Partial<CaseContent>[];

function open(content: CaseContent, sections: readonly ContentSection[] = CONTENT_SECTIONS) {
  sent = [];
  let version = 1;
  const draft = new CaseDraft(
    { content, version },
    {
      save: async (_, changes) => {
        sent.push(structuredClone(changes));
        return { version: ++version, savedAt: '2026-12-07T10:00:00.000Z' };
      },
      fetchCurrent: async () => ({ content, version }),
      copies: localCopies('person', 'case', localStorage, 'tab'),
      pause: 60_000,
    },
  );
  function Form() {
    const state = useSyncExternalStore(draft.subscribe, draft.getState);
    const { heading, implants } = state.content;
    return (
      <Theme>
        {sections.map((section) => (
          <EditSection key={section} section={section}>
            <SectionForm
              {...{ section, draft }}
              value={state.content[section]}
              refusals={state.refusals}
              side={heading.side ?? null}
              isHip={heading.joint !== 'knee'}
              parts={implants.parts}
            />
          </EditSection>
        ))}
      </Theme>
    );
  }
  render(<Form />);
  return draft;
}

const section = (name: ContentSection) => within(document.getElementById(`section-${name}`)!);
const user = userEvent.setup();

beforeEach(() => localStorage.clear());

describe('filling the form', () => {
  it('writes each kind of field as the contract has it', async () => {
    const draft = open(emptyContent(), ['heading', 'patient', 'infection']);
    const question = section('heading');
    await user.type(question.getByLabelText('Title'), 'Loose cup');
    await user.selectOptions(question.getByLabelText('Side'), 'Left');
    const patient = section('patient');
    await user.type(patient.getByLabelText('Age'), '71');
    await user.click(patient.getByLabelText('Diabetes'));
    await user.click(within(section('infection').getByRole('group', { name: 'Sinus tract' })).getByLabelText('No'));
    await user.type(section('infection').getByLabelText('CRP'), '12,5');
    await act(() => draft.saveNow());
    expect(sent).toEqual([
      {
        heading: { title: 'Loose cup', side: 'left' },
        patient: { ageYears: 71, comorbidities: ['diabetes'] },
        infection: { sinusTract: false, crpMgL: 12.5 },
      },
    ]);
  });

  it('keeps ‘not known’ apart from ‘no’', async () => {
    const draft = open({ ...emptyContent(), infection: { purulence: true } }, ['infection']);
    const purulence = within(section('infection').getByRole('group', { name: 'Purulence' }));
    expect(purulence.getByLabelText('Yes')).toBeChecked();
    await user.click(purulence.getByLabelText('Not known'));
    expect(draft.getState().content.infection.purulence).toBeNull();
    await user.click(purulence.getByLabelText('No'));
    expect(draft.getState().content.infection.purulence).toBe(false);
  });

  it('does not take what is no number, or out of bounds, and says so at the field', async () => {
    const draft = open(emptyContent(), ['infection']);
    const crp = section('infection').getByLabelText('CRP');
    await user.type(crp, '5x');
    expect(crp).toHaveAccessibleDescription(/not a number/);
    expect(crp).toHaveValue('5x');
    await user.clear(crp);
    await user.type(crp, '5000');
    expect(crp).toHaveAccessibleDescription(/from 0 to 1000/);
    await user.clear(crp);
    await user.type(crp, '50');
    expect(crp).not.toBeInvalid();
    expect(draft.getState().content.infection.crpMgL).toBe(50);
  });

  it('asks of a part what belongs to its kind, and never hides what was said', async () => {
    const draft = open(emptyContent(), ['implants']);
    const implants = section('implants');
    await user.click(implants.getByRole('button', { name: 'Add part' }));
    await user.type(implants.getByLabelText('Outer diameter'), '54');
    await user.click(implants.getByRole('button', { name: 'Add screw' }));
    await user.type(implants.getByLabelText('Hour on the rim clock'), '11');
    expect(implants.getByText('Screw at 11 o’clock')).toBeInTheDocument();
    await user.selectOptions(implants.getByLabelText('Part'), 'Liner');
    expect(implants.getByLabelText('Kind of liner')).toBeInTheDocument();
    expect(implants.getByLabelText('Outer diameter')).toHaveValue('54');
    expect(draft.getState().content.implants.parts).toEqual([
      { id: expect.stringMatching(/^part-/), part: 'liner', outerDiameterMm: 54, screws: [{ id: expect.stringMatching(/^screw-/), hour: 11 }] },
    ]);
  });

  it('moves, removes and puts back plan steps by keyboard', async () => {
    const draft = open({ ...emptyContent(), heading: { joint: 'knee' } }, ['plan']);
    const plan = section('plan');
    const kinds = () => draft.getState().content.plan.steps?.map(({ kind }) => kind);
    for (let count = 0; count < 3; count += 1) await user.click(plan.getByRole('button', { name: 'Add step' }));
    expect(kinds()).toEqual(['exposure', 'liner', 'screws']);
    plan.getByRole('button', { name: 'Move up: Step: screws' }).focus();
    await user.keyboard('{Enter}{Enter}');
    expect(kinds()).toEqual(['screws', 'exposure', 'liner']);
    await user.type(within(plan.getByRole('group', { name: '2. Step: exposure' })).getByLabelText('Method'), 'Posterior');
    await user.click(plan.getByRole('button', { name: 'Remove: Step: exposure' }));
    expect(kinds()).toEqual(['screws', 'liner']);
    await user.click(plan.getByRole('button', { name: 'Put it back' }));
    expect(draft.getState().content.plan.steps?.[1]).toMatchObject({ kind: 'exposure', method: 'Posterior' });
  });

  it('marks exactly one option as the proposal', async () => {
    const draft = open({ ...emptyContent(), options: { options: [{ id: 'a', title: 'Cup' }, { id: 'b', title: 'Cage', isProposal: true }] } }, ['options']);
    await user.click(section('options').getAllByLabelText('This is my own proposal')[0]!);
    expect(draft.getState().content.options.options?.map(({ isProposal }) => isProposal)).toEqual([true, false]);
  });
});

describe('a full case through the form', () => {
  const full: CaseContent = {
    heading: { title: 'Cup', side: 'right', joint: 'hip', question: 'Remove?', urgency: 'soon', urgencyReason: 'Pain' },
    patient: { ageYears: 90, sex: 'female', bmiBand: '25-29.9', asa: 'III', comorbidities: ['dementia'], metalAllergy: 'none', anticoagulation: 'warfarin' },
    history: { indexDiagnosis: 'Arthrosis', operations: [{ id: 'op-1', interval: '9 years ago', procedure: 'Cup' }], reasons: ['loosening'] },
    implants: { parts: [{ id: 'p', part: 'shell', outerDiameterMm: 54, screwHoles: true, screws: [{ id: 's', quadrant: 'posterosuperior', lengthMm: 30 }] }] },
    infection: { timing: 'chronic', crpMgL: 4, leukocyteEsterase: '++', cultures: [{ id: 'c', specimen: 'Fluid', result: 'No growth' }] },
    bone: { migrationMm: 12.5, direction: 'superior', versionDeg: -5, readersClass: 'IIA' },
    plan: {
      steps: [{ id: 'st', kind: 'exposure', method: 'Posterior' }],
      rim: [{ hour: 12, state: 'fixed', order: 1 }],
      kit: [{ id: 'k', item: 'Osteotome', stepId: 'st', source: 'loan', confirmed: true }],
      expectedNextShellMm: 60,
    },
    options: { options: [{ id: 'o', title: 'Cup', isProposal: true }] },
  };

  it('shows it as it is, and changes nothing by showing it', async () => {
    const draft = open(structuredClone(full));
    expect(section('bone').getByLabelText('Cup version')).toHaveValue('-5');
    expect(section('plan').getByLabelText('For step')).toHaveDisplayValue('1. Exposure');
    expect(section('patient').getByText('Kept as 90 and over.')).toBeInTheDocument();
    expect(await act(() => draft.saveNow())).toBe(true);
    expect(sent).toEqual([]);
    expect(draft.getState().content).toEqual(full);
  });

  it('sends the one section that was changed, whole', async () => {
    const draft = open(structuredClone(full));
    await user.type(section('history').getByLabelText('Course'), 'Worse');
    await act(() => draft.saveNow());
    expect(sent).toEqual([{ history: { ...full.history, course: 'Worse' } }]);
  });

  it('computes the least bone volume from the two diameters', () => {
    open(structuredClone(full));
    // half a sphere's layer from 54 to 60 mm across: 2/3 π (30³ − 27³) mm³, by hand
    expect(screen.getByRole('group', { name: /Least volume of bone/ })).toHaveTextContent('at least 15.3 cm³');
  });
});
