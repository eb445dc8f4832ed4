import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { solarFrame } from '../../../core/frame/solarframes';
import { deriveQuantities } from '../../../core/quantities/derive';
import type { QuantitySet } from '../../../core/quantities/quantity';
import { DERIVED } from '../../../core/quantities/registry';
import { measuredTable } from './measuredtable';

const INPUTS = ['ra', 'dec', 'distance', 'pm_ra', 'pm_dec', 'v_los'] as const;
type Six = readonly [number, number, number, number, number, number];
const ANGLES = new Set(['gal_l', 'pole_l']);
const OPTIONS = { frame: solarFrame('G18')!, rv: 3.1, recalibration: 1 };
const TESTED = DERIVED.map(({ id }) => id).filter((id) => id !== 'a_v');

function derive(rows: readonly Six[], sigma?: Six, correlation?: number): QuantitySet {
  const columns = INPUTS.map((id, at) => {
    const values = rows.map((row) => row[at]!);
    return [id, sigma === undefined ? values : [values, rows.map(() => sigma[at]!)]] as const;
  });
  const known = correlation === undefined ? {} : { pm_correlation: rows.map(() => correlation) };
  return deriveQuantities(measuredTable({ ...Object.fromEntries(columns), ...known }), OPTIONS);
}

/** 1σ errors from central differences of the values alone: no code in common with the gradients. */
function numericalSigma(seen: Six, sigma: Six, correlation: number, id: string): number {
  // Errors in right ascension are angles on the sky.
  const cosDec = Math.cos((seen[1] * Math.PI) / 180);
  const steps = sigma.map((error, at) => (at === 0 ? error / cosDec : error) * 1e-4);
  const at = (input: number, sign: number): Six =>
    seen.with(input, seen[input]! + sign * steps[input]!) as unknown as Six;
  const shifted = derive(INPUTS.flatMap((_, input) => [at(input, 1), at(input, -1)])).column(id)!.values;
  const parts = INPUTS.map((_, input) => {
    const step = shifted[2 * input]! - shifted[2 * input + 1]!;
    return (ANGLES.has(id) ? ((step + 540) % 360) - 180 : step) / 2e-4;
  });
  return Math.sqrt(parts.reduce((sum, part) => sum + part * part, 0) + 2 * correlation * parts[3]! * parts[4]!);
}

const tracer = fc.tuple(
  fc.double({ min: 0, max: 360, noNaN: true }),
  fc.double({ min: -80, max: 80, noNaN: true }),
  fc.double({ min: 1, max: 100, noNaN: true }),
  fc.double({ min: -6, max: 6, noNaN: true }),
  fc.double({ min: -6, max: 6, noNaN: true }),
  fc.double({ min: -300, max: 300, noNaN: true }),
);
const SIGMA: Six = [1e-4, 2e-4, 0.3, 0.03, 0.05, 2];

describe('propagated errors', () => {
  test.each(TESTED)('%s: equal to what differences of the values give', (id) => {
    fc.assert(
      fc.property(tracer, fc.double({ min: -0.9, max: 0.9, noNaN: true }), (seen, correlation) => {
        const own = derive([seen], SIGMA, correlation);
        // Near the axis or the centre and for nearly radial or polar orbits a step of 1e-4 σ is no longer small.
        fc.pre(own.column('cyl_r')!.values[0]! > 0.5 && Math.abs(own.column('pole_b')!.values[0]!) < 85);
        fc.pre(own.column('v_t')!.values[0]! > 5 && Math.abs(own.column('gal_b')!.values[0]!) < 85);
        const linear = own.column(id)!.sigma![0]!;
        // The galactic coordinates hang on the position alone; their σ of 1e-4° leaves differences of rounding.
        const precision = id.startsWith('gal') ? 1e-4 : 1e-5;
        expect(linear / numericalSigma(seen, SIGMA, correlation, id)).toBeCloseTo(1, -Math.log10(2 * precision));
      }),
      { numRuns: 40 },
    );
  });

  test('an error that is missing takes away what hangs on it and nothing else', () => {
    const set = derive([[10, 20, 30, 1, 1, 100]], [1e-4, 1e-4, 1, Number.NaN, 0.1, 2]);
    expect(set.column('x')!.sigma![0]).toBeGreaterThan(0);
    expect(set.column('r')!.sigma![0]).toBeGreaterThan(0);
    expect(set.column('gal_l')!.sigma![0]).toBeGreaterThan(0);
    for (const id of ['v_x', 'v_phi', 'l_z', 'pole_b', 'toomre_speed']) expect(set.column(id)!.sigma![0]).toBeNaN();
    expect(set.column('v_phi')!.values[0]).not.toBeNaN();
  });

  test('a missing position error counts as none, a missing distance error does not', () => {
    const bare = derive([[10, 20, 30, 1, 1, 100]], [Number.NaN, Number.NaN, 1, 0.1, 0.1, 2]);
    expect(bare.column('x')!.sigma![0]).toBeGreaterThan(0);
    const far = measuredTable({
      ra: [
        [10, 10],
        [0, 0],
      ],
      dec: [
        [20, 20],
        [0, 0],
      ],
      distance: [
        [30, 30],
        [1, Number.NaN],
      ],
    });
    const set = deriveQuantities(far, OPTIONS);
    expect(set.column('x')!.sigma![0]).toBeGreaterThan(0);
    expect(set.column('x')!.sigma![1]).toBeNaN();
  });

  test('values that are missing stay missing, and the rest is there', () => {
    const set = derive([[10, 20, 30, 1, 1, Number.NaN]]);
    expect(set.column('r')!.values[0]).toBeGreaterThan(0);
    for (const id of ['v_x', 'v_phi', 'speed', 'l_tot', 'pole_l', 'pole_b'])
      expect(set.column(id)!.values[0]).toBeNaN();
  });
});
