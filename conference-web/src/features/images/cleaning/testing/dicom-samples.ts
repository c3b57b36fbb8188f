import { readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';

/** DICOM files that nobody here wrote: those of Debian's python3-pydicom. */
const ROOT = '/usr/lib/python3/dist-packages/pydicom/data';
const NO_DICOM = /\.(py|pyc|json|txt|md|dump|gz)$|README$/;

export interface Sample {
  /** Its path below the package's folder of data. */
  name: string;
  path: string;
  bytes: Uint8Array<ArrayBuffer>;
}

export function dicomSamples(): Sample[] {
  return filesBelow(ROOT)
    .filter((path) => !NO_DICOM.test(path))
    .map((path) => ({ name: path.slice(ROOT.length + 1), path, bytes: new Uint8Array(readFileSync(path)) }));
}

export const dicomSample = (name: string): Uint8Array<ArrayBuffer> => new Uint8Array(readFileSync(join(ROOT, name)));

function filesBelow(folder: string): string[] {
  return readdirSync(folder)
    .sort()
    .flatMap((name) => {
      const path = join(folder, name);
      return statSync(path).isDirectory() ? filesBelow(path) : [path];
    });
}
