import type { Response } from 'supertest';

/** The refresh cookie that an answer sets: its value and its attributes in lower case. */
export function refreshCookieOf(response: Response): { value: string; header: string; attributes: string[] } {
  const lines = ([] as string[]).concat(response.headers['set-cookie'] ?? []);
  const line = lines.find((each) => each.startsWith('kerfside_refresh='));
  if (!line) throw new Error(`no refresh cookie in the answer ${response.status}`);
  const [pair, ...attributes] = line.split(';').map((part) => part.trim());
  return { value: pair!.slice('kerfside_refresh='.length), header: pair!, attributes: attributes.map((each) => each.toLowerCase()) };
}
