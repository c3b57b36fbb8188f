import fc from 'fast-check';
import { FINDING_KINDS, FINDING_STRENGTHS } from './finding.js';
import { screenIdentifiers } from './identifier-screen.js';

const PIECES = [
  '1', '12', '2021', '943 476 5919', '/', '-', '.', ' ', '  ', ':', '@', 'A', 'Aa', 'John ', 'born ', 'DOB ', 'NHS ', 'no. ', 'Mr ',
  'March ', '12/03/2021', '(', ')', '^', '+', 'www.', 'example.org', 'Hospital', 'of ', 'é', '\n', "'", ',', '🦴', '\u00a0', '５', 'aged ', '92',
] as const;
const notes = fc.array(fc.constantFrom(...PIECES), { maxLength: 60 }).map((pieces) => pieces.join(''));
const anyText = fc.oneof(notes, fc.string({ unit: 'binary', maxLength: 200 }), fc.string({ maxLength: 200 }));

test('findings lie in the text, in order, apart, and are cut out of it', () => {
  fc.assert(
    fc.property(anyText, (text) => {
      let end = 0;
      for (const finding of screenIdentifiers({ text }).findings) {
        expect(finding.start).toBeGreaterThanOrEqual(end);
        expect(finding.end).toBeGreaterThan(finding.start);
        expect(finding.end).toBeLessThanOrEqual(text.length);
        expect(text.slice(finding.start, finding.end)).toBe(finding.text);
        expect(FINDING_KINDS).toContain(finding.kind);
        expect(FINDING_STRENGTHS).toContain(finding.strength);
        end = finding.end;
      }
    }),
    { numRuns: 400 },
  );
});

test('the same text gives the same findings twice', () => {
  fc.assert(
    fc.property(notes, (text) => {
      expect(screenIdentifiers({ text })).toEqual(screenIdentifiers({ text }));
    }),
  );
});

test('a planted identifier is found wherever it stands among plain words', () => {
  const plain = fc
    .array(fc.constantFrom('the shell', 'was loose,', 'liner', 'out first;', 'three screws', '\n', 'well fixed.'), { maxLength: 12 })
    .map((words) => words.join(' '));
  const planted = fc.constantFrom('12/03/2021', '943 476 5919', 'jo@example.org', 'Mrs Doe', 'MRN 448812', '92-year-old', 'https://example.org/x');
  fc.assert(
    fc.property(plain, planted, plain, (before, identifier, after) => {
      const text = `${before} ${identifier} ${after}`;
      const value = identifier.split(' ').at(-1)!;
      const at = text.indexOf(identifier) + identifier.lastIndexOf(value);
      const covering = screenIdentifiers({ text }).findings.filter((one) => one.start <= at && one.end >= at + value.length);
      expect(covering).toHaveLength(1);
      expect(screenIdentifiers({ text: `${before}\n${after}` }).findings).toEqual([]);
    }),
  );
});

/** Processor time of the quicker of two runs: other work on the machine does not count. */
function millisecondsFor(text: string): number {
  const once = () => {
    const before = process.cpuUsage();
    screenIdentifiers({ text });
    return process.cpuUsage(before).user / 1000;
  };
  return Math.min(once(), once());
}

// A pattern that runs away takes 16 times as long for 4 times the text, or never ends; under 50 ms
// a quarter says too little.
test.each(['1', '1 ', '1.', '1-', 'a@', 'a@a.', 'Aa ', 'John ', 'Mr A ', 'van de ', 'Aa of ', 'NHS ', 'born ', 'name: ', 'address:', 'www.', '+1', '::', '^', '12 March, ', '0.1', "O'", '\n'])(
  'hostile text of 200 kB made of %j takes time in proportion',
  (unit) => {
    const ofLength = (length: number) => unit.repeat(Math.ceil(length / unit.length)).slice(0, length);
    const quarter = millisecondsFor(ofLength(50_000));
    const whole = millisecondsFor(ofLength(200_000));
    expect(whole).toBeLessThan(10 * Math.max(quarter, 50));
  },
);
