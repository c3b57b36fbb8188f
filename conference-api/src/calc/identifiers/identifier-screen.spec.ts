import { CalcInputError } from '../common/calc-input-error.js';
import { screenIdentifiers } from './identifier-screen.js';
import type { IdentifierScreenInput } from './identifier-screen.js';

const screen = (text: string) => screenIdentifiers({ text }).findings;
const brief = (text: string) => screen(text).map(({ kind, text: found, strength }) => [kind, found, strength]);

describe('dates', () => {
  // Source: 45 CFR 164.514(b)(2)(i)(C), all elements of dates except the year; the ways of writing
  // them are common practice without a source.
  test.each([
    ['2021-03-12', 'certain'],
    ['2021/03/12', 'certain'],
    ['2021-03-12T07:30:00Z', 'certain'],
    ['12/03/2021', 'certain'],
    ['03/12/2021', 'certain'],
    ['12.03.2021', 'certain'],
    ['12-03-2021', 'certain'],
    ['3/12/21', 'likely'],
    ['12-Mar-21', 'likely'],
    ['12 Mar 2021', 'certain'],
    ['12th of March 2021', 'certain'],
    ['March 12th 2021', 'certain'],
    ['March 12, 2021', 'certain'],
    ['20210312', 'likely'],
    ['20210312T0730', 'certain'],
    ['12 mars 2021', 'certain'],
    ['1er août 2020', 'certain'],
    ['12. März 2021', 'certain'],
    ['12 de marzo de 2021', 'certain'],
    ['12 March', 'likely'],
    ['March 2021', 'likely'],
    ['03/2021', 'likely'],
    ['week 12 of 2021', 'likely'],
    ['spring 2021', 'likely'],
    ['Easter 2021', 'likely'],
    ['Tuesday 12th', 'likely'],
  ])('%s', (date, strength) => {
    expect(brief(`seen again, ${date}, in clinic`)).toEqual([['date', date, strength]]);
  });

  test('both dates of a range', () => {
    expect(brief('12/03/2021-14/03/2021').map(([, found]) => found)).toEqual(['12/03/2021', '14/03/2021']);
    expect(brief('2021-03-12/2021-03-15').map(([, found]) => found)).toEqual(['2021-03-12', '2021-03-15']);
  });

  test.each(['2021-13-40', '31/02/2021', '45/20/2021', 'in 2019', 'March on', 'the stem may 5 mm later', 'v3.12.21'])(
    '%s is none',
    (text) => expect(brief(text)).toEqual([]),
  );
});

describe('births and ages', () => {
  // Source: 45 CFR 164.514(b)(2)(i)(C): ages over 89 and years that tell them; '90 or older' is allowed.
  test.each([
    ['DOB 120321', '120321', 'certain'],
    ['DOB: 12/03/1931', '12/03/1931', 'certain'],
    ['d.o.b. 12.3.31', '12.3.31', 'certain'],
    ['Date of birth is 12 March 1931', '12 March 1931', 'certain'],
    ['born on March 12, 1931', 'March 12, 1931', 'certain'],
    ['née le 12/03/1931', '12/03/1931', 'certain'],
    ['born in 1931', '1931', 'likely'],
    ['year of birth 1931', '1931', 'likely'],
  ])('%s', (text, found, strength) => {
    expect(brief(text)).toEqual([['date-of-birth', found, strength]]);
  });

  test.each([
    ['a 92-year-old woman', '92-year-old'],
    ['93 years old', '93 years old'],
    ['aged 91', '91'],
    ['Age: 104', '104'],
    ['at the age of 90', '90'],
    ['94 y/o', '94 y/o'],
    ['95yo', '95yo'],
    ['ninety-two year old', 'ninety-two year old'],
    ['a nonagenarian', 'nonagenarian'],
  ])('%s', (text, found) => {
    expect(brief(text)).toEqual([['age-over-89', found, 'certain']]);
  });

  test.each(['89-year-old', 'aged 89', 'aged 90 and over', 'age 90+', '90 or older', 'over 90 years old', 'turned 90 degrees', '92 years after', '95 % at 10 years', 'flexion 95'])(
    '%s is none',
    (text) => expect(brief(text)).toEqual([]),
  );
});

