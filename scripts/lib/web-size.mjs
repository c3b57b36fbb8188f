import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';

/** All script files that the manifest's `keys` need before they can run: themselves and their static imports. */
export function scriptClosure(manifest, keys) {
  const files = new Set();
  const seen = new Set();
  const visit = (key) => {
    if (seen.has(key)) return;
    seen.add(key);
    const chunk = manifest[key];
    if (!chunk) throw new Error(`${key} is not in the manifest`);
    if (/\.m?js$/.test(chunk.file)) files.add(chunk.file);
    for (const imported of chunk.imports ?? []) visit(imported);
  };
  for (const key of keys) visit(key);
  return files;
}

/** Bytes of these files, each gzipped by itself as a server sends it. */
export function scriptSize(dist, files) {
  let bytes = 0;
  for (const file of files) bytes += gzipSync(readFileSync(join(dist, file)), { level: 6 }).length;
  return bytes;
}

/** What each part that is loaded on demand adds to `loaded`, largest first. */
export function onDemandSizes(manifest, dist, loaded) {
  return Object.keys(manifest)
    .filter((key) => manifest[key].isDynamicEntry)
    .map((key) => ({ key, size: scriptSize(dist, new Set([...scriptClosure(manifest, [key])].filter((file) => !loaded.has(file)))) }))
    .filter(({ size }) => size > 0)
    .sort((a, b) => b.size - a.size);
}
