/** HTML that may be put into a page as it is. */
export class SafeHtml {
  constructor(readonly source: string) {}
}

type Part = string | number | SafeHtml | SafeHtml[];

/** A template tag: what is put in is escaped, unless it is HTML made by this tag itself. */
export function html(fixed: TemplateStringsArray, ...parts: Part[]): SafeHtml {
  return new SafeHtml(fixed.map((text, index) => text + sourceOf(parts[index] ?? '')).join(''));
}

function sourceOf(part: Part): string {
  if (part instanceof SafeHtml) return part.source;
  if (Array.isArray(part)) return part.map(({ source }) => source).join('');
  return escapeHtml(String(part));
}

function escapeHtml(text: string): string {
  return text
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;')
    .replaceAll("'", '&#39;');
}
