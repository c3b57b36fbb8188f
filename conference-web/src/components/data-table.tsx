import { type ReactNode, useRef } from 'react';
import { useListKeys } from './keys/use-key';
import styles from './data-table.module.css';

export interface Column<T> {
  key: string;
  head: string;
  cell: (row: T) => ReactNode;
  /** The name this column sorts by. */
  sort?: string;
  align?: 'right';
  /** On a phone the cell stands without its label: on a line of its own, or beside its neighbours. */
  fold?: 'bare' | 'inline';
  nowrap?: boolean;
}

export interface Sorting {
  by: string;
  order: 'asc' | 'desc';
}

interface DataTableProps<T> {
  /** Read out as the table's name. */
  caption: string;
  columns: Column<T>[];
  rows: T[];
  rowKey: (row: T) => string;
  /** The first column's link, marked `data-list-item`, covers its row. */
  linked?: boolean;
  sorting?: Sorting;
  onSort?: (by: string) => void;
}

const ariaSort = (sorting: Sorting | undefined, by: string | undefined) =>
  by && sorting?.by === by ? (sorting.order === 'asc' ? 'ascending' : 'descending') : undefined;

/** A table with a few strong columns; on a phone each row folds to labelled lines. The roles are spelled out since
 * browsers drop a table's meaning when its display is changed. */
export function DataTable<T>({ caption, columns, rows, rowKey, linked = false, sorting, onSort }: DataTableProps<T>) {
  const table = useRef<HTMLTableElement>(null);
  useListKeys(table);
  return (
    <table ref={table} role="table" className={styles.table} aria-label={caption}>
      <thead role="rowgroup">
        <tr role="row">
          {columns.map(({ key, head, sort, align }) => (
            <th key={key} role="columnheader" scope="col" className={align && styles[align]} aria-sort={ariaSort(sorting, sort)}>
              {sort && onSort ? (
                <button type="button" className={styles.sort} onClick={() => onSort(sort)}>
                  {head}
                  <span aria-hidden="true">{sorting?.by === sort ? (sorting.order === 'asc' ? '↑' : '↓') : ''}</span>
                </button>
              ) : (
                head
              )}
            </th>
          ))}
        </tr>
      </thead>
      <tbody role="rowgroup">
        {rows.map((row) => (
          <tr key={rowKey(row)} role="row" className={linked ? styles.linked : undefined}>
            {columns.map((column, index) => (
              <Cell key={column.key} column={column} isRowHead={index === 0} content={column.cell(row)} />
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

const classNames = (...names: (string | false | undefined)[]) => names.filter(Boolean).join(' ') || undefined;

function Cell<T>({ column, isRowHead, content }: { column: Column<T>; isRowHead: boolean; content: ReactNode }) {
  const className = classNames(column.align && styles[column.align], column.nowrap && styles.nowrap, column.fold === 'inline' && styles.inline);
  if (isRowHead)
    return (
      <th role="rowheader" scope="row" className={className}>
        {content}
      </th>
    );
  const isEmpty = content === null || content === undefined || content === '';
  return (
    <td role="cell" className={className} data-label={column.fold ? undefined : column.head} data-empty={isEmpty || undefined}>
      {column.fold || isEmpty ? content : <div>{content}</div>}
    </td>
  );
}
