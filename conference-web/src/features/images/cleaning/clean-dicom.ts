import { cleanFaults } from '@kerfside/calc/deidentification/clean-check';
import { type DicomElement, tagText } from '@kerfside/calc/deidentification/dicom-elements';
import { type DicomDataSet, type DicomMeta, readDataSet, readMeta, textOf } from '@kerfside/calc/deidentification/dicom-file';
import { FileRefusal } from '@kerfside/calc/deidentification/file-refusal';
import { pictureFacts } from '@kerfside/calc/deidentification/picture-facts';
import { contentOf, pictureClass } from '@kerfside/calc/deidentification/sop-classes';
import { EXPLICIT_LITTLE } from '@kerfside/calc/deidentification/transfer-syntaxes';
import type { UidMap } from '@kerfside/calc/deidentification/uid-map';
import * as written from '@kerfside/calc/deidentification/written-attributes';
import dcmjs, { type DicomValues } from 'dcmjs';
import { cleanValues, dcmjsTag } from './clean-data-set.js';
import type { CleanedFile, CleanOptions, RemovedItem } from './cleaned-file.js';
import { dicomFindings } from './dicom-findings.js';
import { inflateDataSet } from './inflate-data-set.js';
import { cleanSamples } from './samples.js';

dcmjs.log.disableAll?.();

/**
 * A DICOM picture with what the image room needs, and nothing else: allow-list, new UIDs, empty head; the
 * samples unchanged, packed as they came or as Explicit VR Little Endian. It is read again before it is
 * given back, by the same check as the server's.
 * @param uids Those of the other files of the upload.
 * Throws FileRefusal where the file is no picture, broken, cut off, or beyond what is taken.
 */
export async function cleanDicom(bytes: Uint8Array<ArrayBuffer>, uids: UidMap, { pixelsConfirmed }: CleanOptions): Promise<CleanedFile> {
  const meta = readMeta(bytes);
  const dataSet = meta.syntax.deflated
    ? readDataSet(inflateDataSet(bytes.subarray(meta.end)), 0, meta.syntax)
    : readDataSet(bytes, meta.end, meta.syntax);
  const sopClass = knownPicture(bytes, meta, dataSet);
  const facts = pictureFacts(dataSet);
  const samples = cleanSamples(dataSet, meta.syntax, facts);
  const { values, kept, unclean } = cleanValues(dataSet);
  const own = ownValues(dataSet, uids, sopClass, pixelsConfirmed);
  const clean = writeFile(meta, { ...values, ...own, [dcmjsTag(written.PIXEL_DATA)]: samples.value });
  refuseUnclean(clean, pixelsConfirmed);
  return {
    kind: 'dicom',
    bytes: clean,
    removed: [...aroundFindings(bytes, meta, dataSet), ...dicomFindings(dataSet, unclean), ...samples.removed],
    kept,
    burnedIn: burnedIn(dataSet),
  };
}

const valueOf = ({ bytes, elements }: DicomDataSet, wanted: number): string => {
  const element = elements.find(({ tag }) => tag === wanted);
  return element && !element.items && !element.pieces ? textOf(bytes, element) : '';
};

function knownPicture(bytes: Uint8Array, { elements }: DicomMeta, dataSet: DicomDataSet): string {
  const inHead = elements.find(({ tag }) => tag === 0x00020002);
  const uid = valueOf(dataSet, written.SOP_CLASS) || (inHead ? textOf(bytes, inHead) : '');
  if (!uid) throw new FileRefusal('broken', 'The DICOM file does not say what it holds: (0008,0016) SOP Class UID is missing.');
  if (!pictureClass(uid)) throw new FileRefusal('no-picture', `The DICOM file holds ${contentOf(uid)}, and only pictures are read here.`);
  return uid;
}

function burnedIn(dataSet: DicomDataSet): CleanedFile['burnedIn'] {
  const value = valueOf(dataSet, written.BURNED_IN);
  return value === 'YES' || value === 'NO' ? value : null;
}

