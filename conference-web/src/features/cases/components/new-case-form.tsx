import { JOINT_WORDS, type Joint, SIDE_WORDS, type Side } from '@kerfside/calc/vocabulary/case.js';
import { Button } from '@radix-ui/themes';
import { type FormEvent, useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { paths } from '@/app/paths';
import { SelectField, TextField } from '@/components/field';
import { FormProblem } from '@/components/form-problem';
import { fieldMessages } from '@/lib/api/field-messages';
import { useCreateCase } from '../api/create-case';
import { TEXT_LIMITS } from '../form/field-limits';

/** The little that a draft begins with. */
export function NewCaseForm({ conferences }: { conferences: { conferenceId: string; conferenceName: string }[] }) {
  const navigate = useNavigate();
  const create = useCreateCase();
  const [conferenceId, setConferenceId] = useState(conferences.length === 1 ? conferences[0]!.conferenceId : '');
  const [joint, setJoint] = useState<Joint>('hip');
  const [side, setSide] = useState<Side | ''>('');
  const [title, setTitle] = useState('');
  const fields = fieldMessages(create.error);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    create.mutate({ conferenceId, joint, side: side || null, title: title.trim() }, { onSuccess: ({ id }) => navigate(paths.editCase(id), { replace: true }) });
  };
  return (
    <form onSubmit={submit} style={{ maxWidth: 480 }}>
      <FormProblem error={create.error} shown={['conferenceId', 'joint', 'side', 'title']} />
      <SelectField
        label="Conference"
        words={Object.fromEntries(conferences.map((conference) => [conference.conferenceId, conference.conferenceName]))}
        none={conferences.length === 1 ? undefined : 'Choose'}
        required
        error={fields['conferenceId']}
        value={conferenceId}
        onChange={(event) => setConferenceId(event.target.value)}
      />
      <SelectField label="Joint" words={JOINT_WORDS} error={fields['joint']} value={joint} onChange={(event) => setJoint(event.target.value as Joint)} />
      <SelectField
        label="Side"
        words={SIDE_WORDS}
        none="Choose"
        optional
        error={fields['side']}
        value={side}
        onChange={(event) => setSide(event.target.value as Side | '')}
      />
      <TextField
        label="Title"
        hint="What it is about, in a few words. No initials, no dates of birth, no dates."
        optional
        error={fields['title']}
        maxLength={TEXT_LIMITS['heading']?.['title']}
        value={title}
        onChange={(event) => setTitle(event.target.value)}
      />
      <Button type="submit" loading={create.isPending}>
        Begin draft
      </Button>
      <p className="label-text">Only you see a draft. It is saved as you type.</p>
    </form>
  );
}
