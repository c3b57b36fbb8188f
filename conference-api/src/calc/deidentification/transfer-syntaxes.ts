/** How the samples of a picture are packed. */
export type Packing = 'plain' | 'rle' | 'jpeg' | 'jpeg2000';

export interface TransferSyntax {
  name: string;
  packing: Packing;
  explicit: boolean;
  bigEndian: boolean;
  deflated: boolean;
}

const plain = (name: string, explicit = true, bigEndian = false, deflated = false): TransferSyntax => ({
  name,
  packing: 'plain',
  explicit,
  bigEndian,
  deflated,
});
const packed = (name: string, packing: Packing): TransferSyntax => ({ name, packing, explicit: true, bigEndian: false, deflated: false });

export const EXPLICIT_LITTLE = '1.2.840.10008.1.2.1';

/** Those that are read (PS3.5 section 10, PS3.6 annex A). */
export const TRANSFER_SYNTAXES: ReadonlyMap<string, TransferSyntax> = new Map([
  ['1.2.840.10008.1.2', plain('Implicit VR Little Endian', false)],
  [EXPLICIT_LITTLE, plain('Explicit VR Little Endian')],
  ['1.2.840.10008.1.2.1.99', plain('Deflated Explicit VR Little Endian', true, false, true)],
  ['1.2.840.10008.1.2.2', plain('Explicit VR Big Endian', true, true)],
  ['1.2.840.10008.1.2.5', packed('RLE Lossless', 'rle')],
  ['1.2.840.10008.1.2.4.50', packed('JPEG Baseline', 'jpeg')],
  ['1.2.840.10008.1.2.4.51', packed('JPEG Extended', 'jpeg')],
  ['1.2.840.10008.1.2.4.57', packed('JPEG Lossless', 'jpeg')],
  ['1.2.840.10008.1.2.4.70', packed('JPEG Lossless, first-order prediction', 'jpeg')],
  ['1.2.840.10008.1.2.4.80', packed('JPEG-LS Lossless', 'jpeg')],
  ['1.2.840.10008.1.2.4.81', packed('JPEG-LS Near-lossless', 'jpeg')],
  ['1.2.840.10008.1.2.4.90', packed('JPEG 2000 Lossless', 'jpeg2000')],
  ['1.2.840.10008.1.2.4.91', packed('JPEG 2000', 'jpeg2000')],
]);

/** A clean file is written in one of these: the packed ones as they came, all others as Explicit VR Little Endian. */
export const isCleanSyntax = (uid: string): boolean => uid === EXPLICIT_LITTLE || ![undefined, 'plain'].includes(TRANSFER_SYNTAXES.get(uid)?.packing);
