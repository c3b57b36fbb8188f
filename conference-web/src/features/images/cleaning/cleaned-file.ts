/** What cleaning did to one attribute or part of a file, for the presenter to read before anything is sent. */
export interface RemovedItem {
  /** '(0010,0010)', with those of the sequences that hold it before it; or 'preamble', 'APP1 (EXIF)', … */
  place: string;
  name: string;
  action: 'removed' | 'emptied' | 'replaced' | 'blanked' | 'applied';
  /** The value as it was, short. It stays in the presenter's browser. */
  was: string;
}

export interface KeptItem {
  place: string;
  name: string;
  value: string;
}

export type FileKind = 'dicom' | 'jpeg' | 'png' | 'webp' | 'tiff';

export interface CleanedFile {
  kind: FileKind;
  bytes: Uint8Array<ArrayBuffer>;
  removed: RemovedItem[];
  kept: KeptItem[];
  /** What the original said of text in the picture, where it said something. */
  burnedIn: 'YES' | 'NO' | null;
}

export interface CleanOptions {
  /** That a person looked for text in the picture: only then does a DICOM file say that there is none. */
  pixelsConfirmed: boolean;
}

const ENDINGS: Record<FileKind, string> = { dicom: 'dcm', jpeg: 'jpg', png: 'png', webp: 'webp', tiff: 'tif' };

/** A name for sending: the original's may hold the patient's. */
export const uploadName = ({ kind }: Pick<CleanedFile, 'kind'>): string => `picture.${ENDINGS[kind]}`;
