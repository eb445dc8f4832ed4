/** Cells of one line of comma-separated text; undefined when a quote is left open, as in a row over several lines. */
export function splitCsvLine(line: string): string[] | undefined {
  const cells: string[] = [];
  let at = 0;
  for (;;) {
    let cell = '';
    if (line[at] === '"') {
      for (at++; ; at++) {
        if (at >= line.length) return undefined;
        if (line[at] !== '"') cell += line[at]!;
        else if (line[at + 1] === '"') cell += line[at++]!;
        else break;
      }
      at++;
    } else {
      const end = line.indexOf(',', at);
      cell = line.slice(at, end < 0 ? line.length : end);
      at += cell.length;
    }
    cells.push(cell);
    if (line[at] !== ',') return cells;
    at++;
  }
}