describe('numbers of people and records', () => {
  // Source of the numbers: see checksums.spec.ts.
  test.each([
    ['NHS 943 476 5919', 'nhs-number', '943 476 5919', 'certain'],
    ['NHS no: 9434765870', 'nhs-number', '9434765870', 'certain'],
    ['943-476-5919', 'nhs-number', '943-476-5919', 'likely'],
    ['PHN 9698 658 215', 'health-number', '9698 658 215', 'certain'],
    ['9698658215', 'health-number', '9698658215', 'likely'],
    ['OHIP 9876543217', 'health-number', '9876543217', 'certain'],
    ['Medicare 2950 65430 1', 'health-number', '2950 65430 1', 'certain'],
    ['medicare no 2950 65430', 'health-number', '2950 65430', 'certain'],
    ['SIN 046-454-286', 'national-id', '046-454-286', 'certain'],
    ['046-454-286', 'national-id', '046-454-286', 'likely'],
    ['SSN 123-12-1234', 'national-id', '123-12-1234', 'certain'],
    ['4539 1488 0343 6467', 'card-number', '4539 1488 0343 6467', 'likely'],
    ['79927398713', 'record-number', '79927398713', 'likely'],
    ['79927398710', 'record-number', '79927398710', 'possible'],
    ['MRN 12345', 'record-number', '12345', 'certain'],
    ['MRN: 00-12-345', 'record-number', '00-12-345', 'certain'],
    ['hosp no. H123456', 'record-number', 'H123456', 'likely'],
    ['Hospital number: 00123', 'record-number', '00123', 'likely'],
    ['patient ID AB-1234', 'record-number', 'AB-1234', 'likely'],
    ['policy number 778899', 'record-number', '778899', 'likely'],
    ['1.2.840.113619.2.55.3.604688119.971', 'record-number', '1.2.840.113619.2.55.3.604688119.971', 'likely'],
  ])('%s', (text, kind, found, strength) => {
    expect(brief(text)).toEqual([[kind, found, strength]]);
  });

  test('a labelled number with a wrong check digit is still a number of someone', () => {
    expect(brief('NHS number 943 476 5918')).toEqual([['record-number', '943 476 5918', 'likely']]);
  });

  test('no check digit makes 999 000 000x an NHS number', () => {
    for (const digit of '0123456789') expect(brief(`999 000 000${digit}`)).toEqual([]);
  });

  test.each(['0000000000', '000 000 0000', 'NHS 0000000000', '943 476 5918', '1111111', '1 000 000', '1500000/µL', '2000000 cells'])(
    '%s is none',
    (text) => expect(brief(text)).toEqual([]),
  );

  test('digits of another script and narrow spaces hide nothing, and the text is cut out as written', () => {
    expect(brief('NHS ９４３ ４７６ ５９１９')).toEqual([['nhs-number', '９４３ ４７６ ５９１９', 'certain']]);
    expect(brief('943\u00a0476\u00a05919')).toEqual([['nhs-number', '943\u00a0476\u00a05919', 'likely']]);
    expect(brief('12\u201103\u20112021')).toEqual([['date', '12\u201103\u20112021', 'certain']]);
  });
});

describe('devices', () => {
  // Source: 45 CFR 164.514(b)(2)(i)(M), device identifiers and serial numbers; UDI as GS1 writes it
  // for people to read, from memory.
  test.each([
    ['serial no 12345', '12345', 'certain'],
    ['S/N AB-12345.', 'AB-12345', 'certain'],
    ['Lot: 12A34', '12A34', 'certain'],
    ['lot number 4711', '4711', 'certain'],
    ['lot 20193344', '20193344', 'likely'],
    ['UDI (01)04012345678901(17)251231(10)ABC123, then', '(01)04012345678901(17)251231(10)ABC123', 'certain'],
  ])('%s', (text, found, strength) => {
    expect(brief(text)).toEqual([['device-serial', found, strength]]);
  });

  test.each(['a lot 24 mm', 'serial CRP 24, 30, 12', 'a batch of 3 screws', 'implant size 54 mm'])('%s is none', (text) =>
    expect(brief(text)).toEqual([]),
  );
});

