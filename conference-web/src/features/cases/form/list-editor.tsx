import { ArrowDownIcon, ArrowUpIcon, Cross2Icon, PlusIcon } from '@radix-ui/react-icons';
import { Button, IconButton } from '@radix-ui/themes';
import { type ReactNode, useEffect, useRef, useState } from 'react';
import type { Binding, BoundList, Identified } from './binding';
import styles from './form.module.css';

interface ListEditorProps<T extends object, I extends Identified> {
  of: BoundList<T, I>;
  /** What one is called: 'step'. */
  noun: string;
  make: () => I;
  children: (item: Binding<I>, index: number) => ReactNode;
  /** Whether their order has a meaning, so that they can be moved. */
  ordered?: boolean;
  empty?: ReactNode;
  disabled?: boolean;
}

interface Removed<I> {
  item: I;
  at: number;
}

/** Items one below the other, each with its fields; what was removed can be put back. */
export function ListEditor<T extends object, I extends Identified>({ of, noun, make, children, ordered, empty, disabled }: ListEditorProps<T, I>) {
  const list = useRef<HTMLDivElement>(null);
  const [added, setAdded] = useState<string | null>(null);
  const [moved, setMoved] = useState<{ id: string; by: number } | null>(null);
  const [removed, setRemoved] = useState<Removed<I> | null>(null);
  useEffect(() => {
    if (added) list.current?.querySelector<HTMLElement>(`[data-item="${added}"] :is(select, input, textarea)`)?.focus();
  }, [added]);
  // a moved element loses the focus, and whoever moves an item wants to press again
  useEffect(() => {
    if (moved) list.current?.querySelector<HTMLElement>(`[data-item="${moved.id}"] [data-move="${moved.by}"]`)?.focus();
  }, [moved]);
  const add = () => {
    const item = make();
    of.add(item);
    setAdded(item.id);
  };
  const remove = (item: I, at: number) => {
    of.remove(item.id);
    setRemoved({ item, at });
  };
  const move = (id: string, by: number) => {
    of.move(id, by);
    setMoved({ id, by });
  };
  const putBack = () => {
    if (removed) of.add(removed.item, removed.at);
    setRemoved(null);
    setAdded(removed?.item.id ?? null);
  };
  return (
    <div ref={list} className={styles.list}>
      {of.items.length === 0 && empty && <p className={styles.empty}>{empty}</p>}
      {of.items.map((item, index) => (
        <div key={item.id} data-item={item.id} className={styles.item} role="group" aria-label={`${ordered ? `${index + 1}. ` : ''}${of.name(item)}`}>
          <div className={styles['item-head']}>
            <span className={styles['item-name']}>
              {ordered && `${index + 1}. `}
              {of.name(item)}
            </span>
            {!disabled && (
              <ItemButtons {...{ ordered, index }} count={of.items.length} name={of.name(item)} onMove={(by) => move(item.id, by)} onRemove={() => remove(item, index)} />
            )}
          </div>
          {children(of.bind(item, index), index)}
        </div>
      ))}
      {removed && (
        <p className={styles.removed} role="status">
          Removed: {of.name(removed.item)}.{' '}
          <Button type="button" size="1" variant="soft" autoFocus onClick={putBack}>
            Put it back
          </Button>
        </p>
      )}
      {!disabled && (
        <Button type="button" variant="soft" disabled={of.isFull} onClick={add}>
          <PlusIcon aria-hidden="true" />
          Add {noun}
        </Button>
      )}
    </div>
  );
}

interface ItemButtonsProps {
  ordered?: boolean;
  index: number;
  count: number;
  name: string;
  onMove: (by: number) => void;
  onRemove: () => void;
}

function ItemButtons({ ordered, index, count, name, onMove, onRemove }: ItemButtonsProps) {
  return (
    <span className={styles['item-buttons']}>
      {ordered && (
        <>
          <IconButton type="button" variant="ghost" color="gray" data-move={-1} aria-label={`Move up: ${name}`} aria-disabled={index === 0} onClick={() => onMove(-1)}>
            <ArrowUpIcon />
          </IconButton>
          <IconButton type="button" variant="ghost" color="gray" data-move={1} aria-label={`Move down: ${name}`} aria-disabled={index === count - 1} onClick={() => onMove(1)}>
            <ArrowDownIcon />
          </IconButton>
        </>
      )}
      <IconButton type="button" variant="ghost" color="gray" aria-label={`Remove: ${name}`} onClick={onRemove}>
        <Cross2Icon />
      </IconButton>
    </span>
  );
}
