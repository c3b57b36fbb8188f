import type { CaseContent, CaseOption } from '@kerfside/calc/vocabulary/case-content.js';
import { useId } from 'react';
import { bindList, type Binding, newId } from './binding';
import { BoundField } from './bound-field';
import { ListEditor } from './list-editor';
import styles from './form.module.css';

type Options = CaseContent['options'];

const make = (): CaseOption => ({ id: newId('option'), title: '' });

export function OptionsForm({ of }: { of: Binding<Options> }) {
  const group = useId();
  const options = bindList<Options, CaseOption>(of, 'options');
  const propose = (id: string) =>
    of.update((value) => ({ ...value, options: value.options?.map((option) => ({ ...option, isProposal: option.id === id })) }));
  return (
    <>
      {of.disabled && <p className={styles.empty}>The panel has begun to rate, so the options can no longer be changed.</p>}
      <ListEditor
        of={options}
        noun="option"
        make={make}
        ordered
        disabled={of.disabled}
        empty="No option yet. The panel rates two to six, your own proposal among them."
      >
        {(option) => (
          <>
            <BoundField of={option} name="title" />
            <BoundField of={option} name="description" rows={2} />
            <div className={styles.choice} data-place={`options.options[${option.value.id}].isProposal`}>
              <label className={styles.proposal}>
                <input type="radio" name={group} disabled={of.disabled} checked={option.value.isProposal === true} onChange={() => propose(option.value.id)} />
                This is my own proposal
              </label>
            </div>
          </>
        )}
      </ListEditor>
    </>
  );
}
