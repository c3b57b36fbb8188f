import { execFileSync } from 'node:child_process';
import { mkdtempSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import fc from 'fast-check';
import { inspectDicom } from './inspect-dicom.js';

type Written = [tag: string, vr: string, value: string | Buffer | Written[][]];

const LONG = ['OB', 'OW', 'SQ', 'UN', 'UT'];

/** Explicit VR Little Endian (PS3.5 7.1.2), in the order that is given. */
function write(rows: Written[]): Buffer {
  return Buffer.concat(
    rows.map(([tag, vr, value]) => {
      const content = Array.isArray(value) ? Buffer.concat(value.map((item) => headed('feff00e0', write(item)))) : padded(value, vr);
      const head = Buffer.from([tag.slice(2, 4), tag.slice(0, 2), tag.slice(6), tag.slice(4, 6)].join(''), 'hex');
      const length = Buffer.alloc(LONG.includes(vr) ? 6 : 2);
      if (LONG.includes(vr)) length.writeUInt32LE(content.length, 2);
      else length.writeUInt16LE(content.length);
      return Buffer.concat([head, Buffer.from(vr), length, content]);
    }),
  );
}

function headed(head: string, content: Buffer): Buffer {
  const length = Buffer.alloc(4);
  length.writeUInt32LE(content.length);
  return Buffer.concat([Buffer.from(head, 'hex'), length, content]);
}

const padded = (value: string | Buffer, vr: string) => {
  const content = Buffer.from(value);
  return content.length % 2 ? Buffer.concat([content, Buffer.from(vr === 'UI' || Buffer.isBuffer(value) ? '\0' : ' ')]) : content;
};

const us = (n: number) => Buffer.from([n & 255, n >> 8]);
const UID = '2.25.329800735698586629295641978511506172918';
const CR = '1.2.840.10008.5.1.4.1.1.1';
const code = (value: string, meaning: string): Written[] => [
  ['00080100', 'SH', value],
  ['00080102', 'SH', 'DCM'],
  ['00080104', 'LO', meaning],
];

/** PS3.16 CID 7050. */
const METHODS = [code('113100', 'Basic Application Confidentiality Profile'), code('113101', 'Clean Pixel Data Option')];

const META: Written[] = [
  ['00020001', 'OB', Buffer.from([0, 1])],
  ['00020002', 'UI', CR],
  ['00020003', 'UI', UID],
  ['00020010', 'UI', '1.2.840.10008.1.2.1'],
  ['00020012', 'UI', '2.25.182639495235904527548645864734528998124'],
  ['00020013', 'SH', 'KERFSIDE'],
];

const DATA: Written[] = [
  ['00080016', 'UI', CR],
  ['00080018', 'UI', UID],
  ...['00080020 DA', '00080030 TM', '00080050 SH'].map((row): Written => [row.slice(0, 8), row.slice(9), '']),
  ['00080060', 'CS', 'CR'],
  ...['00080070 LO', '00080090 PN', '00100010 PN', '00100020 LO', '00100030 DA', '00100040 CS'].map((row): Written => [
    row.slice(0, 8),
    row.slice(9),
    '',
  ]),
  ['00120062', 'CS', 'YES'],
  ['00120063', 'LO', 'DICOM PS3.15 2024b, Table E.1-1, allow-list'],
  ['00120064', 'SQ', METHODS],
  ['00180015', 'CS', 'HIP'],
  ['00181164', 'DS', '0.139\\0.139'],
  ['0020000D', 'UI', UID],
  ['0020000E', 'UI', UID],
  ['00200010', 'SH', ''],
  ['00280002', 'US', us(1)],
  ['00280004', 'CS', 'MONOCHROME2'],
  ['00280010', 'US', us(4)],
  ['00280011', 'US', us(4)],
  ['00280100', 'US', us(8)],
  ['00280301', 'CS', 'NO'],
  ['00280303', 'CS', 'REMOVED'],
  ['7FE00010', 'OW', Buffer.alloc(16, 7)],
];

function file(data: Written[] = DATA, meta: Written[] = META, preamble = Buffer.alloc(128)): Buffer {
  const head = write(meta);
  const length = Buffer.alloc(4);
  length.writeUInt32LE(head.length);
  return Buffer.concat([preamble, Buffer.from('DICM'), write([['00020000', 'UL', length]]), head, write(data)]);
}

const TAG = ([tag]: Written) => parseInt(tag, 16);
const changed = (...rows: Written[]) => [...DATA.filter(([tag]) => !rows.some(([other]) => other === tag)), ...rows].sort((a, b) => TAG(a) - TAG(b));
const without = (tag: string) => DATA.filter(([other]) => other !== tag);
const faultsOf = (bytes: Uint8Array) => inspectDicom(bytes).faults.map(({ place, why }) => `${place} ${why}`);

it('finds nothing in a clean file, which dcmtk reads without a word', () => {
  const folder = mkdtempSync(join(tmpdir(), 'inspect-'));
  const path = join(folder, 'clean.dcm');
  writeFileSync(path, file());
  // dcmdump's own check of the file; it writes its complaints, and nothing else, with --quiet off to the second stream
  expect(execFileSync('dcmdump', [path], { encoding: 'latin1', stdio: ['ignore', 'pipe', 'pipe'] })).toContain('[0.139\\0.139]');
  rmSync(folder, { recursive: true });
  expect(faultsOf(file())).toEqual([]);
});

describe('names what a clean file may not hold', () => {
  const nested = (item: Written[]): Written => ['00081140', 'SQ', [item]];
  it.each<[string, string, Buffer]>([
    ["a patient's name", '(0010,0010) is not empty', file(changed(['00100010', 'PN', 'Planted^Name']))],
    ['a date', '(0008,0021) identifies somebody', file(changed(['00080021', 'DA', '20240102']))],
    ['a private attribute', '(0009,0010) is private to a maker', file(changed(['00090010', 'LO', 'PLANTED']))],
    ['a curve', '(5000,0010) identifies somebody', file(changed(['50000010', 'US', us(1)]))],
    ['an overlay', '(6000,3000) identifies somebody', file(changed(['60003000', 'OW', Buffer.alloc(2)]))],
    ['free text', '(0028,1055) is not needed', file(changed(['00281055', 'LO', 'Planted']))],
    ['an old UID', '(0020,000D) is not a new UID', file(changed(['0020000D', 'UI', '1.2.840.113619.2.1']))],
    ['a name in the part of the body', '(0018,0015) holds a value that is not on its list', file(changed(['00180015', 'CS', 'PLANTED']))],
    ['text in a number', '(0018,1164) holds a value that is not on its list', file(changed(['00181164', 'DS', 'Planted']))],
    ['a sequence', '(0008,1140) identifies somebody', file(changed(nested([['00100010', 'PN', 'Planted']])))],
    [
      'a name in a sequence that is kept',
      '(0028,3010) (0010,0010) identifies somebody',
      file(changed(['00283010', 'SQ', [[['00100010', 'PN', 'Planted']]]])),
    ],
    [
      'a report',
      '(0008,0016) says that the file holds a report (Structured Report)',
      file(changed(['00080016', 'UI', '1.2.840.10008.5.1.4.1.1.88.22'])),
    ],
    ['a PDF', '(0008,0016) says that the file holds a PDF document', file(changed(['00080016', 'UI', '1.2.840.10008.5.1.4.1.1.104.1']))],
    [
      'a waveform',
      '(0008,0016) says that the file holds a waveform, such as an ECG',
      file(changed(['00080016', 'UI', '1.2.840.10008.5.1.4.1.1.9.1.1'])),
    ],
    ['text in the picture', '(0028,0301) does not say that a person found no text', file(changed(['00280301', 'CS', 'YES']))],
    ['nothing about text in the picture', '(0028,0301) is missing', file(without('00280301'))],
    ['no method', '(0012,0064) does not name 113100 and 113101', file(changed(['00120064', 'SQ', METHODS.slice(0, 1)]))],
    ['more bytes than the picture has', '(7FE0,0010) holds 8 bytes that belong to no picture', file(changed(['7FE00010', 'OW', Buffer.alloc(24)]))],
    ['fewer bytes than the picture has', '(7FE0,0010) is cut off', file(changed(['7FE00010', 'OW', Buffer.alloc(8)]))],
    ['a preamble', 'preamble is not empty', file(DATA, META, Buffer.concat([Buffer.from('Planted'), Buffer.alloc(121)]))],
    ['a sender in the head', '(0002,0016) is not one of the head', file(DATA, [...META, ['00020016', 'AE', 'PLANTED']])],
    ['another version in the head', '(0002,0013) is not as cleaning writes it', file(DATA, [...META.slice(0, 5), ['00020013', 'SH', 'PLANTED']])],
    ['bytes after the end', 'file holds 7 bytes after its last attribute', Buffer.concat([file(), Buffer.from('Planted')])],
    [
      'an attribute twice',
      '(0008,0060) does not stand in its order, or twice',
      file([...DATA.slice(0, 6), ['00080060', 'CS', 'CR'], ...DATA.slice(6)]),
    ],
    [
      'a deflated file',
      '(0002,0010) names an encoding that cleaning does not write',
      file(
        DATA,
        META.map((row) => (row[0] === '00020010' ? ['00020010', 'UI', '1.2.840.10008.1.2.1.99'] : row)),
      ),
    ],
    ['a million frames', 'file The DICOM file says that it holds 999999 pictures', file(changed(['00280008', 'IS', '999999']))],
    [
      'huge dimensions',
      'file The picture has more than 60 million pixels',
      file(changed(['00280010', 'US', us(65535)], ['00280011', 'US', us(65535)])),
    ],
  ])('%s', (_, fault, bytes) => {
    expect(faultsOf(bytes)).toEqual(expect.arrayContaining([expect.stringContaining(fault)]));
  });

  it('and never a value', () => {
    const planted = changed(
      ['00100010', 'PN', 'Planted^Name'],
      ['00090010', 'LO', 'Planted'],
      ['00180015', 'CS', 'PLANTED'],
      ['00080016', 'UI', '1.2.3.PLANTED'],
      ['00280004', 'CS', 'PLANTED'],
    );
    expect(JSON.stringify(inspectDicom(file(planted)))).not.toMatch(/planted/i);
  });

  it('with its name, for people', () => {
    expect(inspectDicom(file(changed(['00081030', 'LO', 'Planted']))).faults[0]).toMatchObject({ place: '(0008,1030)', name: 'Study Description' });
  });
});

/** Files that nobody here wrote: those of Debian's python3-pydicom. */
describe('the sample files', () => {
  const filesBelow = (folder: string): string[] =>
    readdirSync(folder)
      .sort()
      .flatMap((name) => (statSync(join(folder, name)).isDirectory() ? filesBelow(join(folder, name)) : [join(folder, name)]));
  const samples = filesBelow('/usr/lib/python3/dist-packages/pydicom/data').map((path) => ({ path, bytes: new Uint8Array(readFileSync(path)) }));
  const inspectedInTime = (bytes: Uint8Array) => {
    const began = performance.now();
    const { faults } = inspectDicom(bytes);
    expect(performance.now() - began).toBeLessThan(5000);
    return faults;
  };

  it('are all refused, since nobody cleaned them, and each within its time', () => {
    expect(samples.length).toBeGreaterThan(150);
    expect(samples.filter(({ bytes }) => inspectedInTime(bytes).length === 0).map(({ path }) => path)).toEqual([]);
  });

  it('are borne, wherever bytes are changed or they end', () => {
    const change = fc.record({ place: fc.double({ min: 0, max: 1, noNaN: true }), byte: fc.constantFrom(0, 1, 0x7f, 0xfe, 0xff) });
    fc.assert(
      fc.property(
        fc.constantFrom(...samples, { path: 'clean', bytes: new Uint8Array(file()) }),
        fc.array(change, { minLength: 1, maxLength: 10 }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        ({ bytes }, changes, kept) => {
          const copy = bytes.slice(0, kept > 0.5 ? bytes.length : Math.floor(bytes.length * kept));
          for (const { place, byte } of changes) if (copy.length > 0) copy[Math.min(copy.length - 1, Math.floor(place * copy.length))] = byte;
          inspectedInTime(copy);
        },
      ),
      { numRuns: 1000, seed: 20240605 },
    );
  }, 120_000);
});
