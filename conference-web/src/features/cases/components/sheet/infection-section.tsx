import { FIELD_WORDS, saysNothing } from '@kerfside/calc/cases/field-words.js';
import type { CaseContent, Culture, InfectionWorkUp } from '@kerfside/calc/vocabulary/case-content.js';
import { type Unit, quantity } from '@/lib/units';
import { InfectionFigure } from '../../figures/infection-figure';
import { Known, Line, NotKnown, Paragraphs } from './known';
import { SheetSection } from './sheet-row';
import styles from './sheet.module.css';

const VALUES: [keyof InfectionWorkUp & string, Unit][] = [
  ['crpMgL', 'crp'],
  ['esrMmH', 'esr'],
  ['dDimerUgL', 'dDimer'],
  ['synovialWbcPerUl', 'cells'],
  ['pmnPercent', 'percent'],
  ['synovialCrpMgL', 'crp'],
];
const FINDINGS: (keyof InfectionWorkUp & string)[] = [
  'leukocyteEsterase',
  'alphaDefensin',
  'sinusTract',
  'purulence',
  'histologyPositive',
  'sameOrganismCultures',
  'singlePositiveCulture',
];

/** Every value of the work-up, known or not. */
export function InfectionSection({ infection }: Pick<CaseContent, 'infection'>) {
  const known = (name: keyof InfectionWorkUp & string) => <Known of={infection} section="infection" name={name} />;
  return (
    <SheetSection section="infection">
      <p>
        Suspicion of infection: {known('suspicion')}. Timing: {known('timing')}. Samples taken: {known('sampling')}.
      </p>
      <table className={styles.table}>
        <caption className="visually-hidden">Values</caption>
        <thead>
          <tr>
            <th scope="col">Value</th>
            <th scope="col">Found</th>
          </tr>
        </thead>
        <tbody>
          {VALUES.map(([name, unit]) => (
            <tr key={name}>
              <th scope="row">{FIELD_WORDS.infection[name]?.label}</th>
              <td>{saysNothing(infection[name]) ? <NotKnown /> : quantity(infection[name] as number, unit)}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <dl className={styles.facts}>
        {FINDINGS.map((name) => (
          <div key={name}>
            <dt>{FIELD_WORDS.infection[name]?.label}</dt>
            <dd className="tabular">{known(name)}</dd>
          </div>
        ))}
      </dl>
      <Cultures cultures={infection.cultures ?? []} />
      {!saysNothing(infection.histology) && <Line name="Histology">{infection.histology}</Line>}
      <InfectionFigure infection={infection} />
    </SheetSection>
  );
}

function Cultures({ cultures }: { cultures: Culture[] }) {
  if (cultures.length === 0)
    return (
      <Line name="Cultures">
        <NotKnown>none listed</NotKnown>
      </Line>
    );
  return (
    <>
      <p className={styles.name}>Cultures</p>
      <ol className={styles.operations}>
        {cultures.map(({ id, specimen, result, organism, sensitivities }) => (
          <li key={id}>
            {specimen || <NotKnown>specimen not known</NotKnown>}: {result || <NotKnown>result not known</NotKnown>}
            {organism && <>; {organism}</>}
            {!saysNothing(sensitivities) && <Paragraphs text={sensitivities} />}
          </li>
        ))}
      </ol>
    </>
  );
}
