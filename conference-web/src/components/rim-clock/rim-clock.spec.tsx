import type { Side } from '@kerfside/calc/vocabulary/case.js';
import type { RimSector, Screw } from '@kerfside/calc/vocabulary/case-content.js';
import { Theme } from '@radix-ui/themes';
import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { RimClock } from './rim-clock';

const SCREWS: Screw[] = [
  { id: 's1', hour: 11, lengthMm: 35, headDrive: 'hex-3.5', tipInsidePelvis: true },
  { id: 's2', quadrant: 'posterosuperior' },
  { id: 's3', lengthMm: 20 },
];

function Changeable({ side = 'right', start = [], heard }: { side?: Side | null; start?: RimSector[]; heard?: (sectors: RimSector[]) => void }) {
  const [sectors, setSectors] = useState(start);
  const change = (next: RimSector[]) => {
    setSectors(next);
    heard?.(next);
  };
  return (
    <Theme>
      <RimClock side={side} sectors={sectors} screws={SCREWS} onChange={change} />
    </Theme>
  );
}

const focused = () => document.activeElement?.getAttribute('aria-label') ?? '';
const rowOf = (name: RegExp) => screen.getByRole('row', { name });

describe('the rim clock by keyboard', () => {
  it('is one stop of the Tab key; arrows go round both ways', async () => {
    const user = userEvent.setup();
    render(<Changeable />);
    await user.tab();
    expect(focused()).toMatch(/^12 o’clock, superior/);
    await user.keyboard('{ArrowRight}');
    expect(focused()).toMatch(/^1 o’clock, anterosuperior/);
    await user.keyboard('{ArrowLeft}{ArrowLeft}');
    expect(focused()).toMatch(/^11 o’clock, posterosuperior/);
    await user.tab();
    expect(document.activeElement?.hasAttribute('data-sector')).toBe(false);
  });

  it('numbers by Space, sets states by letters, and takes numbers back', async () => {
    const user = userEvent.setup();
    const heard = jest.fn();
    render(<Changeable heard={heard} />);
    await user.tab();
    await user.keyboard('{ArrowRight}{ArrowRight} f{ArrowRight} s');
    expect(heard).toHaveBeenLastCalledWith([
      { hour: 2, order: 1, state: 'fixed' },
      { hour: 3, order: 2, state: 'slow' },
    ]);
    await user.keyboard('{ArrowLeft} n');
    expect(heard).toHaveBeenLastCalledWith([{ hour: 3, order: 1, state: 'slow' }]);
  });

  it('lets letters with Ctrl pass', async () => {
    const user = userEvent.setup();
    const heard = jest.fn();
    render(<Changeable heard={heard} />);
    await user.tab();
    await user.keyboard('{Control>}f{/Control}');
    expect(heard).not.toHaveBeenCalled();
  });
});

describe('the rim clock by pointing', () => {
  it('chooses an hour first and numbers it with the next press', async () => {
    const user = userEvent.setup();
    const heard = jest.fn();
    render(<Changeable heard={heard} />);
    await user.click(screen.getByRole('button', { name: /^4 o’clock/ }));
    expect(heard).not.toHaveBeenCalled();
    expect(screen.getByRole('group', { name: /^4 o’clock/ })).toBeInTheDocument();
    await user.click(screen.getByRole('button', { name: /^4 o’clock/ }));
    expect(heard).toHaveBeenLastCalledWith([{ hour: 4, order: 1 }]);
  });

  it('numbers all the rest from the chosen hour', async () => {
    const user = userEvent.setup();
    const heard = jest.fn();
    render(<Changeable heard={heard} />);
    await user.click(screen.getByRole('button', { name: 'Number the rest clockwise from here' }));
    const [sectors] = heard.mock.lastCall as [RimSector[]];
    expect(sectors).toHaveLength(12);
    expect(sectors.find(({ hour }) => hour === 11)?.order).toBe(12);
  });
});

