import { mondayOf } from './planned-week';

// Expected days by GNU coreutils: date -d <day> +%G-W%V
it.each([
  ['2026-W51', '2026-12-14'],
  ['2026-W01', '2025-12-29'],
  ['2020-W53', '2020-12-28'],
  ['2027-W01', '2027-01-04'],
  ['2026-W53', '2026-12-28'],
])('begins %s on %s', (week, monday) => {
  expect(mondayOf(week)?.toISOString().slice(0, 10)).toBe(monday);
});

it.each(['2027-W53', '2026-W00', '2026-W54', '2026-51', 'soon', ''])('knows no week %p', (week) => {
  expect(mondayOf(week)).toBeNull();
});
