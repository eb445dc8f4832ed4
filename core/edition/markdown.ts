/** Text of a user or a file in Markdown, shown as it is: nothing in it is markup, a link or a line of its own. */
export function md(text: string): string {
  return text
    .replace(/\s+/g, ' ')
    .trim()
    .replace(/[\\`*_{}[\]<>#|~!$&]/g, '\\$&')
    .replace(/^([-+](?=\s|$))/, '\\$1')
    .replace(/^(\d+)([.)])(?=\s|$)/, '$1\\$2');
}

/** A table of Markdown; cells are escaped already. */
export function mdTable(headings: readonly string[], rows: readonly (readonly string[])[]): string {
  const line = (cells: readonly string[]): string => `| ${cells.join(' | ')} |`;
  return [line(headings), line(headings.map(() => '---')), ...rows.map(line)].join('\n');
}