describe('the rim clock’s sides', () => {
  const drawn = (side: Side | null) => render(<RimClock side={side} sectors={[]} screws={SCREWS} />).container;
  const at = (container: HTMLElement, hour: number) => container.querySelector(`text[data-hour="${hour}"]`)?.textContent;

  it('has anterior on the right of the drawing for a right hip', () => {
    const container = drawn('right');
    expect([at(container, 3), at(container, 9)]).toEqual(['Anterior', 'Posterior']);
    expect(container.textContent).toMatch(/anterior is at 3 for this right hip/);
  });

  it('is mirrored for a left hip', () => {
    const container = drawn('left');
    expect([at(container, 3), at(container, 9)]).toEqual(['Posterior', 'Anterior']);
    expect(container.textContent).toMatch(/anterior is at 9 for this left hip/);
  });

  it('mirrors the danger bands and the screws known by quadrant only', () => {
    const middleX = (container: HTMLElement, selector: string) => Number(/^M(-?[\d.]+)/.exec(container.querySelector(selector)?.getAttribute('d') ?? '')?.[1]);
    const right = drawn('right');
    const left = drawn('left');
    const band = '[data-quadrant="anterosuperior"]';
    expect(middleX(right, band)).toBeGreaterThan(0);
    expect(middleX(left, band)).toBeLessThan(0);
    const screw = '[data-screw="s2"] path';
    expect(middleX(right, screw)).toBeLessThan(0);
    expect(middleX(left, screw)).toBeGreaterThan(0);
  });

  it('draws neither without a side, and says so', () => {
    const container = drawn(null);
    expect(container.querySelector('[data-quadrant]')).toBeNull();
    expect(container.textContent).toMatch(/the side is not known/);
  });
});

describe('the rim clock’s table', () => {
  it('has what the drawing shows, hour by hour', () => {
    const sectors: RimSector[] = [
      { hour: 11, state: 'fixed', order: 2, note: 'old spur' },
      { hour: 6, state: 'slow' },
    ];
    render(<RimClock side="right" sectors={sectors} screws={SCREWS} lost={[6]} />);
    const table = screen.getByRole('table', { name: 'Rim clock, hour by hour' });
    expect(within(table).getAllByRole('row')).toHaveLength(13);
    const eleven = within(rowOf(/^11 o’clock, posterosuperior/)).getAllByRole('cell').map((cell) => cell.textContent);
    expect(eleven).toEqual([
      'Fixed',
      '2nd',
      '11 o’clock, 35\u00a0mm, head drive hexagonal 3.5 mm, tip inside the pelvis',
      'sciatic nerve, superior gluteal vessels',
      'old spur',
    ]);
    expect(rowOf(/^6 o’clock, inferior/)).toHaveTextContent('Slow part, bone lost');
    expect(rowOf(/^10 o’clock/)).toHaveTextContent('posterosuperior, length not known');
    expect(screen.getByText(/Screws whose place is not known/)).toHaveTextContent('20 mm');
  });

  it('names the drawing in a sentence', () => {
    render(<RimClock side="left" sectors={[{ hour: 9, order: 1 }, { hour: 10, order: 2 }]} screws={[]} />);
    expect(screen.getByRole('img')).toHaveAccessibleName('Rim clock of the left hip. Cutting order: 9, 10. 0\u00a0screws.');
  });
});

describe('bone lost on the rim clock', () => {
  it('marks hours and takes them back', async () => {
    const user = userEvent.setup();
    const heard = jest.fn();
    render(<RimClock side="right" sectors={[]} screws={[]} lost={[2]} onLostChange={heard} />);
    await user.click(screen.getByRole('button', { name: /^7 o’clock/ }));
    expect(heard).toHaveBeenLastCalledWith([2, 7]);
    await user.click(screen.getByRole('button', { name: /^2 o’clock.*bone lost/ }));
    expect(heard).toHaveBeenLastCalledWith([]);
  });
});
