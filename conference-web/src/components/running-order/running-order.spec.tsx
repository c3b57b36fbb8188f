import { fireEvent, render, screen, within } from '@testing-library/react';
import { useState } from 'react';
import { RunningOrder } from './running-order';
import { moved } from './running-order-scale';

// Minutes worked by hand; no source outside.
const SLOTS = [
  { id: 'HIP-1', minutes: 20 },
  { id: 'HIP-2', minutes: 30 },
  { id: 'HIP-3', minutes: 15 },
];

function Order({ minutes, now, onMoved }: { minutes: number; now?: number; onMoved?: (ids: string[]) => void }) {
  const [slots, setSlots] = useState(SLOTS);
  const move = (from: number, to: number) => {
    const next = moved(slots, from, to);
    setSlots(next);
    onMoved?.(next.map(({ id }) => id));
  };
  return (
    <RunningOrder label="Running order" slots={slots} startsAt="2026-12-09T07:30:00Z" timeZone="UTC" minutes={minutes} now={now} onMove={move}>
      {({ slot, fits }) => (
        <>
          <span data-drag-handle data-testid={`handle ${slot.id}`} />
          {slot.id} {fits ? 'fits' : 'waits'}
        </>
      )}
    </RunningOrder>
  );
}

// jsdom has no PointerEvent; its place and button are those of a mouse event
const pointer = (on: Element | Window, type: string, clientY: number) => fireEvent(on, new MouseEvent(type, { bubbles: true, cancelable: true, button: 0, clientY }));

const words = () => within(screen.getByRole('list', { name: 'Running order' })).getAllByRole('listitem').map((item) => item.textContent?.trim());

test('what does not fit stands below the meeting’s end, and how much is too long is said', () => {
  render(<Order minutes={60} />);
  expect(words()).toEqual(['HIP-1 fits', 'HIP-2 fits', 'HIP-3 waits']);
  expect(screen.getByText('Does not fit: 5 min too long')).toBeInTheDocument();
  const tops = screen.getAllByRole('listitem').map((item) => item.style.top);
  expect(tops.slice(0, 2)).toEqual(['calc(var(--per-minute) * 0)', 'calc(var(--per-minute) * 20)']);
  // the third starts anew after the end at minute 60, with room for the words
  expect(tops[2]).toMatch(/^calc\(.*\* 60.* \+ \d+px\)$/);
});

test('nothing is said to be too long where all fit, and the free minutes are', () => {
  render(<Order minutes={75} />);
  expect(words()).toEqual(['HIP-1 fits', 'HIP-2 fits', 'HIP-3 fits']);
  expect(screen.queryByText(/Does not fit/)).toBeNull();
  expect(screen.getByText('10 min free')).toBeInTheDocument();
});

test('slots are as high as their minutes', () => {
  render(<Order minutes={75} />);
  expect(screen.getAllByRole('listitem').map((item) => item.style.height)).toEqual([20, 30, 15].map((minutes) => `calc(var(--per-minute) * ${minutes})`));
});

test('the ruler names the start, the end and the quarter hours between', () => {
  render(<Order minutes={60} />);
  for (const time of ['07:30', '07:45', '08:00', '08:15', '08:30']) expect(screen.getByText(time)).toBeInTheDocument();
});

test('a slot is dragged by its handle, and Escape puts it back', () => {
  const orders: string[][] = [];
  render(<Order minutes={60} onMoved={(ids) => orders.push(ids)} />);
  pointer(screen.getByTestId('handle HIP-1'), 'pointerdown', 0);
  pointer(window, 'pointermove', 5000);
  expect(orders.at(-1)).toEqual(['HIP-2', 'HIP-3', 'HIP-1']);
  fireEvent.keyDown(window, { key: 'Escape' });
  expect(orders.at(-1)).toEqual(['HIP-1', 'HIP-2', 'HIP-3']);
});

test('a slot is not dragged by its text', () => {
  const orders: string[][] = [];
  render(<Order minutes={60} onMoved={(ids) => orders.push(ids)} />);
  pointer(screen.getAllByRole('listitem')[0]!, 'pointerdown', 0);
  pointer(window, 'pointermove', 5000);
  expect(orders).toEqual([]);
});
