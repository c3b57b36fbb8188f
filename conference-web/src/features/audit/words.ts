/** `case.post` → `Case: post`; the server's own name stays readable whatever is added there. */
export function actionWords(action: string): string {
  const [feature = '', verb = ''] = action.split('.');
  const plain = (word: string) => word.replaceAll('-', ' ');
  const name = plain(feature);
  return verb ? `${name.charAt(0).toUpperCase()}${name.slice(1)}: ${plain(verb)}` : action;
}

/** Field names, stages and counts in one line. */
export function detailWords(details: Record<string, unknown>): string {
  return Object.entries(details)
    .filter(([, value]) => value !== null && value !== undefined)
    .map(([name, value]) => `${name}: ${Array.isArray(value) ? value.join(', ') : typeof value === 'object' ? JSON.stringify(value) : String(value)}`)
    .join('; ');
}
