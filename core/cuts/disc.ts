import { z } from 'zod';
import type { CutKind, Limit } from './contract';
import { judgeLimit, limitOf, limitText } from './limits';

const off = 'null switches the test off';
const parameters = z.strictObject({
  combine: z
    .enum(['any', 'all'])
    .describe(
      "'any': one disc-like test drops the object; 'all': only objects that every test calls disc-like are dropped",
    ),
  absZMin: z.number().min(0).nullable().describe(`Disc-like below this |z|, kpc; ${off}`),
  cylRMin: z.number().min(0).nullable().describe(`Disc-like within this cylindrical radius, kpc; ${off}`),
  vPhiMax: z.number().nullable().describe(`Disc-like above this prograde v_phi, km/s; ${off}`),
  toomreMin: z
    .number()
    .min(0)
    .nullable()
    .describe(`Disc-like below this speed relative to a circular orbit, km/s; ${off}`),
});
type Parameters = z.infer<typeof parameters>;

function limits(p: Parameters): Limit[] {
  return [
    ...limitOf('absZMin', p.absZMin, { label: 'z', quantity: 'z', keeps: 'above', absolute: true, unit: 'kpc' }),
    ...limitOf('cylRMin', p.cylRMin, { label: 'R', quantity: 'cyl_r', keeps: 'above', unit: 'kpc' }),
    ...limitOf('vPhiMax', p.vPhiMax, { label: 'v_φ', quantity: 'v_phi', keeps: 'below', unit: 'km/s' }),
    ...limitOf('toomreMin', p.toomreMin, {
      label: 'Toomre speed',
      quantity: 'toomre_speed',
      keeps: 'above',
      unit: 'km/s',
    }),
  ];
}

/** Drops objects that stand or move as the disc does. */
export const disc: CutKind<Parameters, 'disc'> = {
  kind: 'disc',
  label: 'Disc contamination',
  purpose: 'Against objects of the thin and thick disc.',
  caution:
    'These are values of the present moment: a halo object that crosses the plane looks like the disc in |z|, and a ' +
    'prograde one in v_φ; thick-disc objects stand beyond any |z| limit in use. Each limit leaves a mark on the ' +
    'velocity distribution that a mass model will see.',
  parameters,
  defaults: { combine: 'all', absZMin: 4, cylRMin: null, vPhiMax: null, toomreMin: 210 },
  proposals: [
    {
      parameter: 'absZMin',
      value: 4,
      reason: 'halo horizontal-branch stars out to 60 kpc (why this height: from memory)',
      source: 'arXiv:0801.1232',
    },
    {
      parameter: 'absZMin',
      value: 5,
      reason: 'even so about 19 % are thick-disc-like at 5 < |z| ≤ 15 kpc and [Fe/H] near −0.6',
      source: 'arXiv:1806.10315',
    },
    {
      parameter: 'toomreMin',
      value: 210,
      reason: 'kinematic halo near the Sun; keeps a slow tail of the disc',
      source: '2018ApJ...860L..11K',
    },
  ],
  needs: (p) => limits(p).map((limit) => limit.quantity),
  judge: (p, objects, margin) => limits(p).map((limit) => judgeLimit(limit, objects, margin)),
  passing: (p) => (p.combine === 'any' ? 'every' : 'any'),
  describe: (p) =>
    limits(p)
      .map(limitText)
      .join(p.combine === 'any' ? ' and ' : ' or ') || 'no disc test switched on',
  limits,
  limitColumn: (limit, _, objects) => objects.column(limit.quantity),
};
