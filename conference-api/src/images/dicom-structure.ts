import { promisify } from 'node:util';
import { inflateRaw } from 'node:zlib';
import { DicomElements, type DicomElement, DicomRefusal, ITEM, SEQUENCE_END, UNDEFINED } from './dicom-elements.js';
import { checkFrame } from './dicom-frame.js';
import { MOST_PIXELS } from './pixel-limit.js';

const META_START = 132;
const TRANSFER_SYNTAX = 0x00020010;
const IMPLICIT_LITTLE = '1.2.840.10008.1.2';
const EXPLICIT_BIG = '1.2.840.10008.1.2.2';
const DEFLATED = '1.2.840.10008.1.2.1.99';
const RUN_LENGTHS = '1.2.840.10008.1.2.5';
const PIXEL_DATA = 0x7fe00010;
// what the largest picture takes in 16 bits
const MOST_INFLATED = MOST_PIXELS * 2;

type Fact = 'samples' | 'photometric' | 'frames' | 'rows' | 'columns' | 'bits';

/** The attributes that say how large the picture is (PS3.3 C.7.6.3, C.7.6.6). */
const FACTS = new Map<number, Fact>([
  [0x00280002, 'samples'],
  [0x00280004, 'photometric'],
  [0x00280008, 'frames'],
  [0x00280010, 'rows'],
  [0x00280011, 'columns'],
  [0x00280100, 'bits'],
]);

type Facts = Partial<Record<Fact, DicomElement>>;

/**
 * Refuses, before a decoder is let near it, a DICOM file that is cut off, that unpacks to more than this
 * server takes, that holds no picture or several, or that the decoder is known to show wrongly.
 * @throws DicomRefusal
 */
export async function checkDicomStructure(bytes: Buffer): Promise<void> {
  const { syntax, end } = readMeta(bytes);
  const dataSet = syntax === DEFLATED ? await inflate(bytes.subarray(end)) : bytes;
  const elements = new DicomElements(dataSet, { explicit: syntax !== IMPLICIT_LITTLE, bigEndian: syntax === EXPLICIT_BIG });
  const facts: Facts = {};
  let at = syntax === DEFLATED ? 0 : end;
  while (at < dataSet.length) {
    const element = elements.read(at);
    if (element.tag === PIXEL_DATA) return checkPicture(elements, facts, element, syntax);
    const fact = FACTS.get(element.tag);
    if (fact) facts[fact] = element;
    at = elements.after(element);
  }
  throw new DicomRefusal('no-picture');
}

/** The file meta information is explicit little endian whatever follows (PS3.10 section 7.1). */
function readMeta(bytes: Buffer): { syntax: string; end: number } {
  const elements = new DicomElements(bytes, { explicit: true, bigEndian: false });
  let syntax = '';
  let at = META_START;
  while (at + 8 <= bytes.length && bytes.readUInt16LE(at) === 0x0002) {
    const element = elements.read(at);
    if (element.tag === TRANSFER_SYNTAX) syntax = elements.text(element);
    at = elements.after(element);
  }
  if (!syntax) throw new DicomRefusal(at + 8 > bytes.length ? 'cut-off' : 'broken');
  return { syntax, end: at };
}

async function inflate(packed: Buffer): Promise<Buffer> {
  try {
    return await promisify(inflateRaw)(packed, { maxOutputLength: MOST_INFLATED });
  } catch (error) {
    const { code } = error as { code?: string };
    throw new DicomRefusal(code === 'ERR_BUFFER_TOO_LARGE' ? 'too-large' : code === 'Z_BUF_ERROR' ? 'cut-off' : 'broken');
  }
}

function checkPicture(elements: DicomElements, facts: Facts, pixels: DicomElement, syntax: string): void {
  const number = (name: Fact, fallback: number) => (facts[name] ? elements.number(facts[name]) : fallback);
  const [rows, columns, bits] = [number('rows', 0), number('columns', 0), number('bits', 0)];
  if (!rows || !columns || !bits) throw new DicomRefusal('no-picture');
  if (rows * columns > MOST_PIXELS) throw new DicomRefusal('too-large');
  const frames = facts.frames ? Number(elements.text(facts.frames)) : 1;
  if (frames > 1) throw new DicomRefusal('frames', frames);
  // dcmjs-imaging 0.2.5 takes the bytes of such words, and the colours of such runs, in the wrong order
  if ((syntax === EXPLICIT_BIG && bits > 16) || (syntax === RUN_LENGTHS && number('samples', 1) > 1)) throw new DicomRefusal('not-read');
  const samples = number('samples', 1);
  if (pixels.length === UNDEFINED) return checkFrame(joinedFragments(elements, pixels), syntax, { rows, columns, samples, bits });
  const photometric = facts.photometric ? elements.text(facts.photometric) : '';
  // PS3.3 C.7.6.3.1.2: two pixels share their two colours
  const perPixel = photometric === 'YBR_FULL_422' ? 2 : samples;
  if (pixels.length < Math.ceil((rows * columns * perPixel * bits) / 8)) throw new DicomRefusal('cut-off');
}

/** PS3.5 A.4: a table of offsets, the pieces of the one compressed picture, each whole, and the end of the sequence. */
function joinedFragments(elements: DicomElements, pixels: DicomElement): Buffer {
  const pieces: Buffer[] = [];
  for (let at = pixels.value; ; ) {
    const piece = elements.read(at);
    if (piece.tag === SEQUENCE_END) return Buffer.concat(pieces.slice(1));
    if (piece.tag !== ITEM || piece.length === UNDEFINED) throw new DicomRefusal('broken');
    at = piece.value + piece.length;
    pieces.push(elements.bytes.subarray(piece.value, at));
  }
}
