import fc from 'fast-check';
import { KEPT, type KeptAttribute, type KeptAttributes } from './kept-attributes.js';
import * as words from './kept-words.js';

const all = (attributes: KeptAttributes): KeptAttribute[] =>
  [...attributes.values()].flatMap((attribute) => (attribute.items ? all(attribute.items) : [attribute]));
const TEXT = new Set(['CS', 'DS', 'IS', 'LO']);
const texts = all(KEPT).filter(({ vrs }) => vrs.some((vr) => TEXT.has(vr)));
const KNOWN = new Set(Object.values(words).flat());
const FIXED = [
  'ORIGINAL',
  'DERIVED',
  'PRIMARY',
  'SECONDARY',
  'LINEAR',
  'LINEAR_EXACT',
  'SIGMOID',
  'FOR PRESENTATION',
  'FOR PROCESSING',
  'GEOMETRY',
  'FIDUCIAL',
  'LIN',
  'LOG',
  'DISP',
  'IDENTITY',
  'INVERSE',
];

// PS3.5 6.2: DS and IS are numbers in text
const isNumber = (value: string) => /^[+-]?[\d.]+([eE][+-]?\d+)?$/.test(value) && value.length <= 16;
const isOrientation = (value: string) => /^[APRLHF]{1,3}$/.test(value);
const isHarmless = (value: string) =>
  isNumber(value) || KNOWN.has(value) || FIXED.includes(value) || /^[RLUB]$/.test(value) || /^0[01]$/.test(value) || isOrientation(value);

it('lets nothing through but numbers and words of a list, whatever stands there', () => {
  fc.assert(
    fc.property(
      fc.constantFrom(...texts),
      fc.array(fc.oneof(fc.string({ maxLength: 20 }), fc.constantFrom('DOE', 'AXIAL', '0.139', 'R')), { maxLength: 6 }),
      ({ rule }, values) => {
        for (const value of rule(values) ?? []) expect(isHarmless(String(value))).toBe(true);
      },
    ),
    { numRuns: 5000 },
  );
});

it.each(['DOE^JANE', 'Doe', '12 Mar 1950', '1950-03-12', '943 476 5919', 'hip of Mrs Doe', "O'NEIL"])('lets %s stand nowhere', (value) => {
  expect(texts.filter(({ rule }) => (rule([value]) as string[] | null)?.includes(value)).map(({ name }) => name)).toEqual([]);
});

it('takes numbers as DICOM writes them (PS3.5 6.2, DS and IS)', () => {
  const spacing = KEPT.get(0x00280030)!.rule;
  expect([spacing(['0.139', '0.139']), spacing(['1e-1', '+.5']), spacing(['-1.', '2'])]).not.toContain(null);
  expect([spacing(['0.139']), spacing(['0.139', '']), spacing(['0,139', '0,139']), spacing(['0.1390000000000000001', '1'])]).toEqual([
    null,
    null,
    null,
    null,
  ]);
});

it('holds no record number in a count: seven digits are too many', () => {
  expect([KEPT.get(0x00200011)!.rule(['123456']), KEPT.get(0x00200011)!.rule(['1234567'])]).toEqual([['123456'], null]);
});

it('leaves out of an image type what is not on its list', () => {
  expect(KEPT.get(0x00080008)!.rule(['ORIGINAL', 'PRIMARY', 'AXIAL', 'CT_SOM5 SPI DOE'])).toEqual(['ORIGINAL', 'PRIMARY', 'AXIAL']);
});
