/** Text that is known to be safe HTML. */
export class Html {
  constructor(readonly text: string) {}
}

type Part = Html | string | number | null | Part[];

const ESCAPES: Record<string, string> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

function render(part: Part): string {
  if (part === null) return '';
  if (Array.isArray(part)) return part.map(render).join('');
  if (part instanceof Html) return part.text;
  return String(part).replace(/[&<>"']/g, (character) => ESCAPES[character] ?? '');
}

/** A template whose values are escaped unless they are HTML already; null leaves nothing. */
export function html(strings: TemplateStringsArray, ...parts: Part[]): Html {
  const pieces = strings.map((text, position) => text + render(parts[position] ?? null));
  return new Html(pieces.join(''));
}
