import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { performance } from 'node:perf_hooks';

const WARM_UP = 10;
const ROUNDS = 60;

export function demoAccounts(root) {
  return JSON.parse(readFileSync(join(root, 'conference-api/src/database/seeds/demo-accounts.json'), 'utf8'));
}

/** Server time of what a page asks first, one request at a time, after a warm-up: median and 95th percentile. */
export async function measurePages(address, { password }, print) {
  const token = await signIn(address, 'panellist@kerfside.example', password);
  const headers = { Authorization: `Bearer ${token}` };
  const json = async (path) => (await fetch(`${address}${path}`, { headers })).json();
  const { items } = await json('/api/cases?stage=listed');
  const meetings = await json('/api/meetings');
  const busiest = meetings.items.find((meeting) => meeting.caseCount > 0) ?? meetings.items[0];
  const pages = {
    'case list': '/api/cases',
    'case list, searched': '/api/cases?query=shell',
    'case page': `/api/cases/${items[0].id}`,
    'case threads': `/api/cases/${items[0].id}/threads`,
    'case rounds': `/api/cases/${items[0].id}/rounds`,
    'meeting page': `/api/meetings/${busiest.id}`,
  };
  for (const [name, path] of Object.entries(pages)) {
    const times = [];
    for (let round = -WARM_UP; round < ROUNDS; round++) {
      const started = performance.now();
      const response = await fetch(`${address}${path}`, { headers });
      await response.arrayBuffer();
      if (response.status !== 200) throw new Error(`${name} answered ${response.status}`);
      if (round >= 0) times.push(performance.now() - started);
    }
    times.sort((a, b) => a - b);
    print({ name, unit: 'ms', n: ROUNDS, median: round1(times[ROUNDS / 2]), p95: round1(times[Math.floor(ROUNDS * 0.95)]), limit: 100 });
  }
}

async function signIn(address, email, password) {
  const response = await fetch(`${address}/api/auth/sign-in`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json' },
    body: JSON.stringify({ email, password }),
  });
  return (await response.json()).accessToken;
}

const round1 = (number) => Math.round(number * 10) / 10;
