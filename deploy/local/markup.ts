/** A piece of HTML whose variable parts have been escaped. */
export class Markup {
  constructor(readonly text: string) {}
}

type Part = string | number | Markup | readonly Markup[];

/** HTML in a template: every value is escaped unless it is markup already. */
export function markup(texts: TemplateStringsArray, ...parts: readonly Part[]): Markup {
  return new Markup(texts.map((text, i) => text + render(parts[i] ?? '')).join(''));
}

function render(part: Part): string {
  if (part instanceof Markup) return part.text;
  if (typeof part === 'object') return part.map(({ text }) => text).join('');
  return String(part)
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;')
    .replaceAll("'", '&#39;');
}
