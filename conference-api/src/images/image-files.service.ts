import { Injectable } from '@nestjs/common';
import type { Response } from 'express';
import { pipeline } from 'node:stream/promises';
import { DataSource } from 'typeorm';
import { IMAGE_SIZES, type ImageSize } from '../calc/vocabulary/images.js';
import { forbidden, notFound } from '../common/problems/problem.js';
import { StorageService } from '../storage/storage.service.js';
import type { SignedAddressDto } from './dto/signed-address.dto.js';
import { CaseImage } from './entities/case-image.entity.js';
import { ImageAddresses } from './image-addresses.js';
import { imageKey } from './image-keys.js';

/** Sends a picture to whoever holds an address that was signed for them. */
@Injectable()
export class ImageFilesService {
  constructor(
    private readonly addresses: ImageAddresses,
    private readonly storage: StorageService,
    private readonly dataSource: DataSource,
  ) {}

  async send(id: string, size: string, query: SignedAddressDto, response: Response): Promise<void> {
    if (!isSize(size)) throw notFound('picture');
    const expires = Number(query.expires);
    if (!this.addresses.isGood(id, size, expires, query.signature))
      throw forbidden('This address of a picture has expired or was changed. Open the case again.');
    // a removed picture is gone at once, also for those who hold its address
    const isThere = await this.dataSource.manager.existsBy(CaseImage, { id, state: 'ready' });
    if (!isThere) throw notFound('picture');
    // a picture is never changed, so its name is its version
    response.set({
      'Cache-Control': `private, max-age=${Math.max(0, Math.floor(expires - Date.now() / 1000))}, immutable`,
      ETag: `"${id}-${size}"`,
    });
    if (response.req.fresh) {
      response.status(304).end();
      return;
    }
    const object = await this.storage.get(imageKey(id, size));
    response.set({ 'Content-Type': object.contentType, 'Content-Length': String(object.bytes), 'Content-Disposition': 'inline' });
    // a reader who goes away half-way is no fault
    await pipeline(object.body, response).catch(() => response.destroy());
  }
}

const isSize = (size: string): size is ImageSize => (IMAGE_SIZES as readonly string[]).includes(size);
