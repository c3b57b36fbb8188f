import { execFileSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

describe('openapi.json', () => {
  it('is the one that the code describes', () => {
    const folder = mkdtempSync(join(tmpdir(), 'kerfside-openapi-'));
    try {
      // compiled by Nest's own build, since its plugin reads the types of the code
      execFileSync('npx', ['nest', 'build', '--path', 'tsconfig.openapi.json'], { stdio: 'pipe' });
      const target = join(folder, 'openapi.json');
      execFileSync(process.execPath, ['.openapi/openapi.js', target], { stdio: 'pipe' });
      expect(JSON.parse(readFileSync('openapi.json', 'utf8'))).toEqual(JSON.parse(readFileSync(target, 'utf8')));
    } finally {
      rmSync(folder, { recursive: true, force: true });
    }
  }, 180_000);
});
