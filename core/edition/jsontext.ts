const WIDTH = 120;

/**
 * JSON text for people and for version control: two blanks of indent, one line for every list or object that holds no
 * other and fits in 120 characters, keys in the order of the object, a newline at the end.
 */
export function jsonText(value: unknown): string {
  return `${printed(value, '', 0)}\n`;
}

function printed(value: unknown, indent: string, before: number): string {
  if (typeof value !== 'object' || value === null) return JSON.stringify(value);
  const list = Array.isArray(value);
  const members: readonly [string, unknown][] = list
    ? value.map((item: unknown) => ['', item])
    : Object.entries(value)
        .filter(([, item]) => item !== undefined)
        .map(([key, item]) => [`${JSON.stringify(key)}: `, item]);
  const [open, close, pad] = list ? ['[', ']', ''] : ['{', '}', ' '];
  if (members.length === 0) return open + close;
  if (members.every(([, item]) => typeof item !== 'object' || item === null)) {
    const line = `${open}${pad}${members.map(([key, item]) => key + JSON.stringify(item)).join(', ')}${pad}${close}`;
    if (indent.length + before + line.length < WIDTH) return line;
  }
  const inner = `${indent}  `;
  const lines = members.map(([key, item]) => `${inner}${key}${printed(item, inner, key.length)}`);
  return `${open}\n${lines.join(',\n')}\n${indent}${close}`;
}
