import { render, screen, within } from '@testing-library/react';
import { RatingRule, type RuleRound } from './rating-rule';
import { placeDots, placeOf } from './rule-geometry';

const round = (number: number, values: number[], median: number): RuleRound => ({
  number,
  n: values.length,
  median,
  low: Math.min(...values),
  high: Math.max(...values),
  values,
});

const FIRST = round(1, [2, 5, 5, 7, 9], 5);
const SECOND = round(2, [6, 7, 7, 8], 7);
const lane = (container: HTMLElement, number: number) => container.querySelector(`[data-round="${number}"]`)!;
const ratingsOf = (element: Element) => [...element.querySelectorAll('circle')].map((dot) => Number(dot.getAttribute('data-rating')));

describe('the rating rule', () => {
  it('is an empty ruler with its three bands while nothing may be seen', () => {
    const { container } = render(<RatingRule title="Two stages" rounds={[]} />);
    expect(container.querySelectorAll('circle')).toHaveLength(0);
    expect(container.querySelector('[data-median]')).toBeNull();
    for (const word of ['inappropriate', 'uncertain', 'appropriate']) expect(screen.getByText(word)).toBeInTheDocument();
    expect(screen.getByText('Two stages: a rule from 1 to 9, no ratings shown.')).toBeInTheDocument();
  });

  it('has a dot for each rating, a lane for each round', () => {
    const { container } = render(<RatingRule title="Two stages" rounds={[FIRST, SECOND]} />);
    expect(ratingsOf(lane(container, 1))).toEqual([2, 5, 5, 7, 9]);
    expect(ratingsOf(lane(container, 2))).toEqual([6, 7, 7, 8]);
  });

  it('stands the median and the spread where the ruler has their numbers', () => {
    const { container } = render(<RatingRule title="Two stages" rounds={[round(1, [6, 7, 8, 8], 7.5)]} />);
    const numeral = (text: string) => Number([...container.querySelectorAll('text')].find((node) => node.textContent === text)!.getAttribute('x'));
    const tick = container.querySelector('[data-median]')!;
    expect(Number(tick.getAttribute('x1'))).toBeCloseTo((numeral('7') + numeral('8')) / 2);
    expect(tick.getAttribute('x1')).toBe(tick.getAttribute('x2'));
    const bar = container.querySelector('[data-low]')!;
    const middle = Number(bar.getAttribute('x')) + Number(bar.getAttribute('width')) / 2;
    expect(middle).toBeCloseTo(numeral('7'));
  });

  it('says the same in a table', () => {
    render(<RatingRule title="Two stages" rounds={[FIRST, SECOND]} mine={5} />);
    const table = screen.getByRole('table', { name: /^Ratings of Two stages.*Yours: 5\.$/ });
    const heads = within(table)
      .getAllByRole('columnheader')
      .map((head) => head.textContent);
    const [, first, second] = within(table).getAllByRole('row');
    const cell = (row: HTMLElement | undefined, head: string) => [...row!.children][heads.indexOf(head)]!.textContent;
    expect([cell(first, 'Ratings'), cell(first, 'Median'), cell(first, 'Lowest'), cell(first, 'Highest')]).toEqual(['5', '5', '2', '9']);
    expect([cell(first, 'Gave 5'), cell(first, 'Gave 3'), cell(second, 'Gave 7')]).toEqual(['2', '0', '2']);
  });

  it('leaves out a round that nobody rated', () => {
    const { container } = render(<RatingRule title="Two stages" rounds={[FIRST, { number: 2, n: 0, median: null, low: null, high: null, values: [] }]} />);
    expect(container.querySelectorAll('[data-round]')).toHaveLength(1);
  });
});

describe('the dots', () => {
  it('stack upwards where ratings are equal, without touching sideways', () => {
    const { dots } = placeDots([4, 4, 4]);
    expect(new Set(dots.map(({ x }) => x)).size).toBe(1);
    expect(new Set(dots.map(({ up }) => up)).size).toBe(3);
  });

  it('stay within the lane for a whole hall of raters', () => {
    const { dots, height } = placeDots(Array.from({ length: 60 }, () => 8));
    expect(dots).toHaveLength(60);
    expect(height).toBeLessThan(100);
  });

  it('are evenly spaced from 1 to 9', () => {
    const steps = [2, 3, 4, 5, 6, 7, 8, 9].map((rating) => placeOf(rating) - placeOf(rating - 1));
    for (const step of steps) expect(step).toBeCloseTo(steps[0]!);
  });
});
