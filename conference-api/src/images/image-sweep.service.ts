import { Injectable } from '@nestjs/common';
import { DataSource, In, LessThan } from 'typeorm';
import { Settings } from '../config/settings.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { StorageService } from '../storage/storage.service.js';
import { CaseImage } from './entities/case-image.entity.js';
import { IMAGE_PREFIX, imageKeys } from './image-keys.js';
import { storingSince } from './storing.js';

const DAY = 86_400_000;

export interface SweepResult {
  abandoned: number;
  retired: number;
  orphans: number;
}

/** Takes away what a crash, a fault or time has left: rows without files, files without rows, retired pictures. */
@Injectable()
export class ImageSweepService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly storage: StorageService,
    private readonly work: UnitOfWork,
    private readonly settings: Settings,
  ) {}

  async sweep(now = new Date()): Promise<SweepResult> {
    return { abandoned: await this.abandoned(now), retired: await this.retired(now), orphans: await this.orphans(now) };
  }

  private async abandoned(now: Date): Promise<number> {
    const rows = await this.dataSource.manager.find(CaseImage, { where: { state: 'storing', createdAt: LessThan(storingSince(now)) }, take: 500 });
    let count = 0;
    for (const { id } of rows) {
      // the row first: one that turns ready at this very moment keeps its files
      const { affected } = await this.dataSource.manager.delete(CaseImage, { id, state: 'storing' });
      if (!affected) continue;
      await this.storage.delete(imageKeys(id));
      count++;
    }
    return count;
  }

  /** Pictures of withdrawn cases whose time of retention is over. */
  private async retired(now: Date): Promise<number> {
    const before = new Date(now.getTime() - this.settings.retentionDays * DAY);
    const rows = await this.dataSource.manager
      .createQueryBuilder(CaseImage, 'image')
      .innerJoin('image.case', 'case')
      .where('image.state = :state AND case.stage = :stage AND case.withdrawnAt <= :before', { state: 'ready', stage: 'withdrawn', before })
      .take(500)
      .getMany();
    for (const row of rows) {
      await this.work.run(null, async (tx) => {
        const { affected } = await tx.manager.update(CaseImage, { id: row.id, state: 'ready' }, { state: 'removed' });
        if (affected) await tx.audit({ action: 'image.retire', recordKind: 'image', recordId: row.id, caseId: row.caseId });
      });
    }
    await this.storage.delete(rows.flatMap((row) => imageKeys(row.id)));
    return rows.length;
  }

  private async orphans(now: Date): Promise<number> {
    const before = storingSince(now).getTime();
    let count = 0;
    let batch: string[] = [];
    for await (const { key, modified } of this.storage.list(IMAGE_PREFIX)) {
      if (modified.getTime() <= before) batch.push(key);
      if (batch.length >= 900) {
        count += await this.deleteOrphans(batch);
        batch = [];
      }
    }
    return count + (await this.deleteOrphans(batch));
  }

  private async deleteOrphans(keys: string[]): Promise<number> {
    const idOf = (key: string) => key.slice(IMAGE_PREFIX.length).split('/')[0]!;
    const ids = [...new Set(keys.map(idOf))].filter((id) => /^[0-9a-f-]{36}$/.test(id));
    const kept = ids.length ? await this.dataSource.manager.find(CaseImage, { select: { id: true }, where: { id: In(ids), state: In(['ready', 'storing']) } }) : [];
    const known = new Set(kept.map((row) => row.id));
    const orphans = keys.filter((key) => !known.has(idOf(key)));
    await this.storage.delete(orphans);
    return orphans.length;
  }
}
