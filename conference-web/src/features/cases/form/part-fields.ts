import type { ImplantPart } from '@kerfside/calc/vocabulary/case-content.js';
import { saysNothing } from '@kerfside/calc/cases/field-words.js';

type Name = keyof ImplantPart & string;

const SIZED: Name[] = ['sizeMm', 'material'];

/** What is asked of each kind of part beside fixation, maker, model and ground. Unknown is said for these. */
const ASKED: Record<ImplantPart['part'], Name[]> = {
  shell: ['outerDiameterMm', 'thicknessClass', 'shape', 'material', 'innerDiameterMm', 'screwHoles', 'locking'],
  liner: ['linerKind', 'material', 'innerDiameterMm', 'thicknessMm', 'locking'],
  head: SIZED,
  stem: SIZED,
  'cemented-cup': ['outerDiameterMm', 'innerDiameterMm', 'material'],
  cage: SIZED,
  'femoral-component': SIZED,
  'tibial-component': SIZED,
  'patellar-component': SIZED,
  other: SIZED,
};
const ALL: Name[] = ['sizeMm', 'outerDiameterMm', 'innerDiameterMm', 'thicknessMm', 'thicknessClass', 'shape', 'linerKind', 'material', 'screwHoles', 'locking'];

/** The fields that belong to a part, and any other that says something all the same. */
export const partFields = (part: ImplantPart): Name[] => [
  ...ASKED[part.part],
  ...ALL.filter((name) => !ASKED[part.part].includes(name) && !saysNothing(part[name])),
];

export const hasScrews = (part: ImplantPart): boolean => part.part === 'shell' || part.part === 'cage' || Boolean(part.screws?.length);
