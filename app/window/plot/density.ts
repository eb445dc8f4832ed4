import type { Density } from '../../contract/messages';

/** Counts as a heat map in log10, the sample over everything: paper to ink, so that dense is dark (or light at night). */
export function densityTrace(density: Density, dark: boolean): object {
  const { columns, rows, all, sample, x, y } = density;
  const row = (line: number): (number | null)[] =>
    Array.from({ length: columns }, (_, column) => {
      const cell = line * columns + column;
      // The sample counts fully, what was dropped at a tenth, so that the kept stand out.
      const weight = sample[cell]! + 0.1 * (all[cell]! - sample[cell]!);
      return all[cell] === 0 ? null : Math.log10(1 + 10 * weight);
    });
  return {
    type: 'heatmap',
    x0: x[0] + (x[1] - x[0]) / columns / 2,
    dx: (x[1] - x[0]) / columns,
    y0: y[0] + (y[1] - y[0]) / rows / 2,
    dy: (y[1] - y[0]) / rows,
    z: Array.from({ length: rows }, (_, line) => row(line)),
    colorscale: dark
      ? [
          [0, '#3a3833'],
          [1, '#f3ecdc'],
        ]
      : [
          [0, '#dcd4c2'],
          [1, '#1d1b17'],
        ],
    showscale: false,
    hoverinfo: 'skip',
  };
}
