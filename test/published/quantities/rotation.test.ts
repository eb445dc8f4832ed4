// Circular speeds of two published models at 8 and 20 kpc: 2015ApJS..216...29B (Table 1) and 2013A&A...549A.137I (Model I),
// recomputed from their formulas.
import { expect, test } from 'vitest';
import type { Phase } from '../../../core/frame/phase';
import { SOLAR_FRAMES } from '../../../core/frame/solarframes';
import { momentaOf } from '../../../core/quantities/momenta';
import { motionsOf } from '../../../core/quantities/motions';
import { placesOf } from '../../../core/quantities/places';

const MODELS = [
  { source: '2015ApJS..216...29B', at8: 220.0, at20: 197.611 },
  { source: '2013A&A...549A.137I', at8: 242.474, at20: 224.772 },
] as const;

/** A circular orbit of the disc, prograde, on the Sun's side. */
function circular(radius: number, speed: number, lsrSpeedKmS: number): Phase {
  const one = (value: number): Float64Array => Float64Array.of(value);
  return { rows: 1, x: one(-radius), y: one(0), z: one(0), vX: one(0), vY: one(speed), vZ: one(0), lsrSpeedKmS };
}

// Common practice, no source: the rotation curve is flat, v_c at 20 kpc within 15 % of v_c at 8 kpc. The Toomre speed
// takes it as flat, so that the disc must stay slow against the limits in use (180 km/s and more) at any radius.
test.each(MODELS)('a circular orbit of $source at 20 kpc is as slow as a flat curve makes it', ({ at8, at20 }) => {
  for (const { id, lsrSpeedKmS } of SOLAR_FRAMES) {
    const toomreAt = (radius: number, speed: number): number => {
      const phase = circular(radius, (speed / at8) * lsrSpeedKmS, lsrSpeedKmS);
      return motionsOf(phase, placesOf(phase), momentaOf(phase)).toomreSpeed[0]!;
    };
    expect(toomreAt(8, at8), id).toBeCloseTo(0, 10);
    expect(toomreAt(20, at20), id).toBeLessThan(0.15 * lsrSpeedKmS);
  }
});
