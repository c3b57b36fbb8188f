import { Button } from '@radix-ui/themes';
import { useQuery } from '@tanstack/react-query';
import { type FormEvent, type ReactNode, useState } from 'react';
import { type Column, DataTable } from '@/components/data-table';
import { TextField } from '@/components/field';
import { FormButtons } from '@/components/form-buttons';
import { FormDialog } from '@/components/form-dialog';
import { FormProblem } from '@/components/form-problem';
import { EmptyState, Loaded, TableSkeleton } from '@/components/page-states';
import { Section } from '@/components/section';
import { fieldMessages } from '@/lib/api/field-messages';
import type { Schemas } from '@/lib/api/types';
import { unitsQuery } from '../api/list-units';
import { useWriteUnit } from '../api/write-unit';

type Unit = Schemas['UnitDto'];

function UnitForm({ unit, onDone }: { unit?: Unit; onDone: () => void }) {
  const write = useWriteUnit(unit?.id);
  const [name, setName] = useState(unit?.name ?? '');
  const [contactEmail, setContactEmail] = useState(unit?.contactEmail ?? '');
  const fields = fieldMessages(write.error);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    write.mutate({ name: name.trim(), contactEmail: contactEmail.trim() || null }, { onSuccess: onDone });
  };
  return (
    <form onSubmit={submit}>
      <FormProblem error={write.error} shown={['name', 'contactEmail']} />
      <TextField label="Name" error={fields['name']} maxLength={120} required value={name} onChange={({ target }) => setName(target.value)} />
      <TextField
        label="Contact e-mail address"
        optional
        type="email"
        error={fields['contactEmail']}
        value={contactEmail}
        onChange={({ target }) => setContactEmail(target.value)}
      />
      <FormButtons word="Save unit" isBusy={write.isPending} onCancel={onDone} />
    </form>
  );
}

const WriteUnit = ({ unit, trigger }: { unit?: Unit; trigger: ReactNode }) => (
  <FormDialog trigger={trigger} title={unit ? unit.name : 'Add a unit'} description="A hospital or department that people belong to.">
    {(close) => <UnitForm unit={unit} onDone={close} />}
  </FormDialog>
);

const columns: Column<Unit>[] = [
  { key: 'name', head: 'Unit', cell: ({ name }) => name },
  { key: 'contact', head: 'Contact', cell: ({ contactEmail }) => contactEmail },
  {
    key: 'edit',
    head: 'Change',
    fold: 'bare',
    align: 'right',
    cell: (unit) => (
      <WriteUnit
        unit={unit}
        trigger={
          <Button variant="soft" size="2" aria-label={`Edit ${unit.name}`}>
            Edit
          </Button>
        }
      />
    ),
  },
];

export function UnitTable() {
  const query = useQuery(unitsQuery());
  return (
    <Section title="Units" actions={<WriteUnit trigger={<Button variant="soft">Add unit</Button>} />}>
      <Loaded query={query} skeleton={<TableSkeleton rows={3} columns={3} />}>
        {({ items }) =>
          items.length === 0 ? (
            <EmptyState title="No units yet">A unit is a hospital or department. Each person belongs to one.</EmptyState>
          ) : (
            <DataTable caption="Units" columns={columns} rows={items} rowKey={({ id }) => id} />
          )
        }
      </Loaded>
    </Section>
  );
}
