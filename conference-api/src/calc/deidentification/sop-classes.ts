const ROOT = '1.2.840.10008.5.1.4.1.1.';

/** Kinds of DICOM objects that are taken: pictures that the image room shows (PS3.4 B.5). */
const PICTURES: ReadonlyMap<string, string> = new Map([
  ['1', 'Computed Radiography'],
  ['1.1', 'Digital X-Ray, for presentation'],
  ['1.1.1', 'Digital X-Ray, for processing'],
  ['2', 'CT'],
  ['2.1', 'Enhanced CT'],
  ['2.2', 'Legacy Converted Enhanced CT'],
  ['4', 'MR'],
  ['4.1', 'Enhanced MR'],
  ['4.3', 'Enhanced MR Color'],
  ['4.4', 'Legacy Converted Enhanced MR'],
  ['3.1', 'Ultrasound Multi-frame'],
  ['6.1', 'Ultrasound'],
  ['7', 'Secondary Capture'],
  ['7.1', 'Multi-frame Single Bit Secondary Capture'],
  ['7.2', 'Multi-frame Grayscale Byte Secondary Capture'],
  ['7.3', 'Multi-frame Grayscale Word Secondary Capture'],
  ['7.4', 'Multi-frame True Color Secondary Capture'],
  ['12.1', 'X-Ray Angiographic'],
  ['12.1.1', 'Enhanced XA'],
  ['12.2', 'X-Ray Radiofluoroscopic'],
  ['12.2.1', 'Enhanced XRF'],
  ['13.1.1', 'X-Ray 3D Angiographic'],
  ['13.1.2', 'X-Ray 3D Craniofacial'],
  ['20', 'Nuclear Medicine'],
  ['77.1.1', 'VL Endoscopic'],
  ['77.1.4', 'VL Photographic'],
  ['128', 'PET'],
]);

/** What others hold, for the refusal; the longest beginning that fits counts. */
const OTHERS: [string, string][] = [
  ['88.', 'a report (Structured Report)'],
  ['104.1', 'a PDF document'],
  ['104.', 'a document'],
  ['9.', 'a waveform, such as an ECG'],
  ['11.', 'a presentation state'],
  ['66', 'raw data or a segmentation'],
  ['67', 'a value mapping'],
  ['68.', 'a surface scan'],
  ['481.1', 'a radiotherapy film'],
  ['481.2', 'a radiotherapy dose'],
  ['481.3', 'a radiotherapy structure set'],
  ['481.', 'a radiotherapy plan or record'],
  ['77.1.1.1', 'a video'],
  ['77.1.2.1', 'a video'],
  ['77.1.4.1', 'a video'],
  ['77.', 'a picture of a kind that is not read here'],
];

/** Objects of other roots. */
const ELSEWHERE: ReadonlyMap<string, string> = new Map([
  ['1.2.840.10008.1.3.10', 'a list of other files (DICOMDIR)'],
  ['1.2.840.10008.5.1.4.39.1', 'a colour palette'],
]);

/** The name of a kind of picture that is taken, or null. */
export const pictureClass = (uid: string): string | null => (uid.startsWith(ROOT) ? (PICTURES.get(uid.slice(ROOT.length)) ?? null) : null);

/** What an object of another kind holds, to be said after 'The DICOM file holds'. */
export function contentOf(uid: string): string {
  const known = ELSEWHERE.get(uid);
  if (known) return known;
  const rest = uid.startsWith(ROOT) ? uid.slice(ROOT.length) : '';
  const found = OTHERS.filter(([start]) => rest.startsWith(start)).sort((a, b) => b[0].length - a[0].length)[0];
  return found ? found[1] : 'something of an unknown kind';
}
