import { type CaseContent, emptyContent } from '@kerfside/calc/vocabulary/case-content.js';
import { heldDifferences, mergeContent } from './merge';

const content = (changes: Partial<CaseContent>): CaseContent => ({ ...emptyContent(), ...changes });

describe('bringing two people’s changes together', () => {
  const base = content({ patient: { ageYears: 70, function: 'Walks with a stick' }, heading: { title: 'Cup' } });

  it('keeps my change and takes theirs where they are in different fields, of one section or of two', () => {
    const mine = content({ ...base, patient: { ...base.patient, function: 'Walks with two sticks' } });
    const theirs = content({ patient: { ...base.patient, ageYears: 71 }, heading: { title: 'Loose cup' } });
    const { content: merged, held, takenOver } = mergeContent(base, mine, theirs);
    expect(merged.patient).toEqual({ ageYears: 71, function: 'Walks with two sticks' });
    expect(merged.heading.title).toBe('Loose cup');
    expect(held).toEqual({});
    expect(takenOver).toEqual(['heading', 'patient']);
  });

  it('holds a field that both changed, with my text still there, and shows both', () => {
    const mine = content({ ...base, patient: { ...base.patient, function: 'Mine' } });
    const theirs = content({ ...base, patient: { ageYears: 72, function: 'Theirs' } });
    const { content: merged, held } = mergeContent(base, mine, theirs);
    expect(merged.patient).toEqual({ ageYears: 72, function: 'Mine' });
    expect(held).toEqual({ patient: ['function'] });
    expect(heldDifferences('patient', ['function'], merged, theirs)).toEqual([
      { section: 'patient', path: 'function', label: 'Function', from: 'Mine', to: 'Theirs' },
    ]);
  });

  it('holds nothing where both wrote the same', () => {
    const same = content({ ...base, patient: { ...base.patient, function: 'Same' } });
    expect(mergeContent(base, same, structuredClone(same))).toEqual({ content: same, held: {}, takenOver: [] });
  });

  it('holds a list that both changed as a whole, and keeps what I emptied empty', () => {
    const steps = [{ id: 'a', kind: 'exposure' as const, method: 'Posterior' }];
    const start = content({ plan: { steps, reconstruction: 'Cup' } });
    const mine = content({ plan: { steps: [...steps, { id: 'b', kind: 'liner', method: 'Screw' }], reconstruction: '' } });
    const theirs = content({ plan: { steps: [{ ...steps[0]!, method: 'Lateral' }], reconstruction: 'Cup' } });
    const { content: merged, held } = mergeContent(start, mine, theirs);
    expect(held).toEqual({ plan: ['steps'] });
    expect(merged.plan.steps).toHaveLength(2);
    expect(merged.plan.reconstruction).toBe('');
  });
});
