import { PROFILE_EDITION } from './profile-table.js';

/** What a clean file says of itself, whatever the original said. */

/** UIDs that get new ones, the same for all files of one upload: SOP instance, study, series, frame of reference. */
export const MAPPED_UIDS: ReadonlyMap<number, string> = new Map([
  [0x00080018, 'SOP Instance UID'],
  [0x0020000d, 'Study Instance UID'],
  [0x0020000e, 'Series Instance UID'],
  [0x00200052, 'Frame of Reference UID'],
]);

/** Those that every picture must have (PS3.3 C.7.2.1, C.7.3.1, C.12.1); the frame of reference stays away if it was. */
export const NEEDED_UIDS = [0x00080018, 0x0020000d, 0x0020000e];

/** Attributes that every picture must have, but that may be empty (type 2 of PS3.3 C.7.1.1, C.7.2.1, C.7.5.1). */
export const EMPTIED: ReadonlyMap<number, { name: string; vr: string }> = new Map([
  [0x00080020, { name: 'Study Date', vr: 'DA' }],
  [0x00080030, { name: 'Study Time', vr: 'TM' }],
  [0x00080050, { name: 'Accession Number', vr: 'SH' }],
  [0x00080070, { name: 'Manufacturer', vr: 'LO' }],
  [0x00080090, { name: "Referring Physician's Name", vr: 'PN' }],
  [0x00100010, { name: "Patient's Name", vr: 'PN' }],
  [0x00100020, { name: 'Patient ID', vr: 'LO' }],
  [0x00100030, { name: "Patient's Birth Date", vr: 'DA' }],
  [0x00100040, { name: "Patient's Sex", vr: 'CS' }],
  [0x00200010, { name: 'Study ID', vr: 'SH' }],
]);

export const SOP_CLASS = 0x00080016;
export const PIXEL_DATA = 0x7fe00010;
export const BURNED_IN = 0x00280301;
export const METHOD_CODES = 0x00120064;

/** PS3.3 C.7.1.1 and C.7.6.1; the value of (0028,0303) is from memory. */
export const STATEMENTS: ReadonlyMap<number, { name: string; vr: string; value: string }> = new Map([
  [0x00120062, { name: 'Patient Identity Removed', vr: 'CS', value: 'YES' }],
  [0x00120063, { name: 'De-identification Method', vr: 'LO', value: `${PROFILE_EDITION}, allow-list` }],
  [0x00280303, { name: 'Longitudinal Temporal Information Modified', vr: 'CS', value: 'REMOVED' }],
]);

export interface MethodCode {
  value: string;
  meaning: string;
}

/** PS3.16 CID 7050: the Basic Profile, and its option for text in the picture. */
export const BASIC_PROFILE: MethodCode = { value: '113100', meaning: 'Basic Application Confidentiality Profile' };
export const CLEAN_PIXELS: MethodCode = { value: '113101', meaning: 'Clean Pixel Data Option' };
export const METHOD_CODE_TAGS = { value: 0x00080100, scheme: 0x00080102, meaning: 0x00080104 };
export const METHOD_SCHEME = 'DCM';

/** Who wrote the file (PS3.10 7.1): the application's own, the same in every file. */
export const IMPLEMENTATION_UID = '2.25.182639495235904527548645864734528998124';
export const IMPLEMENTATION_NAME = 'KERFSIDE';
