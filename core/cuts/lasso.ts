import { z } from 'zod';
import { Bitset } from '../table/bitset';
import type { QuantityColumn } from '../quantities/quantity';
import { nothingJudged, opposite } from './combine';
import type { CutKind, Judged, Outcome } from './contract';
import { edgesOf, inside, outlineDistance, type Polygon } from './polygon';

const parameters = z.strictObject({
  x: z.string().min(1).describe('Quantity id on the horizontal axis'),
  y: z.string().min(1).describe('Quantity id on the vertical axis'),
  xLog: z.boolean().describe('Whether the edges are straight in log10 of x'),
  yLog: z.boolean().describe('Whether the edges are straight in log10 of y'),
  polygon: z
    .array(z.tuple([z.number(), z.number()]))
    .min(3)
    .describe('Vertices in data coordinates'),
  action: z.enum(['keep', 'drop']).describe('What becomes of the objects inside'),
});
type Parameters = z.infer<typeof parameters>;

/** Keeps or drops what lies inside a shape drawn on a plate. */
export const lasso: CutKind<Parameters> = {
  kind: 'lasso',
  label: 'Lasso',
  purpose: 'Keeps or drops what lies inside a shape that was drawn on a plate.',
  caution: 'A shape drawn by eye follows the noise of this sample; say what it follows in nature, or use a limit.',
  parameters,
  defaults: {
    x: 'gal_l',
    y: 'gal_b',
    xLog: false,
    yLog: false,
    polygon: [
      [0, -10],
      [360, -10],
      [360, 10],
      [0, 10],
    ],
    action: 'drop',
  },
  proposals: [],
  needs: (p) => [p.x, p.y],
  judge(p, objects, margin) {
    const [x, y] = [objects.column(p.x), objects.column(p.y)];
    if (x === undefined || y === undefined) return [nothingJudged(objects.rows)];
    const within = judgeInside(p, objects, x, y, margin);
    return [p.action === 'keep' ? within : opposite(within)];
  },
  passing: () => 'every',
  describe: (p) =>
    `${p.action === 'drop' ? 'drop' : 'keep only'} objects inside a drawn shape of ${p.polygon.length} vertices in ` +
    `${p.x} and ${p.y}`,
  limits: () => [],
  limitColumn: () => undefined,
};

function judgeInside(p: Parameters, objects: Judged, x: QuantityColumn, y: QuantityColumn, margin: number): Outcome {
  const [horizontal, vertical] = [axis(p.xLog), axis(p.yLog)];
  const polygon: Polygon = p.polygon.map(([vx, vy]) => [horizontal.place(vx), vertical.place(vy)]);
  const edges = edgesOf(polygon);
  const rows = objects.rows;
  const [surely, passes, possibly, unjudged] = [new Bitset(rows), new Bitset(rows), new Bitset(rows), new Bitset(rows)];
  for (let row = 0; row < rows; row++) {
    const [px, py] = [horizontal.place(x.values[row]!), vertical.place(y.values[row]!)];
    if (Number.isNaN(px) || Number.isNaN(py)) {
      unjudged.add(row);
      continue;
    }
    const within = inside(edges, px, py);
    const sx = horizontal.spread(x.values[row]!, x.sigma?.[row] ?? 0);
    const sy = vertical.spread(y.values[row]!, y.sigma?.[row] ?? 0);
    const near = margin > 0 && (sx > 0 || sy > 0) && outlineDistance(edges, px, py, sx, sy) < margin;
    if (within) passes.add(row);
    if (within && !near) surely.add(row);
    if (within || near) possibly.add(row);
  }
  return { surely, passes, possibly, unjudged };
}

/** How values and errors lie on an axis; what is not positive has no place on a logarithmic one. */
function axis(log: boolean): { place(value: number): number; spread(value: number, sigma: number): number } {
  if (!log) return { place: (value) => value, spread: (_, sigma) => sigma };
  return {
    place: (value) => (value > 0 ? Math.log10(value) : Number.NaN),
    spread: (value, sigma) => sigma / (value * Math.LN10),
  };
}
