/** Text that is already HTML. Only `html` and `raw` make it, so everything else is escaped. */
export interface Html {
  readonly html: string;
}

type Part = Html | string | number | readonly Part[] | undefined;

/** Tag for templates of HTML and SVG: every inserted text is escaped, lists are joined, undefined is nothing. */
export function html(texts: TemplateStringsArray, ...parts: readonly Part[]): Html {
  return { html: texts.reduce((whole, text, at) => whole + rendered(parts[at - 1]) + text) };
}

/** Marks a text of the program's own as HTML, such as a style sheet. */
export function raw(text: string): Html {
  return { html: text };
}

function rendered(part: Part): string {
  if (part === undefined) return '';
  if (typeof part === 'string') return escaped(part);
  if (typeof part === 'number') return String(part);
  return 'html' in part ? part.html : part.map(rendered).join('');
}

const ENTITIES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

/** Characters that neither HTML nor XML may hold. */

const FORBIDDEN = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f\ufffe\uffff]/g;

function escaped(text: string): string {
  return text.replace(FORBIDDEN, '\ufffd').replace(/[&<>"']/g, (character) => ENTITIES[character]!);
}
