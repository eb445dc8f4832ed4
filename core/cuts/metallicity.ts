import { z } from 'zod';
import type { CutKind, Limit } from './contract';
import { judgeLimit, limitOf, limitText } from './limits';

const parameters = z.strictObject({
  min: z.number().nullable().describe('Least [Fe/H] kept; null for no limit'),
  max: z.number().nullable().describe('Greatest [Fe/H] kept; null for no limit'),
});
type Parameters = z.infer<typeof parameters>;

const FEH = { label: '[Fe/H]', quantity: 'feh', unit: '' } as const;

function limits({ min, max }: Parameters): Limit[] {
  return [...limitOf('max', max, { ...FEH, keeps: 'below' }), ...limitOf('min', min, { ...FEH, keeps: 'above' })];
}

/** Keeps metal-poor objects. */
export const metallicity: CutKind<Parameters, 'metallicity'> = {
  kind: 'metallicity',
  label: 'Metallicity',
  purpose: 'Against metal-rich objects of the disc and bulge.',
  caution:
    'Removes metal-rich halo objects too, and metallicity changes with radius: the density profile and the kinematics ' +
    'of what is left are changed. Values on different [Fe/H] scales are not comparable at the limit.',
  parameters,
  defaults: { min: null, max: -1 },
  proposals: [
    {
      parameter: 'max',
      value: -0.8,
      reason: 'metal-rich clusters behave as a disc system with a scale height of about 0.5 kpc',
      source: '1985ApJ...293..424Z',
    },
    {
      parameter: 'max',
      value: -1,
      reason: 'gap between the peaks at −1.60 and −0.60; the metal-rich group rotates at 165 ± 28 km/s',
      source: 'Borkova & Marsakov 2000, Astron. Rep. 44, 665',
    },
    { parameter: 'max', value: -1.3, reason: 'halo K giants', source: '2019AJ....157..104B' },
  ],
  needs: (p) => (limits(p).length === 0 ? [] : ['feh']),
  judge: (p, objects, margin) => limits(p).map((limit) => judgeLimit(limit, objects, margin)),
  passing: () => 'every',
  describe: (p) => limits(p).map(limitText).join(' and ') || 'no limit on [Fe/H]',
  limits,
  limitColumn: (limit, _, objects) => objects.column(limit.quantity),
};
