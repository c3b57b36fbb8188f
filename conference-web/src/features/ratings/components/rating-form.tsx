import { Button, Flex } from '@radix-ui/themes';
import { type FormEvent, useRef, useState } from 'react';
import { SelectField, TextAreaField } from '@/components/field';
import { FormProblem } from '@/components/form-problem';
import { RatingRule } from '@/components/rating-rule/rating-rule';
import { useKept } from '@/lib/use-kept';
import { useGiveRating } from '../api/give-rating';
import type { Round } from '../api/get-rounds';
import { figuresOf } from '../figures-words';
import { draftOf, type RatingDraft, toBody, unrated } from '../rating-draft';
import { OptionHead } from './option-head';
import { FigureLines } from './panel-figures';
import { RatingScale } from './rating-scale';
import styles from './ratings.module.css';

interface RatingFormProps {
  caseId: string;
  round: Round;
  /** All, for what may be seen of them already. */
  rounds: Round[];
  onDone: () => void;
  /** Only while an own rating stands. */
  onCancel?: () => void;
}

/** Every option from 1 to 9, the preferred one, and why. Kept in the browser until it is sent. */
export function RatingForm({ caseId, round, rounds, onDone, onCancel }: RatingFormProps) {
  const { options } = round;
  const blank = draftOf(round.mine);
  const { value: draft, wasKept, set, forget } = useKept<RatingDraft>(`rating:${round.id}`, blank);
  const [isChecked, setChecked] = useState(false);
  const form = useRef<HTMLFormElement>(null);
  const give = useGiveRating(caseId, round.number);
  const missing = isChecked ? unrated(options, draft) : [];

  const submit = (event: FormEvent) => {
    event.preventDefault();
    if (give.isPending) return;
    setChecked(true);
    const first = options.findIndex(({ id }) => draft.values[id] === undefined);
    if (first >= 0) return form.current?.querySelectorAll('fieldset')[first]?.querySelector('input')?.focus();
    give.mutate(toBody(options, draft), {
      onSuccess: () => {
        forget(draft);
        onDone();
      },
    });
  };
  const cancel = () => {
    forget(blank);
    onCancel?.();
  };
  return (
    <form ref={form} onSubmit={submit} noValidate className={styles.form}>
      {wasKept && <p className="label-text">Kept from before: not sent yet.</p>}
      <ol className={styles.options}>
        {options.map((option) => (
          <li key={option.id}>
            <OptionHead option={option} />
            <RatingRule title={option.title} rounds={figuresOf(rounds, option.id)} mine={draft.values[option.id] ?? null} isBare />
            <RatingScale
              title={option.title}
              value={draft.values[option.id] ?? null}
              onChange={(value) => set({ ...draft, values: { ...draft.values, [option.id]: value } })}
              error={missing.includes(option.id) ? 'Rate this option from 1 to 9.' : undefined}
            />
            <FigureLines figures={figuresOf(rounds, option.id)} />
          </li>
        ))}
      </ol>
      <SelectField
        label="Preferred option"
        optional
        none="No preference"
        words={Object.fromEntries(options.map(({ id, title }) => [id, title]))}
        value={draft.preferredOptionId}
        onChange={(event) => set({ ...draft, preferredOptionId: event.target.value })}
      />
      <TextAreaField
        label="Why"
        optional
        hint="Read by the members who have rated, and by all when the round is closed. Without your name, unless the conference shows names."
        maxLength={4000}
        value={draft.reason}
        onChange={(event) => set({ ...draft, reason: event.target.value })}
      />
      <FormProblem error={give.error} />
      {give.error !== null && <p className="label-text">Your rating is kept here. Send it again when you are ready.</p>}
      <Flex gap="3" wrap="wrap">
        <Button type="submit" size="3" loading={give.isPending}>
          {round.mine ? 'Change my rating' : 'Give rating'}
        </Button>
        {onCancel && (
          <Button type="button" size="3" variant="soft" color="gray" onClick={cancel}>
            Keep it as it is
          </Button>
        )}
      </Flex>
    </form>
  );
}
