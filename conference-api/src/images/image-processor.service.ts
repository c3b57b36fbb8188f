import { Injectable } from '@nestjs/common';
import sharp, { type OutputInfo, type Sharp } from 'sharp';
import type { ImageSize } from '../calc/vocabulary/images.js';
import { Problem } from '../common/problems/problem.js';
import { DicomRenderer, type PlainPixels } from './dicom-renderer.service.js';
import { imageKind, type ImageKind } from './image-kind.js';
import { MOST_PIXELS } from './pixel-limit.js';
import { unreadable } from './unreadable.js';

export interface ProcessedImage {
  kind: ImageKind;
  width: number;
  height: number;
  pixelSpacingMm: number | null;
  files: Record<ImageSize, { bytes: Buffer; contentType: string }>;
}

const VIEW_EDGE = 1600;
const THUMB_EDGE = 400;
/** Pictures decoded at once: each may need some 400 MB at 60 million pixels, so memory stays under 1 GB. */
const AT_ONCE = 2;
/** Those that may wait for their turn. */
const MOST_WAITING = 40;

// nothing of a picture stays in a cache, and no decoder is at hand but those for the kinds that are taken
sharp.cache(false);
sharp.block({ operation: ['VipsForeignLoad'] });
sharp.unblock({ operation: ['VipsForeignLoadJpegBuffer', 'VipsForeignLoadPngBuffer', 'VipsForeignLoadWebpBuffer', 'VipsForeignLoadTiffBuffer'] });

/** Decodes a picture and writes it anew in three sizes, so that only its pixels are left. */
@Injectable()
export class ImageProcessor {
  private running = 0;
  private readonly waiting: (() => void)[] = [];

  constructor(private readonly dicom: DicomRenderer) {}

  async process(bytes: Buffer): Promise<ProcessedImage> {
    const kind = await imageKind(bytes);
    return this.inTurn(async () => {
      const pixels = kind === 'dicom' ? await this.dicom.render(bytes) : await this.decode(bytes);
      const { width, height, pixelSpacingMm } = pixels;
      return { kind, width, height, pixelSpacingMm, files: await this.encode(pixels) };
    });
  }

  /** Lossless where it is measured on; PNG, since lossless WebP takes ten times as long for a radiograph. */
  private async encode({ data, width, height, channels }: PlainPixels): Promise<ProcessedImage['files']> {
    const picture = () =>
      sharp(data, { raw: { width, height, channels }, limitInputPixels: MOST_PIXELS }).toColourspace(channels === 1 ? 'b-w' : 'srgb');
    const [full, view, thumb] = await Promise.all([
      picture().png({ compressionLevel: 3, adaptiveFiltering: true }).toBuffer(),
      fitted(picture(), VIEW_EDGE).webp({ quality: 85, effort: 2 }).toBuffer(),
      fitted(picture(), THUMB_EDGE).webp({ quality: 80 }).toBuffer(),
    ]);
    return {
      full: { bytes: full, contentType: 'image/png' },
      view: { bytes: view, contentType: 'image/webp' },
      thumb: { bytes: thumb, contentType: 'image/webp' },
    };
  }

  private async decode(bytes: Buffer): Promise<PlainPixels> {
    try {
      const input = sharp(bytes, { limitInputPixels: MOST_PIXELS, failOn: 'error', pages: 1 });
      const { width, height, space, format, pages = 1 } = await input.metadata();
      if (width * height > MOST_PIXELS) throw tooManyPixels();
      if (pages > 1 && format === 'tiff')
        throw unreadable(`The file holds ${pages} pictures; export the one that is needed as a single picture.`);
      const grey = space === 'b-w' || space === 'grey16';
      // a palette or 16 bits become plain 8-bit pixels; the alpha goes on white paper
      const { data, info } = await input
        .rotate()
        .flatten({ background: '#ffffff' })
        .toColourspace(grey ? 'b-w' : 'srgb')
        .raw()
        .toBuffer({ resolveWithObject: true });
      return { data, ...sizeOf(info), pixelSpacingMm: null };
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

const sizeOf = ({ width, height, channels }: OutputInfo) => ({ width, height, channels: channels === 1 ? (1 as const) : (3 as const) });

const tooManyPixels = () => unreadable('The picture has more than 60 million pixels. Export it smaller.');
