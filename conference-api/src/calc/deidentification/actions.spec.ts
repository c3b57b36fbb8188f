import { actionFor } from './actions.js';
import { KEPT, type KeptAttributes } from './kept-attributes.js';
import { PROFILE, profileCode } from './profile-table.js';
import { MAPPED_UIDS } from './written-attributes.js';

/** PS3.15 E.3.1 with Table E.1-1: what the codes ask for, met or exceeded. */
describe('every row of the table', () => {
  it('is removed, emptied, or a UID that is replaced', () => {
    const left = [...PROFILE].filter(([tag, code]) => {
      const { does } = actionFor(tag, '');
      if (does === 'remove') return false;
      if (does === 'empty') return !code.includes('Z') && !code.includes('X');
      return !(does === 'replace' && code === 'U') && !(does === 'rewrite' && tag === 0x00020003);
    });
    expect(left).toEqual([]);
  });

  it('is in no item of a sequence that is kept', () => {
    const inside = (attributes: KeptAttributes): number[] => [...attributes].flatMap(([tag, { items }]) => [tag, ...(items ? inside(items) : [])]);
    expect(inside(KEPT).filter((tag) => profileCode(tag) !== null)).toEqual([]);
  });

  it('is replaced where a picture must have it: SOP instance, study, series, frame of reference', () => {
    expect([...MAPPED_UIDS.keys()].map((tag) => [actionFor(tag, 'UI').does, profileCode(tag)])).toEqual(
      Array.from({ length: 4 }, () => ['replace', 'U']),
    );
  });
});

describe('what the table does not name', () => {
  it.each([
    ['a private attribute', 0x00091010, 'LO', 'private'],
    ['a private creator', 0x00290010, 'LO', 'private'],
    ['rows of an overlay', 0x60000010, 'US', 'not-needed'],
    ["the maker's model", 0x00081090, 'LO', 'not-needed'],
    ['software versions', 0x00181020, 'LO', 'not-needed'],
    ['a window explanation, which is free text', 0x00281055, 'LO', 'not-needed'],
    ['a look-up table explanation', 0x00283003, 'LO', 'not-needed'],
    ['something unknown', 0x12345678, 'UT', 'not-needed'],
  ])('is removed: %s', (_, tag, vr, because) => {
    expect(actionFor(tag, vr)).toEqual({ does: 'remove', because });
  });

  it('is removed where it is written in another way than the standard says', () => {
    // rows as long text could hold a letter
    expect(actionFor(0x00280010, 'LT')).toEqual({ does: 'remove', because: 'written-otherwise' });
    expect(actionFor(0x00280010, 'UN')).toEqual({ does: 'remove', because: 'written-otherwise' });
  });
});

describe('what is kept', () => {
  it.each([
    ['modality', 0x00080060, 'CS'],
    ['view position', 0x00185101, 'CS'],
    ['laterality', 0x00200060, 'CS'],
    ['body part', 0x00180015, 'CS'],
    ['pixel spacing', 0x00280030, 'DS'],
    ['imager pixel spacing', 0x00181164, 'DS'],
    ['window center', 0x00281050, 'DS'],
    ['photometric interpretation', 0x00280004, 'CS'],
    ['number of frames', 0x00280008, 'IS'],
    ['palette', 0x00281201, 'OW'],
  ])('%s', (_, tag, vr) => {
    expect(actionFor(tag, vr).does).toBe('keep');
  });

  it('is not the same inside a sequence: only what its items need', () => {
    const groups = KEPT.get(0x52009230)!.items!;
    expect(actionFor(0x00289110, 'SQ', groups).does).toBe('keep');
    expect(actionFor(0x00100010, 'PN', groups)).toEqual({ does: 'remove', because: 'profile' });
    expect(actionFor(0x00280010, 'US', groups)).toEqual({ does: 'remove', because: 'not-needed' });
    expect(actionFor(0x00080018, 'UI', groups)).toEqual({ does: 'remove', because: 'profile' });
  });
});
