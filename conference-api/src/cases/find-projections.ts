import type { EntityManager } from 'typeorm';
import type { Projection } from '../calc/vocabulary/images.js';
import { CaseImage } from '../images/entities/case-image.entity.js';

/** The projections of a case's pictures: all that its readiness asks of them. */
export async function findProjections(manager: EntityManager, caseId: string): Promise<Projection[]> {
  const images = await manager.find(CaseImage, { where: { caseId, state: 'ready' }, select: { id: true, projection: true } });
  return images.map(({ projection }) => projection);
}
