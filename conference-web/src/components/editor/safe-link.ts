const PROTOCOLS = ['http:', 'https:', 'mailto:'];
const LONGEST = 2000;
// browsers drop these inside an address: 'java\tscript:' would become a script
const UNSEEN = /[\u0000-\u0020\u007f-\u00a0\u00ad\u200b-\u200f\u2028-\u202f\u2060-\u206f\ufeff]/;

/** The address as a link may carry it, or null: http, https and mailto only, whole, with no user name in it. */
export function safeHref(value: unknown): string | null {
  if (typeof value !== 'string') return null;
  const href = value.trim();
  if (!href || href.length > LONGEST || UNSEEN.test(href) || !URL.canParse(href)) return null;
  const url = new URL(href);
  return PROTOCOLS.includes(url.protocol) && !url.username && !url.password ? url.href : null;
}

/** What a person typed as an address: `kerf.example` is meant as https, a bare e-mail address as mailto. */
export function completeHref(typed: string): string | null {
  const text = typed.trim();
  if (/^[^\s@:/]+@[^\s@:/]+\.[^\s@:/]+$/.test(text)) return safeHref(`mailto:${text}`);
  if (/^[a-z][a-z0-9+.-]*:/i.test(text) && !/^[a-z0-9.-]+:\d+(\/|$)/i.test(text)) return safeHref(text);
  return /^[^\s/]+\.[^\s/]+/.test(text) ? safeHref(`https://${text}`) : null;
}
