/** Lines of a table with aligned columns; columns of numbers stand right. */
export function textTable(header: readonly string[], rows: readonly (readonly string[])[]): string[] {
  const widths = header.map((name, at) => Math.max(name.length, ...rows.map((row) => (row[at] ?? '').length)));
  const right = header.map((_, at) => rows.length > 0 && rows.every((row) => /^[-−+]?[\d.,]*%?$/.test(row[at] ?? '')));
  const line = (cells: readonly string[]): string =>
    cells
      .map((cell, at) => (right[at] ? cell.padStart(widths[at]!) : cell.padEnd(widths[at]!)))
      .join('  ')
      .trimEnd();
  return [line(header), line(widths.map((width) => '-'.repeat(width))), ...rows.map(line)];
}
