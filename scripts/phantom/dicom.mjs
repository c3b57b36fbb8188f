// A drawn radiograph as a DICOM file: Digital X-Ray or Computed Radiography, explicit VR little
// endian. Nothing identifies anyone unless a test asks for planted identifiers.

import { createHash } from 'node:crypto';
import dcmjs from 'dcmjs';

const EXPLICIT_LITTLE = '1.2.840.10008.1.2.1';
const CLASSES = { DX: '1.2.840.10008.5.1.4.1.1.1.1', CR: '1.2.840.10008.5.1.4.1.1.1' };
const VIEWS = { 'ap-pelvis': 'AP', lateral: 'LL', oblique: 'LPO', 'ap-knee': 'AP' };

/** UID of the 2.25 kind, the same for the same words. */
export function uidFor(words) {
  const hex = createHash('sha256').update(words).digest('hex').slice(0, 32);
  return `2.25.${BigInt(`0x${hex}`)}`;
}

/** EXIF of an invented photographer and place, for the same tests. */
export const PLANTED_EXIF = {
  IFD0: { Artist: 'Oswin Marrowby', ImageDescription: 'Shell of T Quillfeather, QF-7730142', Copyright: 'Plumwick General', DateTime: '2021:03:12 09:15:33' },
  IFD2: { UserComment: 'Quillfeather, theatre 3', DateTimeOriginal: '2021:03:12 09:15:33', BodySerialNumber: 'CAM-55190-PW' },
  IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 0/1', GPSLongitudeRef: 'W', GPSLongitude: '0/1 7/1 0/1' },
};

/** Invented identifiers for tests that must find every one of them gone. */
export const PLANTED = {
  PatientName: 'QUILLFEATHER^TAMSIN',
  PatientID: 'QF-7730142',
  PatientBirthDate: '19510623',
  PatientSex: 'F',
  PatientAddress: '14 Nowhere Lane, Plumwick',
  OtherPatientIDs: 'PW-55190',
  PatientComments: 'Sister of Orlando Quillfeather, call 0555 0142',
  InstitutionName: 'Plumwick General',
  InstitutionAddress: '1 Harbour Row, Plumwick',
  ReferringPhysicianName: 'MARROWBY^OSWIN',
  PerformingPhysicianName: 'TREACLE^IONA',
  OperatorsName: 'BRAMBLE^FENN',
  StationName: 'PLUMROOM3',
  AccessionNumber: 'ACC884213',
  StudyDate: '20210312',
  SeriesDate: '20210312',
  AcquisitionDate: '20210312',
  ContentDate: '20210312',
  StudyTime: '091533',
  StudyID: 'ST-40021',
  StudyDescription: 'Pelvis for Mrs Quillfeather',
  DeviceSerialNumber: 'SN-99120-PW',
  ProtocolName: 'Pelvis Plumwick routine',
  RequestAttributesSequence: [{ RequestedProcedureID: 'RP-61188', RequestedProcedureDescription: 'Query loosening, T Quillfeather' }],
  ImageComments: 'Repeat, patient QF-7730142 moved',
};

function spacingTags(truth, meta) {
  const raw = [truth.pixelSpacingMm, truth.pixelSpacingMm];
  const tags = {
    ImagerPixelSpacing: raw,
    DistanceSourceToDetector: truth.sourceDetectorMm,
    DistanceSourceToPatient: round(truth.sourceDetectorMm / truth.magnification),
    EstimatedRadiographicMagnificationFactor: truth.magnification,
  };
  if (meta.spacing === 'none') return {};
  if (meta.spacing !== 'calibrated') return { ...tags, PixelSpacing: raw };
  return {
    ...tags,
    PixelSpacing: [round(truth.mmPerPixelAtHip), round(truth.mmPerPixelAtHip)],
    PixelSpacingCalibrationType: 'GEOMETRY',
    PixelSpacingCalibrationDescription: 'Scaled to the plane of the joint',
  };
}

const round = (v) => Math.round(v * 1e6) / 1e6;

const code = (CodeValue, CodingSchemeDesignator, CodeMeaning) => [{ CodeValue, CodingSchemeDesignator, CodeMeaning }];

