/** Units as they are written on screen. */
export const UNITS = {
  mm: 'mm',
  degrees: '°',
  crp: 'mg/L',
  esr: 'mm/h',
  cells: '/µL',
  dDimer: 'µg/L',
  volume: 'cm³',
  percent: '%',
  minutes: 'min',
} as const;
export type Unit = keyof typeof UNITS;

const NO_BREAK = '\u00a0';

/** `54 mm`, `41.5°`; an en dash where nothing is known. The number and its unit stay on one line. */
export function quantity(value: number | null | undefined, unit: Unit, digits = 1): string {
  if (value === null || value === undefined || !Number.isFinite(value)) return '–';
  const number = new Intl.NumberFormat('en-GB', { maximumFractionDigits: digits, useGrouping: Math.abs(value) >= 10_000 }).format(value);
  return unit === 'degrees' ? `${number}°` : `${number}${NO_BREAK}${UNITS[unit]}`;
}

/** `1 case`, `3 cases`. */
export const counted = (count: number, one: string, many = `${one}s`): string => `${count}${NO_BREAK}${count === 1 ? one : many}`;

/** `4.2 MB`. */
export function fileSize(bytes: number): string {
  if (bytes < 1000) return `${bytes}${NO_BREAK}B`;
  if (bytes < 1_000_000) return `${Math.round(bytes / 1000)}${NO_BREAK}kB`;
  return `${(bytes / 1_000_000).toFixed(1)}${NO_BREAK}MB`;
}
