import { CalcInputError } from '../common/calc-input-error.js';
import { calculateInfection2013 } from './infection-2013.js';
import type { Infection2013Input } from './infection-2013.js';

const chronic = (findings: Partial<Infection2013Input> = {}) => calculateInfection2013({ timing: 'chronic', ...findings });
const acute = (findings: Partial<Infection2013Input> = {}) => calculateInfection2013({ timing: 'acute', ...findings });

describe('definition of 2013', () => {
  // Source: josr-online s13018-021-02296-7 Table 1 (criteria), PMC6678965 Table 1 (thresholds);
  // counts worked by hand.
  test('three of five minor criteria', () => {
    const result = chronic({ crpMgL: 24, esrMmH: 45, synovialWbcPerUl: 4200, pmnPercent: 85 });
    expect(result).toMatchObject({ criteriaMet: 3, verdict: 'infected' });
    expect(result.criteria).toEqual(['serum-crp-and-esr', 'synovial-count-or-esterase', 'synovial-neutrophils']);
  });

  test.each([
    [{ crpMgL: 24 }, 0, 'not-infected'],
    [{ esrMmH: 45 }, 0, 'not-infected'],
    [{ crpMgL: 24, esrMmH: 30 }, 0, 'not-infected'],
    [{ crpMgL: 24, esrMmH: 31 }, 1, 'not-infected'],
    [{ synovialWbcPerUl: 9000, leukocyteEsterase: '++' }, 1, 'not-infected'],
    [{ leukocyteEsterase: '+' }, 0, 'not-infected'],
    [{ histologyPositive: true, singlePositiveCulture: true }, 2, 'not-infected'],
    [{ histologyPositive: true, singlePositiveCulture: true, pmnPercent: 81 }, 3, 'infected'],
    [{ purulence: true, alphaDefensin: true, dDimerUgL: 5000, synovialCrpMgL: 50 }, 0, 'not-infected'],
    [{ crpMgL: 24, synovialWbcPerUl: 9000, pmnPercent: 95 }, 2, 'not-infected'],
  ] as const)('%j', (findings, criteriaMet, verdict) => {
    expect(chronic(findings)).toMatchObject({ criteriaMet, verdict });
  });

  test.each([
    ['synovialWbcPerUl', 3000],
    ['pmnPercent', 80],
  ] as const)('chronic: %s counts over %d only', (field, threshold) => {
    expect(chronic({ [field]: threshold }).criteriaMet).toBe(0);
    expect(chronic({ [field]: threshold + 0.5 }).criteriaMet).toBe(1);
  });

  test('acute thresholds', () => {
    expect(acute({ crpMgL: 100, esrMmH: 60, synovialWbcPerUl: 10_000, pmnPercent: 90 }).criteriaMet).toBe(0);
    expect(acute({ crpMgL: 101, esrMmH: 60, synovialWbcPerUl: 10_001, pmnPercent: 90.5 }).criteriaMet).toBe(3);
  });

  test('a major criterion alone', () => {
    expect(chronic({ sinusTract: true })).toMatchObject({ criteriaMet: 0, verdict: 'infected', majorCriteria: ['sinusTract'] });
    expect(chronic({ sameOrganismCultures: 2 }).verdict).toBe('infected');
    expect(chronic({ sameOrganismCultures: 1 }).verdict).toBe('not-infected');
  });

  test('missing findings are named, those without a role are not, and what they could change is told', () => {
    const result = chronic({ crpMgL: 24, histologyPositive: true, pmnPercent: 85, sinusTract: false });
    expect(result.missing).toEqual(['sameOrganismCultures', 'esrMmH', 'synovialWbcPerUl', 'leukocyteEsterase', 'singlePositiveCulture']);
    expect(result.highestPossibleCriteria).toBe(5);
    expect(result.wouldChange).toContainEqual({ field: 'esrMmH', ifItWere: 'over 30 mm/h', criteriaMet: 3, verdict: 'infected' });
    expect(result.cautions.join(' ')).toContain('not met on what is known');
  });

  test('a normal CRP rules the serum criterion out whatever the ESR', () => {
    expect(chronic({ crpMgL: 10 }).highestPossibleCriteria).toBe(4);
  });

  test('refuses a missing timing, an unknown variant and a value out of range', () => {
    const refused = (input: unknown) => () => calculateInfection2013(input as Infection2013Input);
    expect(refused({})).toThrow(expect.objectContaining({ field: 'timing', code: 'required' }));
    expect(refused({ timing: 'acute', variant: 'x' })).toThrow(expect.objectContaining({ field: 'variant', code: 'choice' }));
    expect(refused({ timing: 'acute', pmnPercent: 101 })).toThrow(CalcInputError);
  });
});
