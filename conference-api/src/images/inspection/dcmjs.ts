import { createRequire } from 'node:module';
import { join } from 'node:path';

/** The part of dcmjs that is used here; it brings no types of its own. */
interface Dcmjs {
  data: {
    DicomMessage: {
      readFile(
        bytes: ArrayBuffer,
        options?: { noCopy?: boolean; ignoreErrors?: boolean },
      ): { meta: Record<string, unknown>; dict: Record<string, unknown> };
    };
    DicomMetaDictionary: { dictionary: Record<string, { name: string } | undefined> };
  };
  log: { disableAll?: () => void };
}

// its module build is named as a script, which not every Node 20 imports
export const dcmjs = createRequire(join(process.cwd(), 'package.json'))('dcmjs') as Dcmjs;
dcmjs.log.disableAll?.();