describe('contact', () => {
  // Source: 45 CFR 164.514(b)(2)(i)(D)-(F), (N), (O). Numbers from ranges kept for fiction (from
  // memory) and addresses from RFC 2606, RFC 5737 and RFC 3849.
  test.each([
    ['tel. 0115 496 0123', 'phone', '0115 496 0123', 'certain'],
    ['phone: (604) 555-0123', 'phone', '(604) 555-0123', 'certain'],
    ['604-555-0123', 'phone', '604-555-0123', 'likely'],
    ['+44 20 7946 0958', 'phone', '+44 20 7946 0958', 'likely'],
    ['07700 900123', 'phone', '07700 900123', 'likely'],
    ['ext 4567', 'phone', '4567', 'likely'],
    ['jo.doe+x@mail.example.org.', 'email', 'jo.doe+x@mail.example.org', 'certain'],
    ['see https://example.org/a?b=1, then', 'url', 'https://example.org/a?b=1', 'certain'],
    ['www.example.org', 'url', 'www.example.org', 'certain'],
    ['example.com/notes', 'url', 'example.com/notes', 'likely'],
    ['192.0.2.17', 'ip-address', '192.0.2.17', 'likely'],
    ['2001:db8::1', 'ip-address', '2001:db8::1', 'likely'],
  ])('%s', (text, kind, found, strength) => {
    expect(brief(text)).toEqual([[kind, found, strength]]);
  });

  test.each(['300.1.2.3', 'version 1.2.3.4', '12:30:45', 'at 07:30', 'removed.It was', '1/2/7', '@ 3 pm', 'a@b'])('%s is none', (text) =>
    expect(brief(text)).toEqual([]),
  );
});

describe('places', () => {
  // Source: 45 CFR 164.514(b)(2)(i)(B). Forms of postcodes and streets: common practice, no source.
  test.each([
    ['SW1A 1AA', 'postcode', 'SW1A 1AA', 'likely'],
    ['K1A 0B1', 'postcode', 'K1A 0B1', 'likely'],
    ['NY 10023', 'postcode', '10023', 'likely'],
    ['zip 90210', 'postcode', '90210', 'certain'],
    ['12 High Street', 'address', '12 High Street', 'likely'],
    ['5 rue de la Paix', 'address', '5 rue de la Paix', 'likely'],
    ['Hauptstraße 12', 'address', 'Hauptstraße 12', 'likely'],
    ['P.O. Box 123', 'address', 'P.O. Box 123', 'likely'],
    ['seen at Northgate Hospital', 'place', 'Northgate Hospital', 'likely'],
    ['lives in Oldtown', 'place', 'Oldtown', 'possible'],
  ])('%s', (text, kind, found, strength) => {
    expect(brief(text)).toEqual([[kind, found, strength]]);
  });

  test.each(['the General Hospital', 'Revision Hip Clinic', 'T12 vertebra', 'L5 nerve root', 'S1 2 mm', 'lives in sheltered housing', 'BP 120'])(
    '%s is none',
    (text) => expect(brief(text)).toEqual([]),
  );
});

describe('names', () => {
  // Source: 45 CFR 164.514(b)(2)(i)(A), of the person, relatives and household; forms from common
  // practice, the caret form from the PN of DICOM PS3.5. All names are made up.
  test.each([
    ['Mr Smith', 'Smith', 'certain'],
    ["Mrs. O'Brien-Jones", "O'Brien-Jones", 'certain'],
    ['Mr J.S. was seen', 'J.S.', 'certain'],
    ['Dr van der Berg', 'van der Berg', 'likely'],
    ['mr jones came', 'jones', 'likely'],
    ['Name: jane doe', 'jane doe', 'certain'],
    ['Surname: Doe', 'Doe', 'certain'],
    ['next of kin Smith', 'Smith', 'likely'],
    ['his daughter Anna', 'Anna', 'likely'],
    ['DOE^JANE^A', 'DOE^JANE^A', 'likely'],
    ['Doe, Jane', 'Doe, Jane', 'likely'],
    ['Jane Doe was admitted', 'Jane Doe', 'likely'],
    ['JANE DOE', 'JANE DOE', 'likely'],
    ['Margaret felt well', 'Margaret', 'possible'],
    ['patient JD', 'JD', 'possible'],
    ['initials: J.D.', 'J.D.', 'likely'],
    ['seen by Patel', 'Patel', 'possible'],
  ])('%s', (text, found, strength) => {
    expect(brief(text)).toEqual([['name', found, strength]]);
  });

  test.each([
    'Thomas splint and Robert Jones bandage',
    'Charlson 5, Paprosky IIIB, DeLee and Charnley zone II, Köhler line intact',
    'MR imaging, mr scan',
    'Patient: Female, 72',
    'Name: withheld',
    'file name: scan',
    'Surgeon: Senior',
    'Kocher-Langenbeck approach, Trendelenburg test, Judet view',
    'discussed with Microbiology',
  ])('%s: none', (text) => expect(brief(text)).toEqual([]));
});

