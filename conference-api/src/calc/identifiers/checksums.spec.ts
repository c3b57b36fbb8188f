import fc from 'fast-check';
import {
  isAustralianMedicare,
  isBcHealthNumber,
  isCanadianSin,
  isNhsNumber,
  isOntarioHealthNumber,
  isUsSocialSecurity,
  passesLuhn,
} from './checksums.js';

const allTen = (nine: string) => Array.from('0123456789', (digit) => nine + digit);

describe('NHS number', () => {
  // Source: public tests of python-stdnum gb/nhs (943 476 5919, 943 476 5870 and their invalid
  // neighbours); 401 023 2137 from memory; 999 000 000x worked by hand: rest 10, never issued.
  test.each(['9434765919', '9434765870', '4010232137'])('%s is valid', (number) => {
    expect(isNhsNumber(number)).toBe(true);
  });

  test.each(['9434765918', '9434765871', '4010232138', '943476591', '94347659190', '943 476 5919', '0000000000', ''])('%s is not', (number) => {
    expect(isNhsNumber(number)).toBe(false);
  });

  test('999 000 000x has no valid check digit', () => {
    expect(allTen('999000000').filter(isNhsNumber)).toEqual([]);
  });

  test('at most one check digit fits, and no change of one digit goes unseen', () => {
    // Follows from weights 2 to 10 being prime to 11.
    fc.assert(
      fc.property(fc.stringMatching(/^[1-9]\d{8}$/), fc.nat(9), fc.nat(9), (nine, place, digit) => {
        const valid = allTen(nine).filter(isNhsNumber);
        expect(valid.length).toBeLessThanOrEqual(1);
        const [number] = valid;
        fc.pre(number !== undefined && number[place] !== String(digit));
        expect(isNhsNumber(number!.slice(0, place) + digit + number!.slice(place + 1))).toBe(false);
      }),
    );
  });
});

describe('Luhn', () => {
  // Source: the textbook number 79927398713; 046-454-286 is the public test number of the Canadian scheme.
  test.each(['79927398713', '046454286', '4539148803436467', '9876543217'])('%s passes', (number) => {
    expect(passesLuhn(number)).toBe(true);
  });

  test.each(['79927398710', '79927398711', '9876543210', '0000000000', '7', '', '12a4'])('%s does not', (number) => {
    expect(passesLuhn(number)).toBe(false);
  });

  test('sees any change of one digit', () => {
    fc.assert(
      fc.property(fc.stringMatching(/^[1-9]\d{5,14}$/), fc.nat(), fc.integer({ min: 1, max: 9 }), (start, at, shift) => {
        const number = Array.from('0123456789', (digit) => start + digit).find(passesLuhn);
        fc.pre(number !== undefined);
        const place = at % number!.length;
        const other = String((Number(number![place]) + shift) % 10);
        expect(passesLuhn(number!.slice(0, place) + other + number!.slice(place + 1))).toBe(false);
      }),
    );
  });
});

describe('health and insurance numbers', () => {
  // Source: python-stdnum ca/bc_phn.
  test('British Columbia', () => {
    expect(isBcHealthNumber('9698658215')).toBe(true);
    expect(isBcHealthNumber('9698648215')).toBe(false);
    expect(isBcHealthNumber('5736504210')).toBe(false);
  });

  // Source: 9876543217 stands in a public test; rule from memory.
  test('Ontario', () => {
    expect(isOntarioHealthNumber('9876543217')).toBe(true);
    expect(isOntarioHealthNumber('9876543210')).toBe(false);
    expect(isOntarioHealthNumber('0000000000')).toBe(false);
  });

  // Rule from memory; sums 140 and 170 worked by hand.
  test('Medicare of Australia', () => {
    expect(isAustralianMedicare('295065430')).toBe(true);
    expect(isAustralianMedicare('2950654301')).toBe(true);
    expect(isAustralianMedicare('212345670')).toBe(true);
    expect(isAustralianMedicare('295065431')).toBe(false);
    expect(isAustralianMedicare('195065430')).toBe(false);
  });

  test('Canadian SIN and the ranges of United States numbers that were never issued', () => {
    expect(isCanadianSin('046454286')).toBe(true);
    expect(isCanadianSin('046454287')).toBe(false);
    // Source: Social Security Administration: no 000, 666 or 9xx, no 00, no 0000 (from memory).
    expect(['000121234', '666121234', '900121234', '123001234', '123120000'].filter(isUsSocialSecurity)).toEqual([]);
    expect(isUsSocialSecurity('123121234')).toBe(true);
  });
});
