import { z } from 'zod';
import { onAxis, vertexOn } from './axis';
import { nothingJudged, opposite } from './combine';
import type { CutKind } from './contract';
import { judgeInside } from './inside';
import { outlineOf } from './outline';

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
export const lasso: CutKind<Parameters, 'lasso'> = {
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
    const [across, up] = [onAxis(x, p.xLog), onAxis(y, p.yLog)];
    const points = { x: across.values, y: up.values, sigmaX: across.sigma, sigmaY: up.sigma, margin };
    const outline = outlineOf(p.polygon.map(([vx, vy]) => [vertexOn(vx, p.xLog), vertexOn(vy, p.yLog)]));
    const within = judgeInside(outline, points);
    return [p.action === 'keep' ? within : opposite(within)];
  },
  passing: () => 'every',
  describe: (p) =>
    `${p.action === 'drop' ? 'drop' : 'keep only'} objects inside a drawn shape of ${p.polygon.length} vertices in ` +
    `${p.x} and ${p.y}`,
  limits: () => [],
  limitColumn: () => undefined,
};
