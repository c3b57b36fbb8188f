import { Injectable } from '@nestjs/common';
import { createHmac, timingSafeEqual } from 'node:crypto';
import type { ImageSize } from '../calc/vocabulary/images.js';
import { Settings } from '../config/settings.js';
import type { ImageAddressesDto } from './dto/image.dto.js';

const HOUR = 3600;

/** Signs and checks the addresses of pictures. */
@Injectable()
export class ImageAddresses {
  constructor(private readonly settings: Settings) {}

  /** Good for one to two hours, and the same all hour, so that a browser can keep what it fetched. */
  of(imageId: string): ImageAddressesDto {
    const expires = (Math.floor(Date.now() / 1000 / HOUR) + 2) * HOUR;
    const address = (size: ImageSize) => `/api/images/${imageId}/file/${size}?expires=${expires}&signature=${this.sign(imageId, size, expires)}`;
    return { thumb: address('thumb'), view: address('view'), full: address('full') };
  }

  isGood(imageId: string, size: ImageSize, expires: number, signature: string): boolean {
    const expected = Buffer.from(this.sign(imageId, size, expires), 'hex');
    const given = Buffer.from(signature, 'hex');
    return given.length === expected.length && timingSafeEqual(given, expected) && expires * 1000 > Date.now();
  }

  private sign(imageId: string, size: ImageSize, expires: number): string {
    return createHmac('sha256', this.settings.addressSecret).update(`${imageId}/${size}/${expires}`).digest('hex');
  }
}
