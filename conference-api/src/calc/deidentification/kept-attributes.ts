import * as words from './kept-words.js';
import { decimals, imageType, integers, matching, numbers, oneNumberOf, oneOf, picture, someOf, type ValueRule } from './value-rules.js';

export interface KeptAttribute {
  name: string;
  /** How it is written; the second only where the file says so, or where samples are signed. */
  vrs: readonly string[];
  rule: ValueRule;
  /** Of a sequence: what of its items is kept. */
  items?: KeptAttributes;
}

export type KeptAttributes = ReadonlyMap<number, KeptAttribute>;

type Row = [tag: number, name: string, vrs: string, rule: ValueRule, items?: Row[]];

const MANY = 64;
const signed = 'US SS';

const WINDOW: Row[] = [
  [0x00281050, 'Window Center', 'DS', decimals(1, MANY)],
  [0x00281051, 'Window Width', 'DS', decimals(1, MANY)],
  [0x00281056, 'VOI LUT Function', 'CS', oneOf('LINEAR', 'LINEAR_EXACT', 'SIGMOID')],
];
const RESCALE: Row[] = [
  [0x00281052, 'Rescale Intercept', 'DS', decimals(1)],
  [0x00281053, 'Rescale Slope', 'DS', decimals(1)],
  [0x00281054, 'Rescale Type', 'LO', oneOf(...words.RESCALE_TYPES)],
];
const SPACING: Row[] = [
  [0x00180050, 'Slice Thickness', 'DS', decimals(1)],
  [0x00180088, 'Spacing Between Slices', 'DS', decimals(1)],
  [0x00280030, 'Pixel Spacing', 'DS', decimals(2)],
];
const LUT: Row[] = [
  [0x00283002, 'LUT Descriptor', signed, numbers(3)],
  [0x00283004, 'Modality LUT Type', 'LO', oneOf(...words.RESCALE_TYPES)],
  [0x00283006, 'LUT Data', 'OW US', picture],
];
/** Functional groups of enhanced pictures (PS3.3 C.7.6.16.2): scale, window, place and side of each frame. */
const GROUPS: Row[] = [
  [0x00209071, 'Frame Anatomy Sequence', 'SQ', picture, [[0x00209072, 'Frame Laterality', 'CS', oneOf('R', 'L', 'U', 'B')]]],
  [0x00209113, 'Plane Position Sequence', 'SQ', picture, [[0x00200032, 'Image Position (Patient)', 'DS', decimals(3)]]],
  [0x00209116, 'Plane Orientation Sequence', 'SQ', picture, [[0x00200037, 'Image Orientation (Patient)', 'DS', decimals(6)]]],
  [0x00289110, 'Pixel Measures Sequence', 'SQ', picture, SPACING],
  [0x00289132, 'Frame VOI LUT Sequence', 'SQ', picture, WINDOW],
  [0x00289145, 'Pixel Value Transformation Sequence', 'SQ', picture, RESCALE],
];

