import { CalcInputError } from '../common/calc-input-error.js';
import { calculateAcetabularDefect } from './acetabular-defect.js';
import type { AcetabularDefectInput } from './acetabular-defect.js';

const classify = (input: AcetabularDefectInput) => calculateAcetabularDefect(input);

/** Migration, direction, ischium, teardrop, Köhler line. */
type Film = readonly [number, AcetabularDefectInput['direction'], AcetabularDefectInput['ischialLysis'], AcetabularDefectInput['teardrop'], AcetabularDefectInput['kohler']];
const film = ([migrationMm, direction, ischialLysis, teardrop, kohler]: Film): AcetabularDefectInput =>
  ({ migrationMm, direction, ischialLysis, teardrop, kohler });

const I: Film = [0, 'none', 'none', 'intact', 'intact'];
const IIA: Film = [14, 'superior', 'none', 'intact', 'intact'];
const IIB: Film = [16, 'superolateral', 'mild', 'intact', 'intact'];
const IIC: Film = [8, 'medial', 'mild', 'moderate', 'disrupted'];
const IIIA: Film = [34, 'superolateral', 'moderate', 'partial', 'intact'];
const IIIB: Film = [38, 'superomedial', 'severe', 'absent', 'disrupted'];

describe('acetabular defect class', () => {
  // Source: table of Paprosky and others 1994 as in BMC Musculoskelet Disord s12891-020-03851-9
  // Table 1 and PMC7198480 Table 3; one film a row, read off by hand.
  test.each([
    ['I', I],
    ['IIA', IIA],
    ['IIB', IIB],
    ['IIC', IIC],
    ['IIIA', IIIA],
    ['IIIB', IIIB],
  ] as const)('class %s at either threshold', (expected, row) => {
    for (const rule of [20, 30] as const) {
      expect(classify({ ...film(row), rule })).toMatchObject({ class: expected, otherRule: expected, disagreements: [] });
    }
  });

  // 2 cm: tables of 1994. 3 cm: later texts (from memory).
  test('25 mm is IIIA at 2 cm and IIB at 3 cm', () => {
    const between = film([25, 'superolateral', 'moderate', 'partial', 'intact']);
    expect(classify({ ...between, rule: 20 })).toMatchObject({ class: 'IIIA', otherRule: 'IIB' });
    const byDefault = classify(between);
    expect(byDefault).toMatchObject({ class: 'IIB', otherRule: 'IIIA' });
    expect(byDefault.definition).toContain('3 cm');
    expect(byDefault.remarks).toHaveLength(2);
    expect(byDefault.cautions.join(' ')).toContain('different answer');
  });

  test.each([
    [20, 'IIB', 'IIB'],
    [20.1, 'IIIA', 'IIB'],
    [30, 'IIIA', 'IIB'],
    [30.1, 'IIIA', 'IIIA'],
  ] as const)('only strictly over the threshold: %d mm', (migrationMm, at20, at30) => {
    const result = classify({ ...film(IIIA), migrationMm, rule: 20 });
    expect([result.class, result.otherRule]).toEqual([at20, at30]);
  });

  test('over the threshold either a broken Köhler line or a lost teardrop makes IIIB', () => {
    expect(classify({ ...film(IIIB), teardrop: 'partial' }).class).toBe('IIIB');
    expect(classify({ ...film(IIIB), kohler: 'intact' }).class).toBe('IIIB');
  });

  test('a protrusio is IIC, not IIIB', () => {
    expect(classify(film([18, 'medial', 'mild', 'moderate', 'disrupted'])).class).toBe('IIC');
  });

  // 'Mixed findings are not forced into a class': common practice, no source.
  test.each([
    ['up and out with a broken Köhler line', [34, 'superolateral', 'moderate', 'partial', 'disrupted'], /Direction/],
    ['up and in without medial loss', [34, 'superomedial', 'moderate', 'partial', 'intact'], /Direction/],
    ['far up with nothing else lost', [38, 'superolateral', 'none', 'intact', 'intact'], /Ischial lysis/],
    ['little migration, all else lost', [5, 'superior', 'severe', 'absent', 'disrupted'], /Direction/],
    ['no migration, broken Köhler line', [0, 'none', 'none', 'intact', 'disrupted'], /Direction/],
    ['migration without direction', [14, 'none', 'none', 'intact', 'intact'], /14 mm/],
    ['direction without migration', [0, 'superior', 'none', 'intact', 'intact'], /0 mm/],
    ['medial migration through an intact wall', [9, 'medial', 'mild', 'intact', 'intact'], /medial/],
    ['severe lysis in place', [0, 'none', 'severe', 'intact', 'intact'], /Ischial lysis is severe/],
  ] as const)('findings disagree: %s', (_name, row, words) => {
    const result = classify(film(row as Film));
    expect(result.class).toBeNull();
    expect(result.disagreements.join(' ')).toMatch(words);
  });

  test('the rim speaks for or against the class', () => {
    expect(classify({ ...film(IIB), superiorRim: 'deficient' }).class).toBe('IIB');
    expect(classify({ ...film(IIB), superiorRim: 'intact' }).class).toBeNull();
    expect(classify({ ...film(IIA), superiorRim: 'intact' }).class).toBe('IIA');
    expect(classify({ ...film(IIA), superiorRim: 'deficient' }).disagreements).toHaveLength(1);
    expect(classify({ ...film(IIIA), superiorRim: 'intact' }).class).toBeNull();
  });
});

