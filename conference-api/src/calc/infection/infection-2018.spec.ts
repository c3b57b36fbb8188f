import fc from 'fast-check';
import { CalcInputError } from '../common/calc-input-error.js';
import { calculateInfection2018, INFECTION_2018_FIELDS } from './infection-2018.js';
import type { Infection2018Input } from './infection-2018.js';

const original = (findings: Partial<Infection2018Input> = {}) =>
  calculateInfection2018({ variant: 'original', timing: 'chronic', ...findings });
const consensus = (findings: Partial<Infection2018Input> = {}) =>
  calculateInfection2018({ variant: 'consensus', timing: 'chronic', ...findings });
const acute = (findings: Partial<Infection2018Input> = {}) =>
  calculateInfection2018({ variant: 'consensus', timing: 'acute', ...findings });

const NORMAL_LABS = {
  crpMgL: 3,
  dDimerUgL: 200,
  esrMmH: 8,
  synovialWbcPerUl: 300,
  leukocyteEsterase: 'negative',
  alphaDefensin: false,
  pmnPercent: 20,
  synovialCrpMgL: 1,
} as const;

function refusal(input: unknown): CalcInputError {
  try {
    calculateInfection2018(input as Infection2018Input);
  } catch (error) {
    if (error instanceof CalcInputError) return error;
    throw error;
  }
  throw new Error('not refused');
}

describe('2018 definition, original version', () => {
  // Source of points, bands and thresholds: Parvizi and others, J Arthroplasty 2018;33:1309, as
  // printed in BMC Musculoskelet Disord 2020 s12891-020-03266-6 Table 3. PMN 80 % and synovial CRP
  // 6.9 mg/L: from memory. The sums are worked by hand from that table.
  test.each([
    ['raised CRP, ESR, count and neutrophils', { crpMgL: 24, esrMmH: 45, synovialWbcPerUl: 4200, pmnPercent: 85 }, 8, 'infected'],
    ['D-dimer alone', { crpMgL: 8, dDimerUgL: 900, esrMmH: 20 }, 2, 'possible'],
    ['ESR alone', { esrMmH: 40 }, 1, 'not-infected'],
    ['count and alpha-defensin on lines of their own', { synovialWbcPerUl: 3500, alphaDefensin: true }, 6, 'infected'],
    ['CRP and D-dimer once', { crpMgL: 15, dDimerUgL: 1200 }, 2, 'possible'],
    ['count and esterase once', { synovialWbcPerUl: 5000, leukocyteEsterase: '++' }, 3, 'possible'],
    ['five points', { alphaDefensin: true, pmnPercent: 95 }, 5, 'possible'],
    ['synovial CRP', { synovialCrpMgL: 7 }, 1, 'not-infected'],
  ] as const)('before the operation: %s', (_name, findings, score, verdict) => {
    const result = original(findings);
    expect(result).toMatchObject({ preoperativeScore: score, totalScore: score, verdict });
  });

  test('twelve points at most before the operation and twenty in all', () => {
    const before = { crpMgL: 900, dDimerUgL: 9000, esrMmH: 100, synovialWbcPerUl: 90_000, leukocyteEsterase: '++', alphaDefensin: true, pmnPercent: 99, synovialCrpMgL: 50 } as const;
    expect(original(before).preoperativeScore).toBe(12);
    const all = original({ ...before, histologyPositive: true, purulence: true, singlePositiveCulture: true });
    expect(all.totalScore).toBe(20);
  });

  // Same table, second part: findings at operation added to the score before it.
  test.each([
    [{ histologyPositive: true }, 5, 'inconclusive'],
    [{ histologyPositive: true, singlePositiveCulture: true }, 7, 'infected'],
    [{ singlePositiveCulture: true }, 4, 'inconclusive'],
    [{ purulence: true }, 5, 'inconclusive'],
    [{ histologyPositive: false }, 2, 'not-infected'],
  ] as const)('dry tap, two points before, then %j', (found, total, verdict) => {
    const result = original({ crpMgL: 8, dDimerUgL: 900, esrMmH: 20, ...found });
    expect(result).toMatchObject({ preoperativeScore: 2, totalScore: total, verdict });
  });

  test('three points are possible before the operation and not infected after it', () => {
    expect(original({ synovialWbcPerUl: 3500 }).verdict).toBe('possible');
    expect(original({ synovialWbcPerUl: 3500, purulence: false }).verdict).toBe('not-infected');
  });

  test('a sinus tract alone decides, with every value normal and with none known', () => {
    expect(original({ sinusTract: true, ...NORMAL_LABS })).toMatchObject({
      verdict: 'infected',
      totalScore: 0,
      majorCriteria: ['sinusTract'],
    });
    expect(original({ sinusTract: true }).verdict).toBe('infected');
  });

  test.each([
    [0, 'not-infected', []],
    [1, 'not-infected', []],
    [2, 'infected', ['sameOrganismCultures']],
    [5, 'infected', ['sameOrganismCultures']],
  ] as const)('%i cultures with the same organism', (sameOrganismCultures, verdict, majorCriteria) => {
    expect(original({ ...NORMAL_LABS, sameOrganismCultures })).toMatchObject({ verdict, majorCriteria });
  });

  test.each([
    ['crpMgL', 10, 2],
    ['dDimerUgL', 860, 2],
    ['esrMmH', 30, 1],
    ['synovialWbcPerUl', 3000, 3],
    ['pmnPercent', 80, 2],
    ['synovialCrpMgL', 6.9, 1],
  ] as const)('%s counts over %d only', (field, threshold, points) => {
    expect(original({ [field]: threshold }).totalScore).toBe(0);
    expect(original({ [field]: threshold + 0.001 }).totalScore).toBe(points);
  });

  test.each(['negative', 'trace', '+'] as const)('leukocyte esterase %s does not count', (leukocyteEsterase) => {
    expect(original({ leukocyteEsterase }).totalScore).toBe(0);
  });

  test('is refused for acute infection, for which it is not defined', () => {
    const error = refusal({ variant: 'original', timing: 'acute', crpMgL: 20 });
    expect(error).toMatchObject({ field: 'timing', code: 'chronic-only' });
    expect(error.message).toContain('chronic infection only');
  });

  test('says which thresholds are from memory, and names its publication', () => {
    const { cautions, definition } = original();
    expect(cautions.join(' ')).toMatch(/80 %.*6\.9 mg\/L.*from memory/);
    expect(definition).toMatch(/Parvizi.*2018;33:1309/);
  });
});

