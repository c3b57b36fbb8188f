const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/** `7 Dec 2026, 18:05 UTC` */
export function formatDate(iso: string): string {
  const date = new Date(iso);
  return `${date.getUTCDate()} ${MONTHS[date.getUTCMonth()]} ${date.getUTCFullYear()}, ${iso.slice(11, 16)} UTC`;
}

/** Bytes below 1 kB, else kB or MB with powers of 1000. */
export function formatSize(bytes: number): string {
  if (bytes < 1000) {
    return `${bytes} bytes`;
  }
  return bytes < 1_000_000 ? `${(bytes / 1000).toFixed(1)} kB` : `${(bytes / 1_000_000).toFixed(1)} MB`;
}
