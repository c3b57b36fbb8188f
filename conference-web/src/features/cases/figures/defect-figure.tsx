import { FIELD_WORDS } from '@kerfside/calc/cases/field-words.js';
import { type AcetabularDefectResult, calculateAcetabularDefect } from '@kerfside/calc/defect/acetabular-defect.js';
import type { BoneAndPosition } from '@kerfside/calc/vocabulary/case-content.js';
import { FigureFrame } from './figure-frame';
import { tryCalculation } from './try-calculation';

const NAME = 'Defect class, computed from the findings';
const words = (name: string) => FIELD_WORDS.bone[name]?.label ?? name;

/** The class that the findings give, beside the reader's own. */
export function DefectFigure({ bone }: { bone: BoneAndPosition }) {
  const { migrationMm, direction, ischialLysis, teardrop, kohler, superiorRim, transverseLine, readersClass } = bone;
  const { result, refusal } = tryCalculation(() =>
    calculateAcetabularDefect({ migrationMm, direction, ischialLysis, teardrop, kohler, superiorRim, transverseLine }),
  );
  return result ? <Result result={result} own={readersClass ?? null} /> : <FigureFrame name={NAME}>Not computed: {refusal}</FigureFrame>;
}

function Result({ result, own }: { result: AcetabularDefectResult; own: string | null }) {
  const { possibleClasses, otherRule, suspectedDiscontinuity } = result;
  const open = result.disagreements.length ? 'the findings disagree' : possibleClasses.length ? `still open: ${possibleClasses.join(', ')}` : 'too little is known';
  const remarks = [
    ...result.disagreements,
    ...result.remarks,
    ...(suspectedDiscontinuity ? ['Discontinuity of the pelvis is to be suspected.'] : []),
    ...(otherRule !== result.class ? [`At a threshold of 20 mm: ${otherRule ?? 'no class'}.`] : []),
    own ? `Reader’s own class: ${own}.` : 'Reader’s own class: not said.',
  ];
  return (
    <FigureFrame name={NAME} definition={result.definition} missing={result.missing.map(words)} remarks={remarks} cautions={result.cautions}>
      {result.class ? (
        <strong>
          {result.class} (threshold {'30\u00a0mm'})
        </strong>
      ) : (
        <>No class: {open}</>
      )}
    </FigureFrame>
  );
}
