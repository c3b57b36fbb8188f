import { Injectable } from '@nestjs/common';
import sharp, { type Sharp } from 'sharp';
import type { ImageSize } from '../calc/vocabulary/images.js';
import { Problem } from '../common/problems/problem.js';
import { renderDicom, unreadable } from './dicom-renderer.js';
import { imageKind, type ImageKind } from './image-kind.js';

export interface ProcessedImage {
  kind: ImageKind;
  width: number;
  height: number;
  pixelSpacingMm: number | null;
  files: Record<ImageSize, { bytes: Buffer; contentType: string }>;
}

const MOST_PIXELS = 60_000_000;
const VIEW_EDGE = 1600;
const THUMB_EDGE = 400;
/** Pictures decoded at once: each may need some 240 MB, so memory stays under 600 MB. */
const AT_ONCE = 2;
/** Uploads that may wait for their turn; each holds its file in memory. */
const MOST_WAITING = 40;

/** Decodes a picture and writes it anew in three sizes, so that only its pixels are left. */
@Injectable()
export class ImageProcessor {
  private running = 0;
  private readonly waiting: (() => void)[] = [];

  async process(bytes: Buffer): Promise<ProcessedImage> {
    const kind = await imageKind(bytes);
    return this.inTurn(async () => {
      const { pixels, pixelSpacingMm } = kind === 'dicom' ? await this.fromDicom(bytes) : await this.fromPicture(bytes);
      const { data, info } = pixels;
      const raw = () => sharp(data, { raw: { width: info.width, height: info.height, channels: info.channels as 1 | 3 | 4 }, limitInputPixels: MOST_PIXELS });
      return {
        kind,
        width: info.width,
        height: info.height,
        pixelSpacingMm,
        files: {
          full: { bytes: await raw().webp({ lossless: true, effort: 1 }).toBuffer(), contentType: 'image/webp' },
          view: { bytes: await fitted(raw(), VIEW_EDGE).webp({ quality: 85 }).toBuffer(), contentType: 'image/webp' },
          thumb: { bytes: await fitted(raw(), THUMB_EDGE).webp({ quality: 80 }).toBuffer(), contentType: 'image/webp' },
        },
      };
    });
  }

  private async fromDicom(bytes: Buffer) {
    const { rgba, width, height, pixelSpacingMm } = await renderDicom(bytes);
    const pixels = await sharp(rgba, { raw: { width, height, channels: 4 } }).removeAlpha().raw().toBuffer({ resolveWithObject: true });
    return { pixels, pixelSpacingMm };
  }

  private async fromPicture(bytes: Buffer) {
    try {
      const input = sharp(bytes, { limitInputPixels: MOST_PIXELS, failOn: 'truncated', pages: 1, sequentialRead: true });
      const { width, height } = await input.metadata();
      if (width * height > MOST_PIXELS) throw tooManyPixels();
      // a palette or 16 bits become plain 8-bit pixels; the alpha goes on white paper
      const pixels = await input.rotate().flatten({ background: '#ffffff' }).toColourspace('srgb').raw().toBuffer({ resolveWithObject: true });
      return { pixels, pixelSpacingMm: null };
    } catch (error) {
      if (error instanceof Problem) throw error;
      if (error instanceof Error && /pixel limit/i.test(error.message)) throw tooManyPixels();
      throw unreadable('The picture is broken or cut off. Export it again as PNG or JPEG.');
    }
  }

  private async inTurn<T>(work: () => Promise<T>): Promise<T> {
    if (this.running >= AT_ONCE) {
      if (this.waiting.length >= MOST_WAITING)
        throw new Problem('unavailable', 'Too many pictures are being read just now. Send this one again in a moment.', [], {}, { 'Retry-After': '5' });
      await new Promise<void>((resolve) => this.waiting.push(resolve));
    } else this.running++;
    try {
      return await work();
    } finally {
      const next = this.waiting.shift();
      if (next) next();
      else this.running--;
    }
  }
}

const fitted = (picture: Sharp, edge: number) => picture.resize(edge, edge, { fit: 'inside', withoutEnlargement: true });

const tooManyPixels = () => unreadable('The picture has more than 60 million pixels. Export it smaller.');