function ownValues(dataSet: DicomDataSet, uids: UidMap, sopClass: string, confirmed: boolean): DicomValues {
  const own: DicomValues = { [dcmjsTag(written.SOP_CLASS)]: { vr: 'UI', Value: [sopClass] } };
  for (const [tag, { vr }] of written.EMPTIED) own[dcmjsTag(tag)] = { vr, Value: [] };
  for (const [tag, { vr, value }] of written.STATEMENTS) own[dcmjsTag(tag)] = { vr, Value: [value] };
  for (const tag of written.MAPPED_UIDS.keys()) {
    const old = valueOf(dataSet, tag);
    if (old) own[dcmjsTag(tag)] = { vr: 'UI', Value: [uids.replace(old)] };
    else if (written.NEEDED_UIDS.includes(tag)) own[dcmjsTag(tag)] = { vr: 'UI', Value: [uids.fresh()] };
  }
  if (confirmed) own[dcmjsTag(written.BURNED_IN)] = { vr: 'CS', Value: ['NO'] };
  own[dcmjsTag(written.METHOD_CODES)] = {
    vr: 'SQ',
    Value: (confirmed ? [written.BASIC_PROFILE, written.CLEAN_PIXELS] : [written.BASIC_PROFILE]).map(codeItem),
  };
  return own;
}

const codeItem = ({ value, meaning }: written.MethodCode): DicomValues => ({
  [dcmjsTag(written.METHOD_CODE_TAGS.value)]: { vr: 'SH', Value: [value] },
  [dcmjsTag(written.METHOD_CODE_TAGS.scheme)]: { vr: 'SH', Value: [written.METHOD_SCHEME] },
  [dcmjsTag(written.METHOD_CODE_TAGS.meaning)]: { vr: 'LO', Value: [meaning] },
});

/** The file with a head of its own (PS3.10 7.1): seven attributes, the first of which dcmjs adds. */
function writeFile(meta: DicomMeta, values: DicomValues): Uint8Array<ArrayBuffer> {
  const dict = new dcmjs.data.DicomDict({
    '00020001': { vr: 'OB', Value: [new Uint8Array([0, 1]).buffer] },
    '00020002': values[dcmjsTag(written.SOP_CLASS)]!,
    '00020003': values['00080018']!,
    '00020010': { vr: 'UI', Value: [meta.syntax.packing === 'plain' ? EXPLICIT_LITTLE : meta.syntaxUid] },
    '00020012': { vr: 'UI', Value: [written.IMPLEMENTATION_UID] },
    '00020013': { vr: 'SH', Value: [written.IMPLEMENTATION_NAME] },
  });
  dict.dict = values;
  return new Uint8Array(dict.write({ fragmentMultiframe: false }));
}

/** No file leaves here that the server would not take. */
function refuseUnclean(bytes: Uint8Array, confirmed: boolean): void {
  const [fault] = cleanFaults(bytes, confirmed);
  if (fault) throw new FileRefusal('not-read', `The DICOM file could not be cleaned: ${fault.place} ${fault.why}.`);
}

/** What stood around the data set: the preamble, the head, bytes after the end. */
function aroundFindings(bytes: Uint8Array, meta: DicomMeta, dataSet: DicomDataSet): RemovedItem[] {
  const found: RemovedItem[] = [];
  const used = bytes.subarray(0, 128).filter((byte) => byte !== 0).length;
  if (used > 0) found.push({ place: 'preamble', name: 'bytes before the head', action: 'blanked', was: `${used} bytes` });
  found.push(...meta.elements.filter(({ tag }) => HEAD_NAMES.has(tag)).map((element) => headFinding(bytes, element)));
  const after = dataSet.bytes.length - dataSet.end;
  if (after > 0) found.push({ place: 'file', name: 'bytes after the last attribute', action: 'removed', was: `${after} bytes` });
  return found;
}

/** The attributes of the head that tell of a sender. */
const HEAD_NAMES: ReadonlyMap<number, string> = new Map([
  [0x00020003, 'Media Storage SOP Instance UID'],
  [0x00020012, 'Implementation Class UID'],
  [0x00020013, 'Implementation Version Name'],
  [0x00020016, 'Source Application Entity Title'],
  [0x00020017, 'Sending Application Entity Title'],
  [0x00020018, 'Receiving Application Entity Title'],
  [0x00020100, 'Private Information Creator UID'],
  [0x00020102, 'Private Information'],
]);

function headFinding(bytes: Uint8Array, element: DicomElement): RemovedItem {
  const place = tagText(element.tag);
  return {
    place,
    name: HEAD_NAMES.get(element.tag)!,
    action: 'replaced',
    was: textOf(bytes, element)
      .replace(/[^ -~]/g, '')
      .slice(0, 80),
  };
}
