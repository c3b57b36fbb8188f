import type { EntityManager } from 'typeorm';
import type { AnchorKind } from '../calc/vocabulary/discussions.js';
import { SECTIONS } from '../calc/vocabulary/case.js';
import type { Case } from '../cases/entities/case.entity.js';
import { invalid } from '../common/problems/problem.js';
import { CaseImage } from '../images/entities/case-image.entity.js';

const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i;

/** The anchor's reference if the case has such a thing now; 422 otherwise. */
export async function readAnchor(manager: EntityManager, found: Case, kind: AnchorKind, ref: string | undefined): Promise<string> {
  const given = ref ?? '';
  const refuse = (message: string) => invalid('anchorRef', 'anchor', message);
  switch (kind) {
    case 'case':
      if (given) throw refuse('A thread on the whole case has no anchor.');
      return '';
    case 'section':
      if (!(SECTIONS as readonly string[]).includes(given)) throw refuse(`Name one of the sections: ${SECTIONS.join(', ')}.`);
      return given;
    case 'step':
      if (!found.content.plan.steps?.some((step) => step.id === given)) throw refuse('The removal plan has no such step.');
      return given;
    default:
      if (!UUID.test(given) || !(await manager.existsBy(CaseImage, { id: given, caseId: found.id, state: 'ready' })))
        throw refuse('The case has no such image.');
      return given;
  }
}
