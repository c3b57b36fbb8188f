import { FIELD_WORDS, saysNothing, valueInWords } from '@kerfside/calc/cases/field-words.js';
import type { BoneAndPosition, CaseContent } from '@kerfside/calc/vocabulary/case-content.js';
import { DefectFigure } from '../../figures/defect-figure';
import { Line, NotKnown, Paragraphs } from './known';
import { SheetSection } from './sheet-row';
import styles from './sheet.module.css';

type Name = keyof BoneAndPosition & string;

const READ: Name[] = ['migrationMm', 'direction', 'ischialLysis', 'teardrop', 'kohler', 'superiorRim', 'transverseLine', 'readersClass'];
const POSITION: Name[] = ['inclinationDeg', 'versionDeg', 'hipCentreHeightMm'];
const ANY_JOINT: Name[] = ['legLengthMm'];

/** What was read off the images. Of a knee only what was said: the hip's questions do not arise. */
export function BoneSection({ bone, isHip }: Pick<CaseContent, 'bone'> & { isHip: boolean }) {
  const asked = [...READ, ...POSITION, ...ANY_JOINT].filter((name) => isHip || ANY_JOINT.includes(name) || !saysNothing(bone[name]));
  return (
    <SheetSection section="bone">
      <dl className={styles.facts}>
        {asked.map((name) => {
          const words = FIELD_WORDS.bone[name];
          return (
            <div key={name}>
              <dt>{words?.label}</dt>
              <dd className="tabular">{(words && valueInWords(words, bone[name])) ?? <NotKnown />}</dd>
            </div>
          );
        })}
      </dl>
      {!saysNothing(bone.column) && <Line name="Columns">{bone.column}</Line>}
      <Paragraphs text={bone.note} />
      {isHip && <DefectFigure bone={bone} />}
    </SheetSection>
  );
}
