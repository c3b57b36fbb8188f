import type { Side } from '@kerfside/calc/vocabulary/case.js';
import { type RimSector, SECTOR_STATE } from '@kerfside/calc/vocabulary/case-content.js';
import { Button } from '@radix-ui/themes';
import { TextField } from '@/components/field';
import { nextOrder, orderRound, ordinal, sectorAt, toggleOrder, withoutOrder, withSector } from './rim-order';
import { hourWords } from './rim-words';
import styles from './rim-clock.module.css';

interface EditorProps {
  hour: number;
  side: Side | null;
  sectors: readonly RimSector[];
  onChange: (sectors: RimSector[]) => void;
}

type State = NonNullable<RimSector['state']>;
const STATES: [State | null, string][] = [...(Object.entries(SECTOR_STATE) as [State, string][]), [null, 'Not settled']];

/** The chosen hour by buttons: for pointing, and for whoever does not know the keys. */
export function RimEditor({ hour, side, sectors, onChange }: EditorProps) {
  const sector = sectorAt(sectors, hour);
  return (
    <fieldset className={styles.editor}>
      <legend>{hourWords(hour, side)}</legend>
      <div className={styles.choices}>
        {STATES.map(([state, word]) => (
          <Button
            key={word}
            type="button"
            size="2"
            variant={(sector.state ?? null) === state ? 'solid' : 'soft'}
            color={(sector.state ?? null) === state ? undefined : 'gray'}
            aria-pressed={(sector.state ?? null) === state}
            onClick={() => onChange(withSector(sectors, hour, { state }))}
          >
            {word}
          </Button>
        ))}
      </div>
      <div className={styles.choices}>
        <Button type="button" variant="soft" onClick={() => onChange(toggleOrder(sectors, hour))}>
          {sector.order ? `Take out of the order (is ${ordinal(sector.order)})` : `Cut ${ordinal(nextOrder(sectors))}`}
        </Button>
        <Button type="button" variant="soft" color="gray" onClick={() => onChange(orderRound(sectors, hour, 'clockwise'))}>
          Number the rest clockwise from here
        </Button>
        <Button type="button" variant="soft" color="gray" onClick={() => onChange(orderRound(sectors, hour, 'anticlockwise'))}>
          Anticlockwise
        </Button>
        <Button type="button" variant="soft" color="gray" disabled={!sectors.some(({ order }) => order)} onClick={() => onChange(withoutOrder(sectors))}>
          Clear the order
        </Button>
      </div>
      <TextField
        label="Note on this hour"
        optional
        maxLength={200}
        value={sector.note ?? ''}
        onChange={(event) => onChange(withSector(sectors, hour, { note: event.target.value }))}
      />
    </fieldset>
  );
}
