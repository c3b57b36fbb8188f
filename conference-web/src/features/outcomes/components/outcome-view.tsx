import { BLOOD_LOSS_BANDS, COMPLICATIONS } from '@kerfside/calc/vocabulary/outcomes.js';
import { PersonLine } from '@/components/person-line';
import { RimClock } from '@/components/rim-clock/rim-clock';
import { Facts, Section } from '@/components/section';
import type { Schemas } from '@/lib/api/types';
import { formatDateTime } from '@/lib/dates';
import { quantity } from '@/lib/units';
import type { Outcome } from '../api/list-outcomes';
import { compareFindings, compareSteps, type PlannedDone } from '../planned-done';
import styles from './outcomes.module.css';

/** What was planned beside what was done, with what differs marked. */
export function OutcomeView({ found, outcome }: { found: Schemas['CaseDto']; outcome: Outcome }) {
  const { content } = found;
  const text = (words: string, key: string) => (words ? <span key={key} className={styles.words}>{words}</span> : 'Not said');
  return (
    <>
      <p className="label-text">
        Version {outcome.version}, <time dateTime={outcome.at}>{formatDateTime(outcome.at)}</time>, <PersonLine person={outcome.by} short />
        {outcome.amendmentReason !== null && `. Amended: ${outcome.amendmentReason}`}
      </p>
      <Section title="Steps">
        <Comparison caption="Steps, planned and done" rows={compareSteps(content, outcome)} />
      </Section>
      <Section title="Findings">
        <Comparison caption="Findings, planned and found" rows={compareFindings(content, outcome)} />
        <Facts
          facts={[
            ['Duration', outcome.minutes === null ? 'Not known' : quantity(outcome.minutes, 'minutes', 0)],
            ['Blood loss', outcome.bloodLoss === null ? 'Not known' : BLOOD_LOSS_BANDS[outcome.bloodLoss]],
            ['Complications', complicationWords(outcome.complications)],
            ['Kit that was missing', text(outcome.missingKit, 'kit')],
            ['Cultures', text(outcome.cultures, 'cultures')],
          ]}
        />
      </Section>
      {content.heading.joint !== 'knee' && <Rim found={found} outcome={outcome} />}
      {outcome.lesson && (
        <Section title="Lesson">
          <p className={styles.words}>{outcome.lesson}</p>
        </Section>
      )}
    </>
  );
}

function complicationWords(names: string[]): string {
  if (names.length === 0) return 'Not known';
  return names.map((name) => COMPLICATIONS[name as keyof typeof COMPLICATIONS] ?? name).join(', ');
}

/** A row for each thing, with a word and a sign where the two differ. */
function Comparison({ caption, rows }: { caption: string; rows: PlannedDone[] }) {
  if (rows.length === 0) return <p className="label-text">Nothing was planned.</p>;
  return (
    <table className={styles.comparison} role="table" aria-label={caption}>
      <thead role="rowgroup">
        <tr role="row">
          {['What', 'Planned', 'Done'].map((head) => (
            <th key={head} role="columnheader" scope="col">
              {head}
            </th>
          ))}
        </tr>
      </thead>
      <tbody role="rowgroup">
        {rows.map(({ key, name, planned, done, differs }) => (
          <tr key={key} role="row" data-differs={differs || undefined}>
            <th role="rowheader" scope="row">
              {name}
            </th>
            <td role="cell" data-label="Planned">
              <div>{planned || 'Not planned'}</div>
            </td>
            <td role="cell" data-label="Done">
              <div>
                {differs && <span className={styles.differs}>≠ differs: </span>}
                {done}
              </div>
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function Rim({ found, outcome }: { found: Schemas['CaseDto']; outcome: Outcome }) {
  const { heading, plan, implants } = found.content;
  const screws = implants.parts?.find(({ part }) => part === 'shell')?.screws ?? [];
  const picture = { side: heading.side ?? null, screws };
  return (
    <Section title="Rim">
      <div className={styles.clocks}>
        <figure>
          <figcaption>Planned</figcaption>
          <RimClock {...picture} sectors={plan.rim ?? []} />
        </figure>
        <figure>
          <figcaption>
            Done: {outcome.boneLostHours.length === 0 ? 'no bone lost at the rim' : `bone lost at ${outcome.boneLostHours.join(', ')} o’clock`}
          </figcaption>
          <RimClock {...picture} sectors={plan.rim ?? []} lost={outcome.boneLostHours} />
        </figure>
      </div>
    </Section>
  );
}
