import { z } from 'zod';
import type { CutKind, Limit } from './contract';
import { judgeLimit, limitOf, limitText } from './limits';

const parameters = z.strictObject({
  quantity: z.string().min(1).describe('Id of the quantity'),
  min: z.number().nullable().describe('Least value kept; null for no limit'),
  max: z.number().nullable().describe('Greatest value kept; null for no limit'),
  absolute: z.boolean().describe('Whether the limits are on the absolute value'),
});
type Parameters = z.infer<typeof parameters>;

function limits({ quantity, min, max, absolute }: Parameters): Limit[] {
  const about = { label: quantity, quantity, absolute, unit: '' };
  return [...limitOf('min', min, { ...about, keeps: 'above' }), ...limitOf('max', max, { ...about, keeps: 'below' })];
}

/** Keeps a range of any quantity, limits included. */
export const range: CutKind<Parameters, 'range'> = {
  kind: 'range',
  label: 'Range',
  purpose: 'Keeps a range of one quantity: distance, quality, radius, or whatever the job asks for.',
  caution: 'A limit on distance or on an error is a limit on brightness and radius too, and has to enter the model.',
  parameters,
  defaults: { quantity: 'r', min: null, max: null, absolute: false },
  proposals: [],
  needs: (p) => [p.quantity],
  judge: (p, objects, margin) => limits(p).map((limit) => judgeLimit(limit, objects, margin)),
  passing: () => 'every',
  describe: (p) => limits(p).map(limitText).join(' and ') || `no limit on ${p.quantity}`,
  limits,
  limitColumn: (limit, _, objects) => objects.column(limit.quantity),
};
