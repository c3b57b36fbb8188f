import { Problem } from '../common/problems/problem.js';
import { requireGoodPassword } from './password-rules.js';

// Rules: NIST SP 800-63B-4 (2025), 3.1.1.2. The sentences tried here are from memory or our own.
const person = { email: 'maren.holt@kerfside.example', name: 'Maren Holt' };

const refusal = (password: string): string | null => {
  try {
    requireGoodPassword('password', password, person);
    return null;
  } catch (error) {
    if (!(error instanceof Problem)) throw error;
    return `${error.errors[0]!.field}: ${error.errors[0]!.code}`;
  }
};

describe('requireGoodPassword', () => {
  it.each([
    ['fourteen characters', 'vex jumbo quiz', 'password: too-short'],
    ['fifteen characters', 'vex jumbo quizz', null],
    ['no capitals, digits or signs: composition is not asked for', 'slate heron umbrella', null],
    ['signs alone, fifteen different ones', '!"#$%&()*+,-./:;', null],
    ['256 characters', 'wo7 '.repeat(32) + [...Array(128).keys()].map((n) => String.fromCodePoint(0x4e00 + n)).join(''), null],
    ['257 characters', [...Array(257).keys()].map((n) => String.fromCodePoint(0x4e00 + n)).join(''), 'password: too-long'],
  ])('%s', (_, password, expected) => expect(refusal(password)).toBe(expected));

  it('counts code points, not bytes or UTF-16 units', () => {
    const owls = ['🦉', '🦊', '🦋', '🦌', '🦍', '🦎', '🦏', '🦐', '🦑', '🦒', '🦓', '🦔', '🦕', '🦖'];
    expect(refusal(owls.join(''))).toBe('password: too-short');
    expect(refusal([...owls, '🦗'].join(''))).toBeNull();
  });

  it('counts after NFKC: a base letter with its accent is one character', () => {
    // fourteen letters, two of them written with a combining acute accent
    expect(refusal('cafe\u0301 beau te\u0301xy')).toBe('password: too-short');
  });

  it.each([
    'correct horse battery staple',
    'Correct-Horse-Battery-Staple',
    'THE QUICK BROWN FOX',
    'passwordpassword',
    'qwertyuiopasdfgh',
    'Total Hip Replacement',
  ])('refuses what is guessed first: %s', (password) => expect(refusal(password)).toBe('password: common'));

  it('looks at the whole password: a known sentence inside a longer one is allowed', () => {
    expect(refusal('correct horse battery staple rides the 4th tram')).toBeNull();
  });

  it.each(['aaaaaaaaaaaaaaaa', 'abababababababab', '!!!!!!!!!!!!!!!!', '9012345678901234', 'zyxwvutsrqponmlk'])('refuses repeats and runs: %s', (password) =>
    expect(refusal(password)).toBe('password: repeated'),
  );

  it.each(['maren.holt@kerfside.example', 'Maren Holt Maren Holt', 'kerfside-kerfside-1', 'Kerfside Holt 2026'])('refuses what others know of the person: %s', (password) =>
    expect(refusal(password)).toBe('password: personal'),
  );

  it('allows a known word beside enough of one\'s own', () => expect(refusal('holt keeps nine lanterns')).toBeNull());
});