describe('2018 definition, consensus version', () => {
  // Source: BMC Musculoskelet Disord 2019 s12891-019-2941-1 Table 2; sums worked by hand.
  test.each([
    [{ crpMgL: 24, esrMmH: 45, synovialWbcPerUl: 4200, pmnPercent: 85 }, 8, 'infected'],
    [{ crpMgL: 8, dDimerUgL: 900, esrMmH: 20, histologyPositive: true, singlePositiveCulture: true }, 7, 'infected'],
    [{ esrMmH: 40 }, 1, 'not-infected'],
    [{ crpMgL: 40 }, 2, 'not-infected'],
    [{ synovialWbcPerUl: 3500, alphaDefensin: true }, 3, 'inconclusive'],
    [{ synovialWbcPerUl: 3500, alphaDefensin: true, leukocyteEsterase: '++' }, 3, 'inconclusive'],
    [{ alphaDefensin: true, pmnPercent: 75 }, 5, 'inconclusive'],
    [{ alphaDefensin: true, pmnPercent: 75, esrMmH: 31 }, 6, 'infected'],
    [{ synovialCrpMgL: 100, esrMmH: 5 }, 0, 'not-infected'],
  ] as const)('chronic: %j', (findings, score, verdict) => {
    expect(consensus(findings)).toMatchObject({ totalScore: score, verdict });
  });

  test('neutrophils count over 70 %, not over 80 % as in the original version', () => {
    expect(consensus({ pmnPercent: 70 }).totalScore).toBe(0);
    expect(consensus({ pmnPercent: 70.1 }).totalScore).toBe(2);
    expect(original({ pmnPercent: 70.1 }).totalScore).toBe(0);
  });

  test('day 20: under the acute thresholds, over the chronic ones', () => {
    const day20 = { crpMgL: 85, synovialWbcPerUl: 8500, pmnPercent: 88, esrMmH: 60 };
    expect(acute(day20)).toMatchObject({ totalScore: 0, verdict: 'not-infected' });
    expect(consensus(day20)).toMatchObject({ totalScore: 8, verdict: 'infected' });
  });

  test.each([
    ['crpMgL', 100, 2],
    ['synovialWbcPerUl', 10_000, 3],
    ['pmnPercent', 90, 2],
  ] as const)('acute: %s counts over %d only', (field, threshold, points) => {
    expect(acute({ [field]: threshold }).totalScore).toBe(0);
    expect(acute({ [field]: threshold + 0.5 }).totalScore).toBe(points);
  });

  test('acute: ESR has no role and D-dimer no threshold, so neither scores nor is missed', () => {
    const result = acute({ crpMgL: 5 });
    expect(acute({ esrMmH: 150, dDimerUgL: 50_000 }).totalScore).toBe(0);
    expect(result.missing).not.toEqual(expect.arrayContaining(['esrMmH']));
    expect(result.missing).not.toEqual(expect.arrayContaining(['dDimerUgL']));
    expect(result.cautions.join(' ')).toContain('never validated on acute infections');
  });
});

