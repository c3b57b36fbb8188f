import { FIELD_WORDS, valueInWords } from '@kerfside/calc/cases/field-words.js';
import { type CaseContent, CERTAINTY, FIXATION, HEAD_DRIVE, type ImplantPart, KNOWN_FROM, PART, QUADRANT, type Screw } from '@kerfside/calc/vocabulary/case-content.js';
import { quantity } from '@/lib/units';
import { hasScrews, partFields } from '../../form/part-fields';
import { NotKnown, Paragraphs } from './known';
import { SheetSection } from './sheet-row';
import styles from './sheet.module.css';

const PART_WORDS = FIELD_WORDS.implants['parts'];
const words = PART_WORDS?.kind === 'list' ? PART_WORDS.item.fields : {};
// 'unknown' is an answer that people type
const named = (text: string | undefined) => (text && !/^\s*(unknown|not known)\s*$/i.test(text) ? text : null);
const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

export function ImplantsSection({ implants }: Pick<CaseContent, 'implants'>) {
  const parts = implants.parts ?? [];
  return (
    <SheetSection section="implants">
      {parts.length === 0 && (
        <p>
          <NotKnown>No part has been listed: what is in place is not known.</NotKnown>
        </p>
      )}
      {parts.map((part) => (
        <Part key={part.id} part={part} />
      ))}
    </SheetSection>
  );
}

function Ground({ part }: { part: ImplantPart }) {
  if (!part.certainty && !part.knownFrom) return <NotKnown>how sure and from what: not said</NotKnown>;
  return (
    <>
      {part.certainty ? CERTAINTY[part.certainty].toLowerCase() : <NotKnown>how sure: not said</NotKnown>},{' '}
      {part.knownFrom ? `from ${KNOWN_FROM[part.knownFrom].toLowerCase()}` : <NotKnown>from what: not said</NotKnown>}
    </>
  );
}

function Part({ part }: { part: ImplantPart }) {
  const facts = partFields(part).map((name) => [capital(words[name]?.label ?? name), words[name] ? valueInWords(words[name], part[name]) : null] as const);
  return (
    <div className={styles.part}>
      <h3>
        {PART[part.part]}, {part.fixation && part.fixation !== 'unknown' ? FIXATION[part.fixation].toLowerCase() : <NotKnown>fixation not known</NotKnown>}
      </h3>
      <dl className={styles.facts}>
        <div>
          <dt>Maker and model</dt>
          <dd>
            {named(part.maker) ?? <NotKnown>maker not known</NotKnown>}, {named(part.model) ?? <NotKnown>model not known</NotKnown>}
            {' '}(<Ground part={part} />)
          </dd>
        </div>
        {facts.map(([name, value]) => (
          <div key={name}>
            <dt>{name}</dt>
            <dd className="tabular">{value ?? <NotKnown />}</dd>
          </div>
        ))}
      </dl>
      {hasScrews(part) && <Screws screws={part.screws ?? []} />}
      <Paragraphs text={part.note} />
    </div>
  );
}

function Screws({ screws }: { screws: Screw[] }) {
  if (screws.length === 0)
    return (
      <p className={styles.line}>
        <span className={styles.name}>Screws</span> <NotKnown>none listed</NotKnown>
      </p>
    );
  return (
    <table className={styles.table}>
      <caption>Screws seen: {screws.length}</caption>
      <thead>
        <tr>
          <th scope="col">Where</th>
          <th scope="col">Length</th>
          <th scope="col">Head drive</th>
          <th scope="col">Tip</th>
        </tr>
      </thead>
      <tbody>
        {screws.map((screw) => (
          <tr key={screw.id}>
            <th scope="row">{screw.hour ? `${screw.hour} o’clock` : screw.quadrant ? QUADRANT[screw.quadrant] : <NotKnown />}</th>
            <td>{screw.lengthMm ? quantity(screw.lengthMm, 'mm') : <NotKnown />}</td>
            <td>{screw.headDrive && screw.headDrive !== 'unknown' ? HEAD_DRIVE[screw.headDrive] : <NotKnown />}</td>
            <td>{screw.tipInsidePelvis === true ? 'inside the pelvis' : screw.tipInsidePelvis === false ? 'not inside the pelvis' : <NotKnown />}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
