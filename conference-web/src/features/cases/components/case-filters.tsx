import { JOINT_WORDS, STAGE_WORDS, STAGES, URGENCY_WORDS } from '@kerfside/calc/vocabulary/case.js';
import { Button } from '@radix-ui/themes';
import { type ReactNode, useCallback, useState } from 'react';
import { SearchBox } from '@/components/search-box';
import { useMe } from '@/lib/auth/session';
import type { CaseListFilter } from '../api/list-cases';
import { countFilters, SORTS } from '../list-state';
import styles from './case-filters.module.css';

interface FiltersProps {
  filter: CaseListFilter;
  onChange: (changes: Partial<CaseListFilter>, options?: { replace?: boolean }) => void;
  onSort: (by: string) => void;
}

/** Two or more stages at once, where people think of them as one. */
const STAGE_GROUPS: Record<string, string> = { 'open,listed': 'Under discussion', 'decided,final': 'Decided, not yet reported' };
const STAGE_CHOICES = { ...STAGE_GROUPS, ...Object.fromEntries(STAGES.map((stage) => [stage, STAGE_WORDS[stage]])) };
const SORT_CHOICES: Record<(typeof SORTS)[number], string> = {
  updated: 'Last changed',
  released: 'Released',
  urgency: 'Urgency',
  code: 'Code',
};

interface ChoiceProps {
  label: string;
  none?: string;
  value: string;
  words: Record<string, string>;
  onChoose: (value: string) => void;
  wide?: boolean;
}

function Choice({ label, none, value, words, onChoose, wide }: ChoiceProps) {
  // an address may hold a mixture that no choice stands for
  const all = value && !(value in words) ? { ...words, [value]: 'Several' } : words;
  return (
    <label className={`${styles.control} ${wide ? styles.wide : ''}`}>
      {label}
      <select value={value} onChange={(event) => onChoose(event.target.value)}>
        {none && <option value="">{none}</option>}
        {Object.entries(all).map(([name, word]) => (
          <option key={name} value={name}>
            {word}
          </option>
        ))}
      </select>
    </label>
  );
}

const Check = ({ label, on, onSwitch }: { label: ReactNode; on: boolean; onSwitch: (on: boolean) => void }) => (
  <label className={styles.check}>
    <input type="checkbox" checked={on} onChange={(event) => onSwitch(event.target.checked)} />
    {label}
  </label>
);

export function CaseFilters({ filter, onChange, onSort }: FiltersProps) {
  const me = useMe();
  const [isOpen, setOpen] = useState(false);
  // each letter must not become a step in the history
  const search = useCallback((text: string) => onChange({ query: text || undefined }, { replace: true }), [onChange]);
  const count = countFilters(filter);
  const conferences = Object.fromEntries(me.memberships.map(({ conferenceId, conferenceName }) => [conferenceId, conferenceName]));
  return (
    <div role="search" className={styles.filters}>
      <SearchBox label="Search in the cases" value={filter.query ?? ''} onSearch={search} />
      <Button className={styles.toggle} variant="soft" color="gray" aria-expanded={isOpen} onClick={() => setOpen(!isOpen)}>
        {count ? `Filter and sort (${count})` : 'Filter and sort'}
      </Button>
      <div className={styles.group} data-closed={isOpen ? undefined : ''}>
        {me.memberships.length > 1 && (
          <Choice
            label="Conference"
            none="All"
            wide
            value={filter.conferenceId ?? ''}
            words={conferences}
            onChoose={(id) => onChange({ conferenceId: id || undefined })}
          />
        )}
        <Choice
          label="Stage"
          none="All"
          value={filter.stage?.join(',') ?? ''}
          words={STAGE_CHOICES}
          onChoose={(stages) => onChange({ stage: stages ? (stages.split(',') as CaseListFilter['stage']) : undefined })}
        />
        <Choice
          label="Joint"
          none="All"
          value={filter.joint ?? ''}
          words={JOINT_WORDS}
          onChoose={(joint) => onChange({ joint: (joint || undefined) as CaseListFilter['joint'] })}
        />
        <Choice
          label="Urgency"
          none="All"
          value={filter.urgency ?? ''}
          words={URGENCY_WORDS}
          onChoose={(urgency) => onChange({ urgency: (urgency || undefined) as CaseListFilter['urgency'] })}
        />
        <Choice label="Sort by" value={filter.sort ?? 'updated'} words={SORT_CHOICES} onChoose={onSort} />
        <Check label="Awaiting my rating" on={Boolean(filter.awaitingMyRating)} onSwitch={(on) => onChange({ awaitingMyRating: on || undefined })} />
        <Check label="Mine" on={Boolean(filter.mine)} onSwitch={(on) => onChange({ mine: on || undefined })} />
      </div>
    </div>
  );
}