const ROWS: Row[] = [
  [0x00080008, 'Image Type', 'CS', imageType(...words.IMAGE_TYPES)],
  [0x00080060, 'Modality', 'CS', oneOf(...words.MODALITIES)],
  [0x00080064, 'Conversion Type', 'CS', oneOf(...words.CONVERSIONS)],
  [0x00080068, 'Presentation Intent Type', 'CS', oneOf('FOR PRESENTATION', 'FOR PROCESSING')],
  [0x00180015, 'Body Part Examined', 'CS', oneOf(...words.BODY_PARTS)],
  ...SPACING.slice(0, 2),
  [0x00181063, 'Frame Time', 'DS', decimals(1)],
  [0x00181110, 'Distance Source to Detector', 'DS', decimals(1)],
  [0x00181111, 'Distance Source to Patient', 'DS', decimals(1)],
  [0x00181114, 'Estimated Radiographic Magnification Factor', 'DS', decimals(1)],
  [0x00181164, 'Imager Pixel Spacing', 'DS', decimals(2)],
  [0x00182010, 'Nominal Scanned Pixel Spacing', 'DS', decimals(2)],
  [0x00185100, 'Patient Position', 'CS', oneOf(...words.PATIENT_POSITIONS)],
  [0x00185101, 'View Position', 'CS', oneOf(...words.VIEW_POSITIONS)],
  [0x00200011, 'Series Number', 'IS', integers(1)],
  [0x00200013, 'Instance Number', 'IS', integers(1)],
  [0x00200020, 'Patient Orientation', 'CS', matching(/^[APRLHF]{1,3}$/, 2)],
  [0x00200032, 'Image Position (Patient)', 'DS', decimals(3)],
  [0x00200037, 'Image Orientation (Patient)', 'DS', decimals(6)],
  [0x00200060, 'Laterality', 'CS', oneOf('R', 'L')],
  [0x00200062, 'Image Laterality', 'CS', oneOf('R', 'L', 'U', 'B')],
  [0x00201041, 'Slice Location', 'DS', decimals(1)],
  [0x00280002, 'Samples per Pixel', 'US', oneNumberOf(1, 3)],
  [0x00280004, 'Photometric Interpretation', 'CS', oneOf(...words.PHOTOMETRIC)],
  [0x00280006, 'Planar Configuration', 'US', oneNumberOf(0, 1)],
  [0x00280008, 'Number of Frames', 'IS', integers(1)],
  [0x00280009, 'Frame Increment Pointer', 'AT', oneNumberOf(0x00181063)],
  [0x00280010, 'Rows', 'US', numbers(1)],
  [0x00280011, 'Columns', 'US', numbers(1)],
  ...SPACING.slice(2),
  [0x00280034, 'Pixel Aspect Ratio', 'IS', integers(2)],
  [0x00280100, 'Bits Allocated', 'US', oneNumberOf(8, 16, 32)],
  [0x00280101, 'Bits Stored', 'US', numbers(1)],
  [0x00280102, 'High Bit', 'US', numbers(1)],
  [0x00280103, 'Pixel Representation', 'US', oneNumberOf(0, 1)],
  [0x00280106, 'Smallest Image Pixel Value', signed, numbers(1)],
  [0x00280107, 'Largest Image Pixel Value', signed, numbers(1)],
  [0x00280120, 'Pixel Padding Value', signed, numbers(1)],
  [0x00280121, 'Pixel Padding Range Limit', signed, numbers(1)],
  [0x00280a02, 'Pixel Spacing Calibration Type', 'CS', oneOf('GEOMETRY', 'FIDUCIAL')],
  [0x00281040, 'Pixel Intensity Relationship', 'CS', oneOf('LIN', 'LOG', 'DISP')],
  [0x00281041, 'Pixel Intensity Relationship Sign', 'SS', oneNumberOf(1, -1)],
  ...WINDOW,
  ...RESCALE,
  [0x00281101, 'Red Palette Color Lookup Table Descriptor', signed, numbers(3)],
  [0x00281102, 'Green Palette Color Lookup Table Descriptor', signed, numbers(3)],
  [0x00281103, 'Blue Palette Color Lookup Table Descriptor', signed, numbers(3)],
  [0x00281201, 'Red Palette Color Lookup Table Data', 'OW', picture],
  [0x00281202, 'Green Palette Color Lookup Table Data', 'OW', picture],
  [0x00281203, 'Blue Palette Color Lookup Table Data', 'OW', picture],
  [0x00281221, 'Segmented Red Palette Color Lookup Table Data', 'OW', picture],
  [0x00281222, 'Segmented Green Palette Color Lookup Table Data', 'OW', picture],
  [0x00281223, 'Segmented Blue Palette Color Lookup Table Data', 'OW', picture],
  [0x00282110, 'Lossy Image Compression', 'CS', oneOf('00', '01')],
  [0x00282112, 'Lossy Image Compression Ratio', 'DS', decimals(1, MANY)],
  [0x00282114, 'Lossy Image Compression Method', 'CS', someOf(...words.LOSSY_METHODS)],
  [0x00283000, 'Modality LUT Sequence', 'SQ', picture, LUT],
  [0x00283010, 'VOI LUT Sequence', 'SQ', picture, LUT],
  [0x20500020, 'Presentation LUT Shape', 'CS', oneOf('IDENTITY', 'INVERSE')],
  [0x52009229, 'Shared Functional Groups Sequence', 'SQ', picture, GROUPS],
  [0x52009230, 'Per-Frame Functional Groups Sequence', 'SQ', picture, GROUPS],
];

const mapOf = (rows: Row[]): KeptAttributes =>
  new Map(rows.map(([tag, name, vrs, rule, items]) => [tag, { name, vrs: vrs.split(' '), rule, ...(items && { items: mapOf(items) }) }]));

/** What is carried over from a file, besides its picture: all of it numbers, or words of a list. */
export const KEPT: KeptAttributes = mapOf(ROWS);