describe('what a revision surgeon writes is no identifier', () => {
  // Common practice, no source.
  test.each([
    'Cup at 45/20, 28/36 head, back in 1/52 and 6/12, BP 120/80.',
    "Loss from 10-2 o'clock, screws at 10, 11 and 2 o'clock, 9-5 o'clock",
    'Admitted 3 days after surgery, 9 years after the index operation, day 20, week 6',
    'CRP 24 mg/L, ESR 45 mm/h, WBC 4200/µL, PMN 82 %, D-dimer 900 µg/L, Hb 112 g/L, K 4.2, platelets 250000',
    'Shell 54 mm, liner 28 mm, screws 6.5 x 25 mm, taper 12/14, head +3.5 mm, 22.225 mm, offset 43',
    'Software 4.2.10, version 1.2.3, DICOM 3.0, ISO 5832-3, ISO 7206-10',
    'R 52, L 42; 38.381 / 19.279; 0.166667 mm/px; 1/3 of the rim; 40-60 % host bone; p = 0.029; 95 % CI 1.2-4.5',
    'Vancomycin 1 g, 3 of 5 cultures grew Staphylococcus epidermidis, 50 CFU/mL, 1.5 x 10^9/L',
    'Oxford hip score 18/48, BMI 31.2, ASA III, INR 1.1, HbA1c 52 mmol/mol',
    'Option 1: one stage with a 58 mm shell. Ratings 7, 8, 8, 9. Vote 7/9. Next meeting at 07:30.',
    'Primary in 2014, first revision in 2019; definition of 2018; 2018;33:1309',
  ])('%s', (text) => expect(brief(text)).toEqual([]));
});

describe('merging', () => {
  test('overlapping findings become one with the strongest kind', () => {
    expect(brief('DOB 12/03/1931')).toEqual([['date-of-birth', '12/03/1931', 'certain']]);
    expect(brief('Jane.Doe@example.org')).toEqual([['email', 'Jane.Doe@example.org', 'certain']]);
    expect(brief('tel 9434765919')).toEqual([['phone', '9434765919', 'certain']]);
  });

  test('offsets are UTF-16 code units of the text as given', () => {
    const text = '🦴 é\u0301 Mr Smith, 12/03/2021';
    expect(screen(text)).toEqual([
      { kind: 'name', start: text.indexOf('Smith'), end: text.indexOf('Smith') + 5, text: 'Smith', strength: 'certain' },
      { kind: 'date', start: text.indexOf('12/'), end: text.length, text: '12/03/2021', strength: 'certain' },
    ]);
  });

  test('an empty text has no findings, and every answer says what it cannot find', () => {
    const { findings, definition, cautions } = screenIdentifiers({ text: '' });
    expect(findings).toEqual([]);
    expect(definition).toContain('164.514');
    expect(cautions.join(' ')).toContain('not a proof');
  });
});

test.each([
  [{}, 'required'],
  [{ text: null }, 'required'],
  [{ text: 7 }, 'type'],
  [{ text: 'x'.repeat(500_001) }, 'too-long'],
])('refuses bad input %#', (input, code) => {
  const run = () => screenIdentifiers(input as IdentifierScreenInput);
  expect(run).toThrow(CalcInputError);
  expect(run).toThrow(expect.objectContaining({ field: 'text', code }));
});
