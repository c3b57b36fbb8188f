import { counted, fileSize, quantity } from './units';

const space = '\u00a0';

it('keeps a number and its unit on one line', () => {
  expect(quantity(54, 'mm')).toBe(`54${space}mm`);
  expect(quantity(41.26, 'degrees')).toBe('41.3°');
  expect(quantity(3200, 'cells', 0)).toBe(`3200${space}/µL`);
  expect(quantity(0, 'crp')).toBe(`0${space}mg/L`);
});

it('shows a dash for what is not known, which is not nought', () => {
  expect(quantity(null, 'crp')).toBe('–');
  expect(quantity(undefined, 'mm')).toBe('–');
});

it('counts in words', () => {
  expect(counted(1, 'case')).toBe(`1${space}case`);
  expect(counted(0, 'case')).toBe(`0${space}cases`);
  expect(counted(2, 'reply', 'replies')).toBe(`2${space}replies`);
});

it('writes file sizes in decimal units (IEC 80000-13)', () => {
  expect(fileSize(999)).toBe(`999${space}B`);
  expect(fileSize(25_000_000)).toBe(`25.0${space}MB`);
});