describe('what is not known is not normal', () => {
  test('nothing known: no class, every class open, every finding missing', () => {
    const result = classify({});
    expect(result).toMatchObject({ class: null, otherRule: null, suspectedDiscontinuity: false, disagreements: [] });
    expect(result.possibleClasses).toEqual(['I', 'IIA', 'IIB', 'IIC', 'IIIA', 'IIIB']);
    expect(result.missing).toEqual(['migrationMm', 'direction', 'ischialLysis', 'teardrop', 'kohler', 'superiorRim', 'transverseLine']);
    expect(result.cautions.join(' ')).toContain('not excluded');
  });

  test.each([
    ['kohler', IIIA, ['IIIA', 'IIIB']],
    ['teardrop', IIIA, ['IIIA', 'IIIB']],
    ['kohler', IIA, ['IIA', 'IIC']],
    ['teardrop', IIB, ['IIB', 'IIC']],
    ['direction', IIA, ['IIA', 'IIB']],
    ['kohler', I, ['I', 'IIC']],
    ['migrationMm', IIIA, ['IIB', 'IIIA']],
  ] as const)('without %s the class stays open', (name, row, possible) => {
    const result = classify({ ...film(row), [name]: null });
    expect(result.class).toBeNull();
    expect(result.possibleClasses).toEqual(possible);
    expect(result.missing).toContain(name);
  });

  test('a finding that could not change the class is missing but does not block it', () => {
    const result = classify({ ...film(IIIB), teardrop: undefined, ischialLysis: null });
    expect(result.class).toBe('IIIB');
    expect(result.missing).toEqual(['ischialLysis', 'teardrop', 'superiorRim', 'transverseLine']);
  });
});

describe('suspected discontinuity', () => {
  // Source: the table's IIIB row, 'suspect discontinuity'; a transverse line as common practice.
  test.each([
    ['IIIB', film(IIIB), true],
    ['a transverse line with class IIA', { ...film(IIA), transverseLine: true }, true],
    ['a transverse line and nothing else', { transverseLine: true }, true],
    ['IIIB at the other threshold', film([25, 'superomedial', 'severe', 'absent', 'disrupted']), true],
    ['IIIA', film(IIIA), false],
    ['I with no line', { ...film(I), transverseLine: false }, false],
  ])('%s', (_name, input, expected) => {
    expect(classify(input).suspectedDiscontinuity).toBe(expected);
  });
});

test.each([
  [{ migrationMm: -1 }, 'migrationMm', 'range'],
  [{ migrationMm: 151 }, 'migrationMm', 'range'],
  [{ direction: 'up' }, 'direction', 'choice'],
  [{ kohler: true }, 'kohler', 'type'],
  [{ transverseLine: 'no' }, 'transverseLine', 'type'],
  [{ rule: 25 }, 'rule', 'choice'],
  [{ rule: '30' }, 'rule', 'type'],
])('refuses %j', (input, field, code) => {
  const run = () => classify(input as AcetabularDefectInput);
  expect(run).toThrow(CalcInputError);
  expect(run).toThrow(expect.objectContaining({ field, code }));
});