function pixelTags(image) {
  return {
    SamplesPerPixel: 1,
    PhotometricInterpretation: 'MONOCHROME2',
    Rows: image.height,
    Columns: image.width,
    BitsAllocated: 16,
    BitsStored: 12,
    HighBit: 11,
    PixelRepresentation: 0,
    PixelIntensityRelationship: 'LOG',
    PixelIntensityRelationshipSign: 1,
    RescaleIntercept: 0,
    RescaleSlope: 1,
    RescaleType: 'US',
    PresentationLUTShape: 'IDENTITY',
    LossyImageCompression: '00',
    WindowCenter: 2048,
    WindowWidth: 4096,
    PixelData: [image.pixels.buffer.slice(image.pixels.byteOffset, image.pixels.byteOffset + image.pixels.byteLength)],
  };
}

function seriesTags(image, meta) {
  const { truth } = image;
  const knee = truth.projection === 'ap-knee';
  return {
    Modality: meta.modality ?? 'DX',
    PresentationIntentType: 'FOR PRESENTATION',
    ImageType: ['DERIVED', 'PRIMARY', ''],
    BodyPartExamined: knee ? 'KNEE' : truth.projection === 'ap-pelvis' ? 'PELVIS' : 'HIP',
    AnatomicRegionSequence: knee ? code('72696002', 'SCT', 'Knee') : code('12921003', 'SCT', 'Pelvis'),
    ViewPosition: VIEWS[truth.projection] ?? 'AP',
    ImageLaterality: truth.projection === 'ap-pelvis' ? 'U' : truth.side === 'left' ? 'L' : 'R',
    PatientOrientation: truth.projection === 'lateral' ? ['F', 'P'] : ['L', 'F'],
    BurnedInAnnotation: truth.burnedIn.length ? 'YES' : 'NO',
    PositionerType: 'NONE',
    DetectorType: 'DIRECT',
    KVP: 75,
    Manufacturer: '',
    SeriesNumber: 1,
    InstanceNumber: meta.instanceNumber ?? 1,
  };
}

/**
 * @param {ReturnType<import('./render.mjs').drawRadiograph>} image
 * @param {object} meta
 * @param {'DX'|'CR'=} meta.modality
 * @param {string=} meta.name words that the UIDs come from; one study per `study`, or per name
 * @param {string=} meta.study
 * @param {'imager'|'calibrated'|'none'=} meta.spacing pixel spacing at the detector, in the hips' plane, or left out
 * @param {object=} meta.identifiers tags to plant, for tests (`PLANTED`)
 * @param {boolean=} meta.privateTag adds a private tag that holds the planted name
 * @returns {Buffer} a DICOM file
 */
export function toDicom(image, meta = {}) {
  const name = meta.name ?? `phantom-${image.spec.seed}`;
  const sop = uidFor(`instance ${name}`);
  const dataset = {
    SOPClassUID: CLASSES[meta.modality ?? 'DX'],
    SOPInstanceUID: sop,
    StudyInstanceUID: uidFor(`study ${meta.study ?? name}`),
    SeriesInstanceUID: uidFor(`series ${name}`),
    PatientName: '',
    PatientID: '',
    PatientBirthDate: '',
    PatientSex: '',
    StudyDate: '',
    StudyTime: '',
    ReferringPhysicianName: '',
    StudyID: '',
    AccessionNumber: '',
    ...seriesTags(image, meta),
    ...spacingTags(image.truth, meta),
    ...pixelTags(image),
    ...meta.identifiers,
    _vrMap: { PixelData: 'OW' },
  };
  const { DicomMetaDictionary, DicomDict } = dcmjs.data;
  const file = new DicomDict({
    '00020001': { vr: 'OB', Value: [new Uint8Array([0, 1]).buffer] },
    '00020002': { vr: 'UI', Value: [dataset.SOPClassUID] },
    '00020003': { vr: 'UI', Value: [sop] },
    '00020010': { vr: 'UI', Value: [EXPLICIT_LITTLE] },
    '00020012': { vr: 'UI', Value: [uidFor('drawn phantom writer')] },
  });
  file.dict = DicomMetaDictionary.denaturalizeDataset(dataset);
  if (meta.privateTag) {
    file.dict['00330010'] = { vr: 'LO', Value: ['PLUMWICK NOTES'] };
    file.dict['00331001'] = { vr: 'LO', Value: ['Quillfeather Tamsin, bed 9'] };
  }
  return Buffer.from(file.write({ allowInvalidVRLength: false }));
}