describe('what is not known', () => {
  // Our reading of 'unknown is not negative': common practice, no source.
  test('with nothing known the verdict is open and everything is missing', () => {
    expect(original()).toMatchObject({
      preoperativeScore: 0,
      totalScore: 0,
      verdict: 'inconclusive',
      highestPossibleScore: 20,
    });
    expect(original().missing).toHaveLength(13);
    expect(consensus()).toMatchObject({ verdict: 'inconclusive', highestPossibleScore: 16 });
    expect(acute().highestPossibleScore).toBe(15);
  });

  test('the highest possible score counts a line once', () => {
    const allButSynovial = { crpMgL: 50, dDimerUgL: 100, esrMmH: 5, alphaDefensin: false, pmnPercent: 10, synovialCrpMgL: 0, histologyPositive: false, purulence: false, singlePositiveCulture: false };
    expect(original(allButSynovial).highestPossibleScore).toBe(5);
    expect(original({ ...allButSynovial, synovialWbcPerUl: 10 }).highestPossibleScore).toBe(5);
    expect(original({ ...allButSynovial, synovialWbcPerUl: 10, leukocyteEsterase: 'negative' }).highestPossibleScore).toBe(2);
    expect(original({ ...allButSynovial, synovialWbcPerUl: 9000 }).highestPossibleScore).toBe(5);
  });

  test('null and absent are the same', () => {
    const withNulls = original({ crpMgL: null, sinusTract: null, esrMmH: 40, leukocyteEsterase: null });
    expect(withNulls).toEqual(original({ esrMmH: 40 }));
  });

  test('says which missing finding would change the verdict', () => {
    const result = original({ crpMgL: 24, esrMmH: 45, pmnPercent: 40, alphaDefensin: false, synovialCrpMgL: 0 });
    expect(result.verdict).toBe('possible');
    expect(result.wouldChange).toContainEqual({ field: 'synovialWbcPerUl', ifItWere: 'over 3000 per µL', totalScore: 6, verdict: 'infected' });
    expect(result.wouldChange.map((change) => change.field)).not.toContain('dDimerUgL');
  });

  test('not infected on few findings carries a caution, on all findings it does not', () => {
    const words = 'missing findings could still change this';
    expect(original({ esrMmH: 40 }).cautions.join(' ')).toContain(words);
    const all = original({ ...NORMAL_LABS, sinusTract: false, sameOrganismCultures: 0, histologyPositive: false, purulence: false, singlePositiveCulture: false });
    expect(all.missing).toEqual([]);
    expect(all.highestPossibleScore).toBe(all.totalScore);
    expect(all.cautions.join(' ')).not.toContain(words);
  });

  test('remarks on values that look like another unit', () => {
    expect(original({ crpMgL: 0.8 }).cautions.join(' ')).toContain('mg/dL. ');
    expect(original({ synovialWbcPerUl: 4.2 }).cautions.join(' ')).toContain('not in 10⁹/L');
    expect(original({ crpMgL: 24 }).cautions.join(' ')).not.toContain('is low for');
  });
});

