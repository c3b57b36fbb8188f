import { calculateInfection2018, type Infection2018Result, type Infection2018Verdict } from '@kerfside/calc/infection/infection-2018.js';
import { FIELD_WORDS } from '@kerfside/calc/cases/field-words.js';
import { type InfectionWorkUp, TIMING } from '@kerfside/calc/vocabulary/case-content.js';
import { FigureFrame } from './figure-frame';
import { tryCalculation } from './try-calculation';

const VERDICT_WORDS: Record<Infection2018Verdict, string> = {
  infected: 'infected',
  possible: 'possibly infected',
  inconclusive: 'inconclusive',
  'not-infected': 'not infected on what is known',
};
const words = (name: string) => (FIELD_WORDS.infection[name]?.label ?? name).replace(/ positive$/, '');
const NAME = 'Infection score of 2018, consensus version';

/** The infection score as the values stand; computed by the same function as on the server. */
export function InfectionFigure({ infection }: { infection: InfectionWorkUp }) {
  const { timing } = infection;
  if (!timing)
    return (
      <FigureFrame name={NAME}>
        Not computed: say first whether it is {Object.values(TIMING).join(' or ').toLowerCase()}, since the thresholds hang on it.
      </FigureFrame>
    );
  const { result, refusal } = tryCalculation(() => calculateInfection2018({ ...infection, variant: 'consensus', timing }));
  return result ? <Result result={result} /> : <FigureFrame name={NAME}>Not computed: {refusal}</FigureFrame>;
}

function Result({ result }: { result: Infection2018Result }) {
  const { totalScore, verdict, majorCriteria, wouldChange } = result;
  const major = majorCriteria.length ? [`Major criteria met: ${majorCriteria.map(words).join(', ')}. One alone decides.`] : [];
  const open = wouldChange.length
    ? [`Would change this: ${wouldChange.map((change) => `${words(change.field)} if ${change.ifItWere} (${VERDICT_WORDS[change.verdict]})`).join('; ')}.`]
    : [];
  return (
    <FigureFrame name={NAME} definition={result.definition} missing={result.missing.map(words)} remarks={[...major, ...open]} cautions={result.cautions}>
      <strong>
        {totalScore} {totalScore === 1 ? 'point' : 'points'}: {VERDICT_WORDS[verdict]}
      </strong>{' '}
      (at most {result.highestPossibleScore} if all that is missing were positive)
    </FigureFrame>
  );
}
