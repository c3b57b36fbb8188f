/** What is wrong with a file that is not taken at all. */
export type FileFault = 'empty' | 'cut-off' | 'broken' | 'too-large' | 'no-picture' | 'several-pictures' | 'not-read';

/** A file that can't be cleaned or checked; the message says why, in words for whoever sends it. */
export class FileRefusal extends Error {
  constructor(
    readonly fault: FileFault,
    message: string,
  ) {
    super(message);
  }
}
