import { Button } from '@radix-ui/themes';
import { type FormEvent, useState } from 'react';
import { TextField } from '@/components/field';
import { FormButtons } from '@/components/form-buttons';
import { FormDialog } from '@/components/form-dialog';
import { FormProblem } from '@/components/form-problem';
import { fieldMessages } from '@/lib/api/field-messages';
import { localZone } from '@/lib/dates';
import { useCreateConference } from '../api/write-conference';

export function CreateConference() {
  return (
    <FormDialog trigger={<Button>New conference</Button>} title="New conference" description="Slot, rules and members are set once it is there.">
      {(close) => <CreateForm onDone={close} />}
    </FormDialog>
  );
}

function CreateForm({ onDone }: { onDone: () => void }) {
  const create = useCreateConference();
  const [name, setName] = useState('');
  const [code, setCode] = useState('');
  const fields = fieldMessages(create.error);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    create.mutate({ name: name.trim(), code, timeZone: localZone() }, { onSuccess: onDone });
  };
  return (
    <form onSubmit={submit}>
      <FormProblem error={create.error} shown={['name', 'code']} />
      <TextField label="Name" required maxLength={120} error={fields['name']} value={name} onChange={({ target }) => setName(target.value)} />
      <TextField
        label="Code"
        hint="Two to six capital letters. Every case code begins with them, and they stay."
        required
        pattern="[A-Z]{2,6}"
        title="Two to six capital letters"
        maxLength={6}
        error={fields['code']}
        value={code}
        onChange={({ target }) => setCode(target.value.toUpperCase())}
      />
      <FormButtons word="Make conference" isBusy={create.isPending} onCancel={onDone} />
    </form>
  );
}
