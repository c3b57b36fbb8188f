/** Markup that is safe to put into a page as it stands. */
export class Markup {
  constructor(readonly text: string) {}
}

type Content = Markup | string | number | null | undefined | Content[];

const ENTITIES: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };

export function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, (character) => ENTITIES[character] ?? character);
}

/** A template for markup: every value is escaped, save for what is Markup already. */
export function html(strings: TemplateStringsArray, ...values: Content[]): Markup {
  return new Markup(strings.reduce((text, string, index) => text + render(values[index - 1]) + string));
}

function render(content: Content): string {
  if (content instanceof Markup) {
    return content.text;
  }
  if (Array.isArray(content)) {
    return content.map(render).join('');
  }
  return content === null || content === undefined ? '' : escapeHtml(String(content));
}

/** Text with its web addresses made into links. */
export function linkified(text: string): Markup[] {
  return text
    .split(/(https?:\/\/[^\s<>"']+)/)
    .map((piece, index) =>
      index % 2 === 1 ? html`<a href="${piece}" target="_blank" rel="noopener noreferrer">${piece}</a>` : html`${piece}`,
    );
}
