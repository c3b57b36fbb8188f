/** @jest-environment node */
import { deflateRawSync } from 'node:zlib';
import { inflateDataSet } from './inflate-data-set.js';

// the writer from outside: zlib, as Node has it
const content = Buffer.from(Array.from({ length: 300_000 }, (_, i) => (i * i) % 251));
const packed = new Uint8Array(deflateRawSync(content));

it('unpacks what zlib packed', () => {
  expect(Buffer.from(inflateDataSet(packed)).equals(content)).toBe(true);
});

it.each([
  ['a byte that makes the length even', [0]],
  ["a checksum and a length, as pydicom's sample has them", [0x4e, 0xd0, 0x58, 0x45, 0x1a, 2, 4, 0]],
])('bears %s after the end', (_, after) => {
  expect(Buffer.from(inflateDataSet(new Uint8Array([...packed, ...after]))).equals(content)).toBe(true);
});

it.each([0, 1, 100, packed.length >> 1, packed.length - 1])('refuses what is cut off after %s bytes', (length) => {
  expect(() => inflateDataSet(packed.subarray(0, length))).toThrow(/broken or cut off/);
});

it('stops at 128 MB, whatever comes', () => {
  const bomb = new Uint8Array(deflateRawSync(Buffer.alloc(160 * 1024 * 1024), { level: 1 }));
  const began = performance.now();
  expect(() => inflateDataSet(bomb)).toThrow(/more than 128 MB/);
  expect(performance.now() - began).toBeLessThan(5000);
}, 30_000);
