import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { type Column, DataTable } from './data-table';
import { KeysProvider } from './keys/keys-provider';

interface Row {
  name: string;
  count: number | null;
}

const rows: Row[] = [
  { name: 'First', count: 3 },
  { name: 'Second', count: null },
  { name: 'Third', count: 1 },
];
const columns: Column<Row>[] = [
  { key: 'name', head: 'Name', sort: 'name', cell: ({ name }) => <a href={`#${name}`} data-list-item>{name}</a> },
  { key: 'count', head: 'Count', align: 'right', cell: ({ count }) => count },
];

function show(onSort = jest.fn()) {
  render(
    <KeysProvider>
      <input aria-label="Elsewhere" />
      <DataTable caption="Things" columns={columns} rows={rows} rowKey={({ name }) => name} sorting={{ by: 'name', order: 'desc' }} onSort={onSort} />
    </KeysProvider>,
  );
  return onSort;
}

it('is a table with row heads and says how it is sorted', () => {
  show();
  const table = screen.getByRole('table', { name: 'Things' });
  expect(within(table).getAllByRole('rowheader').map((cell) => cell.textContent)).toEqual(['First', 'Second', 'Third']);
  expect(within(table).getByRole('columnheader', { name: /Name/ })).toHaveAttribute('aria-sort', 'descending');
});

it('asks for the other order from the keyboard', async () => {
  const onSort = show();
  screen.getByRole('button', { name: /Name/ }).focus();
  await userEvent.keyboard('{Enter}');
  expect(onSort).toHaveBeenCalledWith('name');
});

it('walks the rows with j and k, and stops at the ends', async () => {
  show();
  await userEvent.keyboard('jj');
  expect(screen.getByText('Second')).toHaveFocus();
  await userEvent.keyboard('jjj');
  expect(screen.getByText('Third')).toHaveFocus();
  await userEvent.keyboard('k');
  expect(screen.getByText('Second')).toHaveFocus();
});

it('leaves the letters alone while somebody types', async () => {
  show();
  const field = screen.getByLabelText('Elsewhere');
  await userEvent.type(field, 'jk?');
  expect(field).toHaveValue('jk?');
  expect(field).toHaveFocus();
});
