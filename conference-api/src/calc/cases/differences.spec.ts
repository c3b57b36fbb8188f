import { type CaseContent, emptyContent } from '../vocabulary/case-content.js';
import { caseSearchText, caseTexts } from './case-text.js';
import { keptSection, repeatedKeys } from './content-rules.js';
import { changedSections, contentDifferences } from './differences.js';

const content = (changes: Partial<CaseContent>): CaseContent => ({ ...emptyContent(), ...changes });
const told = (from: Partial<CaseContent>, to: Partial<CaseContent>) => contentDifferences(content(from), content(to)).map(({ path, label, from: was, to: is }) => [path, label, was, is]);

describe('differences', () => {
  it('are none between what says the same', () => {
    expect(told({ heading: { title: '', side: null } }, { heading: {} })).toEqual([]);
    expect(told({ patient: { comorbidities: ['diabetes', 'dementia'] } }, { patient: { comorbidities: ['dementia', 'diabetes'] } })).toEqual([]);
    expect(told({ implants: { parts: [] } }, { implants: {} })).toEqual([]);
  });

  it('put values in words with their units; unknown is not the same as no', () => {
    expect(told({ infection: { sinusTract: null, crpMgL: 9 } }, { infection: { sinusTract: false, crpMgL: 10.5 } })).toEqual([
      ['sinusTract', 'Sinus tract', null, 'No'],
      ['crpMgL', 'CRP', '9 mg/L', '10.5 mg/L'],
    ]);
    expect(told({ bone: { teardrop: 'intact', inclinationDeg: 0 } }, { bone: { teardrop: 'absent' } })).toEqual([
      ['teardrop', 'Teardrop', 'Intact', 'Absent'],
      ['inclinationDeg', 'Inclination', '0°', null],
    ]);
  });

  it('name the oldest as one group', () => {
    expect(told({ patient: { ageYears: 89 } }, { patient: { ageYears: 90 } })).toEqual([['ageYears', 'Age', '89 years', '90 years and over']]);
  });

  it('tell items apart by id, nested ones too', () => {
    const shell = { id: 'a', part: 'shell' as const, outerDiameterMm: 54, screws: [{ id: 's', hour: 11 }] };
    const liner = { id: 'b', part: 'liner' as const };
    expect(
      told({ implants: { parts: [shell] } }, { implants: { parts: [liner, { ...shell, screws: [{ id: 's', hour: 11, headDrive: 'star' as const }, { id: 't', hour: 1 }] }] } }),
    ).toEqual([
      ['parts[b]', 'Liner', null, 'part: Liner'],
      ['parts[a].screws[s].headDrive', 'Screw at 11 o’clock, head drive', null, 'Star'],
      ['parts[a].screws[t]', 'Screw at 1 o’clock', null, 'hour: 1'],
    ]);
    expect(told({ implants: { parts: [shell, liner] } }, { implants: { parts: [shell] } })).toEqual([['parts[b]', 'Liner', 'part: Liner', null]]);
  });

  it('name a changed order once, and not where an item was put between', () => {
    const step = (id: string, kind: 'exposure' | 'liner' | 'screws') => ({ id, kind, method: id });
    const [a, b, c] = [step('a', 'exposure'), step('b', 'liner'), step('c', 'screws')];
    expect(told({ plan: { steps: [a, c] } }, { plan: { steps: [a, b, c] } })).toHaveLength(1);
    expect(told({ plan: { steps: [a, b, c] } }, { plan: { steps: [a, c, b] } })).toEqual([
      ['steps', 'Steps, order', 'Step: exposure → Step: liner → Step: screws', 'Step: exposure → Step: screws → Step: liner'],
    ]);
  });

  it('know rim sectors by their hour, in whatever order they come', () => {
    expect(told({ plan: { rim: [{ hour: 3, state: 'fixed' }, { hour: 6 }] } }, { plan: { rim: [{ hour: 6 }, { hour: 3, state: 'free' }] } })).toEqual([
      ['rim[3].state', 'Rim at 3 o’clock, state', 'Fixed', 'Free'],
    ]);
  });

  it('say which sections they touch', () => {
    expect(changedSections(content({}), content({ heading: { title: 'A' }, plan: { steps: [] }, options: { options: [{ id: 'x', title: 'X' }] } }))).toEqual(['heading', 'options']);
  });
});

describe('texts of a case', () => {
  const full = content({
    heading: { title: 'Loose shell', urgency: 'soon' },
    history: { operations: [{ id: 'o1', interval: '9 years ago', procedure: 'Replacement' }] },
    implants: { parts: [{ id: 'a', part: 'shell', maker: 'unknown', note: '  ' }] },
  });

  it('are all typed ones with their place, and only those', () => {
    expect(caseTexts(full).map(({ section, path, text }) => [section, path, text])).toEqual([
      ['heading', 'title', 'Loose shell'],
      ['history', 'operations[o1].interval', '9 years ago'],
      ['history', 'operations[o1].procedure', 'Replacement'],
      ['implants', 'parts[a].maker', 'unknown'],
    ]);
  });

  it('go into the search with the code and the words of what was chosen', () => {
    expect(caseSearchText('HIP-0042', full).split('\n')).toEqual(['HIP-0042', 'Loose shell', 'Soon', '9 years ago', 'Replacement', 'Shell', 'unknown']);
  });
});

describe('what is kept', () => {
  it.each([
    [0, 0],
    [89, 89],
    [90, 90],
    [91, 90],
    [130, 90],
    [null, null],
  ])('of an age of %s is %s', (sent, kept) => {
    expect(keptSection('patient', { ageYears: sent })).toEqual({ ageYears: kept });
  });

  it('leaves absent fields out', () => {
    expect(Object.keys(keptSection('heading', { title: 'A', side: undefined } as never))).toEqual(['title']);
  });

  it('names each repeated id by its place', () => {
    const screws = [{ id: 'x' }, { id: 'y' }, { id: 'x' }, { id: 'x' }];
    expect(repeatedKeys('implants', { parts: [{ id: 'p', screws }, { id: 'p' }] })).toEqual(['parts[0].screws[2].id', 'parts[0].screws[3].id', 'parts[1].id']);
    expect(repeatedKeys('plan', { steps: [{ id: 'a' }], kit: [{ id: 'a' }] })).toEqual([]);
  });
});
