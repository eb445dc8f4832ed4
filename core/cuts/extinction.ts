import { z } from 'zod';
import type { CutKind, Limit } from './contract';
import { judgeLimit, limitOf, limitText } from './limits';

const parameters = z.strictObject({
  ebvMax: z.number().nullable().describe('Greatest E(B-V) kept, mag; null for no limit'),
  avMax: z.number().nullable().describe('Greatest A_V kept, mag, through the R_V of the recipe; null for no limit'),
  absBMin: z.number().min(0).max(90).nullable().describe('Least |b| kept, degrees; null for no limit'),
});
type Parameters = z.infer<typeof parameters>;

function limits({ ebvMax, avMax, absBMin }: Parameters): Limit[] {
  return [
    ...limitOf('ebvMax', ebvMax, { label: 'E(B−V)', quantity: 'ebv', keeps: 'below', unit: 'mag' }),
    ...limitOf('avMax', avMax, { label: 'A_V', quantity: 'a_v', keeps: 'below', unit: 'mag' }),
    ...limitOf('absBMin', absBMin, { label: 'b', quantity: 'gal_b', keeps: 'above', absolute: true, unit: 'deg' }),
  ];
}

const CUSTOM = 'common practice, no source';

/** Keeps objects that are little reddened and far from the Galactic plane on the sky. */
export const extinction: CutKind<Parameters, 'extinction'> = {
  kind: 'extinction',
  label: 'Extinction',
  purpose: 'Against distances that dust has spoilt, crowding, and fields where the catalogue is incomplete.',
  caution:
    'A limit on dust or |b| takes away a part of the sky, mostly towards the inner Galaxy: it has to enter the ' +
    'selection function. State whether the E(B−V) column is already recalibrated.',
  parameters,
  defaults: { ebvMax: 0.3, avMax: null, absBMin: null },
  proposals: [
    { parameter: 'ebvMax', value: 0.2, reason: 'dust errors of the distance stay small', source: CUSTOM },
    { parameter: 'ebvMax', value: 0.3, reason: 'dust errors of the distance stay small', source: CUSTOM },
    { parameter: 'absBMin', value: 10, reason: 'crowding and incompleteness at low latitude', source: CUSTOM },
    { parameter: 'absBMin', value: 20, reason: 'crowding and incompleteness at low latitude', source: CUSTOM },
  ],
  needs: (p) => limits(p).map((limit) => limit.quantity),
  judge: (p, objects, margin) => limits(p).map((limit) => judgeLimit(limit, objects, margin)),
  passing: () => 'every',
  describe: (p) => limits(p).map(limitText).join(' and ') || 'no limit on dust or latitude',
  limits,
  limitColumn: (limit, _, objects) => objects.column(limit.quantity),
};
