import { ByteReader } from './byte-reader.js';
import type { DicomElement, DicomEncoding } from './dicom-elements.js';
import type { DicomValues } from './value-rules.js';

/** No attribute that is kept as text or number is longer. */
const LONGEST = 16_384;
const WIDTHS: Record<string, number> = { US: 2, SS: 2, AT: 4, UL: 4 };

/** The values of an attribute: numbers of the binary representations, else text in its parts. Empty where too long. */
export function valuesOf(bytes: Uint8Array, element: DicomElement, vr: string, encoding: DicomEncoding): DicomValues {
  if (element.end - element.value > LONGEST) return [];
  const width = WIDTHS[vr];
  return width ? binary(bytes, element, vr, width, encoding) : parts(bytes, element);
}

function binary(bytes: Uint8Array, { value, end }: DicomElement, vr: string, width: number, encoding: DicomEncoding): number[] {
  if ((end - value) % width !== 0) return [];
  const reader = new ByteReader(bytes, encoding.bigEndian);
  const numbers: number[] = [];
  for (let at = value; at < end; at += width) {
    if (vr === 'AT') numbers.push(reader.u16(at) * 0x10000 + reader.u16(at + 2));
    else numbers.push(vr === 'SS' ? reader.s16(at) : vr === 'UL' ? reader.u32(at) : reader.u16(at));
  }
  return numbers;
}

function parts(bytes: Uint8Array, { value, end }: DicomElement): string[] {
  const text = new ByteReader(bytes).latin(value, end).replace(/[\0 ]+$/, '');
  return text === '' ? [] : text.split('\\').map((part) => part.trim());
}