describe('refusals', () => {
  test.each([
    [{ crpMgL: -1 }, 'crpMgL', 'range'],
    [{ crpMgL: 1000.1 }, 'crpMgL', 'range'],
    [{ crpMgL: '24' }, 'crpMgL', 'type'],
    [{ crpMgL: Number.NaN }, 'crpMgL', 'type'],
    [{ dDimerUgL: Number.POSITIVE_INFINITY }, 'dDimerUgL', 'type'],
    [{ esrMmH: 201 }, 'esrMmH', 'range'],
    [{ synovialWbcPerUl: 1_000_001 }, 'synovialWbcPerUl', 'range'],
    [{ pmnPercent: 100.5 }, 'pmnPercent', 'range'],
    [{ synovialCrpMgL: -0.1 }, 'synovialCrpMgL', 'range'],
    [{ leukocyteEsterase: '+++' }, 'leukocyteEsterase', 'choice'],
    [{ sinusTract: 'yes' }, 'sinusTract', 'type'],
    [{ sameOrganismCultures: 1.5 }, 'sameOrganismCultures', 'integer'],
    [{ sameOrganismCultures: -1 }, 'sameOrganismCultures', 'range'],
    [{ variant: 'modified' }, 'variant', 'choice'],
    [{ variant: null }, 'variant', 'required'],
    [{ timing: null }, 'timing', 'required'],
  ])('%j', (change, field, code) => {
    expect(refusal({ variant: 'consensus', timing: 'chronic', ...change })).toMatchObject({ field, code });
  });

  test('plausible extremes are accepted', () => {
    expect(original({ crpMgL: 612, esrMmH: 140, synovialWbcPerUl: 250_000, dDimerUgL: 80_000, pmnPercent: 100 }).verdict).toBe('infected');
  });

  test('every field of the input is in the list of fields', () => {
    const names = INFECTION_2018_FIELDS.map((field) => field.name);
    expect(new Set(names).size).toBe(15);
    expect(names).toEqual(expect.arrayContaining(['variant', 'timing', ...Object.keys(NORMAL_LABS)]));
  });
});

describe('properties', () => {
  const known = <T>(value: fc.Arbitrary<T>) => fc.option(value, { nil: null });
  const findings = fc.record({
    sinusTract: known(fc.boolean()),
    sameOrganismCultures: known(fc.integer({ min: 0, max: 6 })),
    crpMgL: known(fc.integer({ min: 0, max: 300 })),
    dDimerUgL: known(fc.integer({ min: 0, max: 3000 })),
    esrMmH: known(fc.integer({ min: 0, max: 120 })),
    synovialWbcPerUl: known(fc.integer({ min: 0, max: 20_000 })),
    leukocyteEsterase: known(fc.constantFrom('negative' as const, 'trace' as const, '+' as const, '++' as const)),
    alphaDefensin: known(fc.boolean()),
    pmnPercent: known(fc.integer({ min: 0, max: 100 })),
    synovialCrpMgL: known(fc.integer({ min: 0, max: 40 })),
    histologyPositive: known(fc.boolean()),
    purulence: known(fc.boolean()),
    singlePositiveCulture: known(fc.boolean()),
  });

  test('score before ≤ total ≤ highest possible, and a rise of CRP never lowers the total', () => {
    fc.assert(
      fc.property(findings, fc.constantFrom('original' as const, 'consensus' as const), (input, variant) => {
        const result = calculateInfection2018({ variant, timing: 'chronic', ...input });
        const raised = calculateInfection2018({ variant, timing: 'chronic', ...input, crpMgL: 500 });
        expect(result.preoperativeScore).toBeLessThanOrEqual(result.totalScore);
        expect(result.totalScore).toBeLessThanOrEqual(result.highestPossibleScore);
        expect(raised.totalScore).toBeGreaterThanOrEqual(result.totalScore);
      }),
    );
  });

  test('the consensus version never scores higher than the original where neutrophils are over 80 % or unknown', () => {
    fc.assert(
      fc.property(findings, (input) => {
        fc.pre(input.pmnPercent === null || input.pmnPercent > 80);
        expect(consensus(input).totalScore).toBeLessThanOrEqual(original(input).totalScore);
      }),
    );
  });
});
