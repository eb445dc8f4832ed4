import { z } from 'zod';
import { nothingJudged, opposite } from './combine';
import type { CutKind, Judged, Limit } from './contract';
import { plain } from './limits';
import { planeAngle } from './planeangle';
import { PLANE_PRESETS } from './planepresets';
import { judgeThreshold } from './threshold';

const parameters = z.strictObject({
  preset: z
    .string()
    .nullable()
    .describe('Id of the published plane that the pole was taken from; null for a pole of your own'),
  poleL: z.number().min(0).max(360).describe('Galactic longitude of the reference pole, degrees'),
  poleB: z.number().min(-90).max(90).describe('Galactic latitude of the reference pole, degrees'),
  measure: z
    .enum(['orbital-pole', 'position'])
    .describe('Angle of the orbital pole from the reference pole, or angular distance of the position from the plane'),
  sense: z.enum(['with', 'either']).describe("'with': orbits in the sense of the pole only; 'either': both senses"),
  angleMax: z.number().min(0).max(180).describe('Objects within this angle belong to the plane, degrees'),
  action: z.enum(['keep', 'drop']).describe('What becomes of the objects that belong to the plane'),
});
type Parameters = z.infer<typeof parameters>;

function columnOf(p: Parameters, objects: Judged): ReturnType<typeof planeAngle> {
  const key = `${p.poleL} ${p.poleB} ${p.measure} ${p.sense}`;
  return objects.memo('angles from planes', key, () => planeAngle(p, objects));
}

function measureText(p: Parameters): string {
  return p.measure === 'position' ? 'distance from the plane' : 'angle of the orbital pole';
}

function describe(p: Parameters): string {
  const preset = PLANE_PRESETS.find((candidate) => candidate.id === p.preset);
  const name = preset ? `${preset.label}, ` : '';
  const verb = p.action === 'drop' ? 'drop' : 'keep only';
  const sense = p.measure === 'orbital-pole' && p.sense === 'either' ? ', either sense' : '';
  const pole = `${name}pole (l, b) = (${plain(p.poleL)}°, ${plain(p.poleB)}°)`;
  return `${verb} objects with ${measureText(p)} ≤ ${plain(p.angleMax)}° (${pole}${sense})`;
}

/** Drops, or keeps alone, the objects of one orbital plane. */
export const plane: CutKind<Parameters, 'plane'> = {
  kind: 'plane',
  label: 'Orbit plane',
  purpose: 'Against the members of one coherent stream or plane, which are not independent tracers.',
  caution:
    'Objects of the smooth halo share the plane by chance: about 1 − cos(angle) of isotropic poles (either sense) fall ' +
    'inside. The pole is that of r × v, right-handed; published planes differ in sign, so check the convention.',
  parameters,
  defaults: {
    preset: 'sagittarius-stream',
    poleL: 273.75,
    poleB: -13.46,
    measure: 'orbital-pole',
    sense: 'with',
    angleMax: 20,
    action: 'drop',
  },
  proposals: [],
  needs: (p) => (p.measure === 'position' ? ['x', 'y', 'z'] : ['x', 'y', 'z', 'v_x', 'v_y', 'v_z']),
  judge(p, objects, margin) {
    const column = columnOf(p, objects);
    if (column === undefined) return [nothingJudged(objects.rows)];
    const inside = judgeThreshold(column, { limit: p.angleMax, keeps: 'below', absolute: false }, margin);
    return [p.action === 'keep' ? inside : opposite(inside)];
  },
  passing: () => 'every',
  describe,
  limits: (p): Limit[] => [
    {
      parameter: 'angleMax',
      label: measureText(p),
      quantity: 'plane-angle',
      absolute: false,
      keeps: p.action === 'keep' ? 'below' : 'above',
      value: p.angleMax,
      unit: 'deg',
    },
  ],
  limitColumn: (_, p, objects) => columnOf(p, objects),
};
