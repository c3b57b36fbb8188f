/** One attribute of a DICOM data set, as it lies in the bytes. */
export interface DicomElement {
  /** Group and element in one number. */
  tag: number;
  /** Two letters; empty where the encoding does not write it. */
  vr: string;
  /** Where its tag begins, its value begins, and the first byte after it. */
  at: number;
  value: number;
  end: number;
  /** Of a sequence: the attributes of each item. */
  items?: DicomElement[][];
  /** Of a compressed picture: the offset table, then the pieces. */
  pieces?: { at: number; end: number }[];
}

export interface DicomEncoding {
  explicit: boolean;
  bigEndian: boolean;
}

/** '(0010,0020)', as the standard writes it. */
export function tagText(tag: number): string {
  const hex = tag.toString(16).toUpperCase().padStart(8, '0');
  return `(${hex.slice(0, 4)},${hex.slice(4)})`;
}

export const isPrivate = (tag: number): boolean => Math.floor(tag / 0x10000) % 2 === 1;
export const isGroupLength = (tag: number): boolean => tag % 0x10000 === 0;
