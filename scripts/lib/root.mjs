import { existsSync, readFileSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';

/** The repository's root, found upwards from `from`: scripts, jest and workspaces all start elsewhere. */
export function projectRoot(from = process.cwd()) {
  let folder = resolve(from);
  for (;;) {
    const manifest = join(folder, 'package.json');
    if (existsSync(manifest) && JSON.parse(readFileSync(manifest, 'utf8')).name === 'kerfside') return folder;
    const parent = dirname(folder);
    if (parent === folder) throw new Error(`No Kerfside checkout around ${from}`);
    folder = parent;
  }
}
