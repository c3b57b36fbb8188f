import sharp from 'sharp';
import type { ImageSize } from '../../src/calc/vocabulary/images.js';
import { StorageService } from '../../src/storage/storage.service.js';
import type { TestPerson } from '../factories/world.js';
import type { TestApp } from './test-app.js';

/** Sends a file as the web does. */
export const upload = (test: TestApp, person: TestPerson, caseId: string, file: Buffer, name = 'film.png') =>
  test.http().post(`/api/cases/${caseId}/images`).set(person.auth).attach('file', file, name);

export async function keysInStore(test: TestApp, imageId = ''): Promise<string[]> {
  const keys: string[] = [];
  for await (const { key } of test.app.get(StorageService).list(`images/${imageId}`)) keys.push(key);
  return keys.sort();
}

export async function objectOf(test: TestApp, key: string): Promise<Buffer> {
  const { body } = await test.app.get(StorageService).get(key);
  const parts: Buffer[] = [];
  for await (const part of body) parts.push(part as Buffer);
  return Buffer.concat(parts);
}

/** The stored pixels of one size. */
export async function pixelsOf(test: TestApp, imageId: string, size: ImageSize = 'full') {
  const object = await objectOf(test, `images/${imageId}/${size}`);
  const { channels } = await sharp(object).metadata();
  const { data, info } = await sharp(object)
    .toColourspace(channels === 1 ? 'b-w' : 'srgb')
    .raw()
    .toBuffer({ resolveWithObject: true });
  const at = (x: number, y: number) => [...data.subarray((y * info.width + x) * info.channels, (y * info.width + x) * info.channels + info.channels)];
  return { data, at, width: info.width, height: info.height, channels: info.channels };
}
