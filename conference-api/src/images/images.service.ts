import { Injectable } from '@nestjs/common';
import { createHash } from 'node:crypto';
import { DataSource, MoreThan } from 'typeorm';
import { AccessService } from '../access/access.service.js';
import type { Actor } from '../access/actor.js';
import { Permission } from '../access/permission.js';
import type { Stage } from '../calc/vocabulary/case.js';
import type { Case } from '../cases/entities/case.entity.js';
import { invalid, notFound, Problem, unavailable } from '../common/problems/problem.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { StorageService } from '../storage/storage.service.js';
import type { ImageDto, ImageListDto, UpdateImageDto, UploadImageDto } from './dto/image.dto.js';
import { CaseImage } from './entities/case-image.entity.js';
import { ImageAddresses } from './image-addresses.js';
import { imageKey, imageKeys } from './image-keys.js';
import { ImageProcessor, type ProcessedImage } from './image-processor.service.js';
import { storingSince } from './storing.js';
import { refuseIdentifiers } from './refuse-identifiers.js';

const STAGES_FOR_IMAGES: readonly Stage[] = ['draft', 'open', 'listed'];
const MOST_IMAGES = 60;

@Injectable()
export class ImagesService {
  constructor(
    private readonly access: AccessService,
    private readonly work: UnitOfWork,
    private readonly processor: ImageProcessor,
    private readonly storage: StorageService,
    private readonly addresses: ImageAddresses,
    private readonly dataSource: DataSource,
  ) {}

  async findOfCase(actor: Actor, caseId: string): Promise<ImageListDto> {
    await this.access.case(actor, Permission.CaseRead, caseId);
    return { items: await this.findForCase(caseId) };
  }

  /** For a use case that has asked for access. */
  async findForCase(caseId: string): Promise<ImageDto[]> {
    const images = await this.dataSource.manager.find(CaseImage, { where: { caseId, state: 'ready' }, order: { position: 'ASC', createdAt: 'ASC' } });
    return images.map((image) => this.toDto(image));
  }

  /** Asked before the bytes of an upload are taken in. */
  async assertMayUpload(actor: Actor, caseId: string): Promise<void> {
    await this.access.case(actor, Permission.ImageWrite, caseId, { stages: STAGES_FOR_IMAGES });
  }

  async upload(actor: Actor, caseId: string, file: Express.Multer.File | undefined, body: UploadImageDto): Promise<ImageDto> {
    const found = await this.access.case(actor, Permission.ImageWrite, caseId, { stages: STAGES_FOR_IMAGES });
    if (!file) throw invalid('file', 'missing', 'Send one picture in the field file.');
    refuseIdentifiers(body);
    const processed = await this.processor.process(file.buffer);
    const image = await this.reserve(actor, found, processed, createHash('sha256').update(file.buffer).digest('hex'), body);
    try {
      for (const size of ['thumb', 'view', 'full'] as const)
        await this.storage.put(imageKey(image.id, size), processed.files[size].bytes, processed.files[size].contentType);
      return await this.makeReady(actor, image);
    } catch (error) {
      await this.undo(image);
      throw error;
    }
  }

  async update(actor: Actor, id: string, body: UpdateImageDto): Promise<ImageDto> {
    return this.work.run(actor, async (tx) => {
      const image = await this.ofWritableCase(actor, id, tx.manager);
      refuseIdentifiers(body);
      const changes = Object.fromEntries(Object.entries(body).filter(([, value]) => value !== undefined && value !== null));
      if (Object.keys(changes).length) await tx.manager.update(CaseImage, { id }, changes);
      await tx.audit({ action: 'image.update', recordKind: 'image', recordId: id, caseId: image.caseId, details: { fields: Object.keys(changes) } });
      await tx.event({ kind: 'images-changed', conferenceId: image.case.conferenceId, caseId: image.caseId });
      return this.toDto({ ...image, ...changes } as CaseImage);
    });
  }

  async remove(actor: Actor, id: string): Promise<void> {
    await this.work.run(actor, async (tx) => {
      const image = await this.ofWritableCase(actor, id, tx.manager);
      await tx.manager.update(CaseImage, { id }, { state: 'removed' });
      await tx.audit({ action: 'image.remove', recordKind: 'image', recordId: id, caseId: image.caseId });
      await tx.event({ kind: 'images-changed', conferenceId: image.case.conferenceId, caseId: image.caseId });
    });
    // nobody can reach it from here on; where the store is away the sweep takes the files later
    await this.storage.delete(imageKeys(id)).catch(() => undefined);
  }

