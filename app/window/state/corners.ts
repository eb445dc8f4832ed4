/** Corners as lines of text, one a line: "x, y". */
export function cornersText(polygon: readonly (readonly [number, number])[]): string {
  return polygon.map(([x, y]) => `${Number(x.toPrecision(6))}, ${Number(y.toPrecision(6))}`).join('\n');
}

/** The corners in a text, one a line with a comma or blanks between; undefined for fewer than three or for no numbers. */
export function cornersIn(text: string): [number, number][] | undefined {
  const lines = text.split('\n').filter((line) => line.trim() !== '');
  const corners = lines.map((line) =>
    line
      .trim()
      .split(/[\s,;]+/)
      .map((part) => Number(part.replace('−', '-'))),
  );
  const whole = corners.length >= 3 && corners.every((pair) => pair.length === 2 && pair.every(Number.isFinite));
  return whole ? (corners as [number, number][]) : undefined;
}