  private async ofWritableCase(actor: Actor, id: string, manager: DataSource['manager']): Promise<CaseImage> {
    const { caseId } = (await manager.findOneBy(CaseImage, { id })) ?? {};
    if (!caseId) throw notFound('picture');
    const found = await this.lockedCase(actor, caseId, manager).catch((error: unknown) => {
      // in the same words as where there is no such picture
      throw error instanceof Problem && error.code === 'not-found' ? notFound('picture') : error;
    });
    // only now, with the case locked: another request may just have removed it
    const image = await manager.findOneBy(CaseImage, { id, state: 'ready' });
    if (!image) throw notFound('picture');
    image.case = found;
    return image;
  }

  private lockedCase(actor: Actor, caseId: string, manager: DataSource['manager']): Promise<Case> {
    return this.access.case(actor, Permission.ImageWrite, caseId, { stages: STAGES_FOR_IMAGES, manager, lock: true });
  }

  /** The row comes first: what has a row and no files is found by the sweep, and so are files without a row. */
  private reserve(actor: Actor, found: Case, processed: ProcessedImage, sourceHash: string, body: UploadImageDto): Promise<CaseImage> {
    return this.work.run(actor, async (tx) => {
      await this.lockedCase(actor, found.id, tx.manager);
      // what has been storing for longer is the sweep's, and must not keep the same file from being sent again
      const storing = { caseId: found.id, state: 'storing' as const, createdAt: MoreThan(storingSince(tx.now)) };
      const there = await tx.manager.find(CaseImage, { where: [{ caseId: found.id, state: 'ready' }, storing] });
      if (there.length >= MOST_IMAGES) throw invalid('file', 'too-many', `A case holds at most ${MOST_IMAGES} pictures. Remove one first.`);
      const same = there.find((image) => image.sourceHash === sourceHash);
      if (same)
        throw new Problem('conflict', same.state === 'ready' ? 'This very file is in the case already.' : 'This very file is being stored just now. Look at the case again in a moment.');
      const image = tx.manager.create(CaseImage, {
        caseId: found.id,
        state: 'storing',
        projection: body.projection ?? 'other',
        interval: body.interval ?? '',
        caption: body.caption ?? '',
        position: Math.max(0, ...there.map((other) => other.position + 1)),
        width: processed.width,
        height: processed.height,
        bytes: Object.values(processed.files).reduce((sum, file) => sum + file.bytes.length, 0),
        sourceKind: processed.kind,
        sourceHash,
        pixelSpacingMm: processed.pixelSpacingMm,
        uploadedById: actor.personId,
        createdAt: tx.now,
      });
      return tx.manager.save(image);
    });
  }

  private makeReady(actor: Actor, image: CaseImage): Promise<ImageDto> {
    return this.work.run(actor, async (tx) => {
      const found = await this.lockedCase(actor, image.caseId, tx.manager);
      const { affected } = await tx.manager.update(CaseImage, { id: image.id, state: 'storing' }, { state: 'ready' });
      // storing took so long that the sweep took it for abandoned
      if (!affected) throw unavailable('object store');
      await tx.audit({ action: 'image.upload', recordKind: 'image', recordId: image.id, caseId: found.id, conferenceId: found.conferenceId, details: { kind: image.sourceKind } });
      await tx.event({ kind: 'images-changed', conferenceId: found.conferenceId, caseId: found.id });
      return this.toDto({ ...image, state: 'ready' });
    });
  }

  private async undo(image: CaseImage): Promise<void> {
    try {
      // the row first: where it turned ready after all, though the answer got lost, its files must stay
      const { affected } = await this.dataSource.manager.delete(CaseImage, { id: image.id, state: 'storing' });
      if (affected) await this.storage.delete(imageKeys(image.id));
    } catch {
      // the sweep takes what is left: rows that stay in storing, and files without a row
    }
  }

  private toDto(image: CaseImage): ImageDto {
    return {
      id: image.id,
      projection: image.projection,
      interval: image.interval,
      caption: image.caption,
      position: image.position,
      width: image.width,
      height: image.height,
      pixelSpacingMm: image.pixelSpacingMm,
      uploadedAt: image.createdAt.toISOString(),
      addresses: this.addresses.of(image.id),
    };
  }
}
