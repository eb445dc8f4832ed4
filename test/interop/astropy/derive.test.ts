// Debian's python3-astropy (whatever version is installed) beside our own derivation, 1,000 random rows a frame.
import { execFileSync, spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { SOLAR_FRAMES } from '../../../core/frame/solarframes';
import { separationDeg } from '../../../core/frame/sphere';
import { dice } from '../../../core/mock/dice';
import { deriveQuantities } from '../../../core/quantities/derive';
import { measuredTable } from '../../core/quantities/measuredtable';

const PYTHON = '/usr/bin/python3';
const hasAstropy = spawnSync(PYTHON, ['-c', 'import astropy']).status === 0;
const ROWS = 1000;

interface Answer {
  readonly position: number[][];
  readonly velocity: number[][];
  readonly momentum: number[][];
  readonly v_r: number[];
  readonly v_phi: number[];
  readonly gal_l: number[];
  readonly gal_b: number[];
}

/** Random rows over the whole sky: degrees, kpc, mas/yr, km/s. */
function randomRows(seed: number): number[][] {
  const d = dice(seed);
  const rows = Array.from({ length: ROWS }, () => [
    360 * d.uniform(),
    (Math.asin(2 * d.uniform() - 1) * 180) / Math.PI,
    10 ** (2.4 * d.uniform() - 0.3),
    4 * d.normal(),
    4 * d.normal(),
    200 * d.normal(),
  ]);
  return [0, 1, 2, 3, 4, 5].map((axis) => rows.map((row) => row[axis]!));
}

describe.skipIf(!hasAstropy)('astropy', () => {
  it.each(SOLAR_FRAMES)('agrees with what derive computes in $id', (frame) => {
    const seen = randomRows(frame.id.length + Math.round(1000 * frame.r0Kpc));
    const task = { seen, r0: frame.r0Kpc, zsun: frame.zSunPc, vsun: frame.velocityKmS };
    const out = execFileSync(PYTHON, [join(import.meta.dirname, 'derive.py')], {
      input: JSON.stringify(task),
      maxBuffer: 1 << 26,
    });
    const theirs = JSON.parse(out.toString()) as Answer;
    const [ra, dec, distance, pmRa, pmDec, vLos] = seen as [number[], number[], number[], number[], number[], number[]];
    const ours = deriveQuantities(measuredTable({ ra, dec, distance, pm_ra: pmRa, pm_dec: pmDec, v_los: vLos }), {
      frame,
      rv: 3.1,
      recalibration: 1,
    });
    const value = (id: string, row: number): number => ours.column(id)!.values[row]!;
    /** Largest length of the difference of two vectors, relative to the vector: a component may cross zero. */
    const vectorOff = (ids: readonly string[], signs: readonly number[], expected: number[][]): number =>
      Math.max(
        ...Array.from({ length: ROWS }, (_, row) => {
          const vector = expected.map((axis) => axis[row]!);
          const difference = ids.map((id, axis) => signs[axis]! * value(id, row) - vector[axis]!);
          return Math.hypot(...difference) / Math.hypot(...vector);
        }),
      );
    expect(vectorOff(['x', 'y', 'z'], [1, 1, 1], theirs.position)).toBeLessThan(1e-9);
    expect(vectorOff(['v_x', 'v_y', 'v_z'], [1, 1, 1], theirs.velocity)).toBeLessThan(1e-9);
    expect(vectorOff(['l_x', 'l_y', 'l_z'], [1, 1, -1], theirs.momentum)).toBeLessThan(1e-9);
    const speed = (row: number): number => value('speed', row);
    const off = (id: 'v_r' | 'v_phi'): number =>
      Math.max(...theirs[id].map((expected, row) => Math.abs(value(id, row) - expected) / speed(row)));
    expect(off('v_r')).toBeLessThan(1e-9);
    expect(off('v_phi')).toBeLessThan(1e-9);
    const apart = theirs.gal_l.map((l, row) =>
      separationDeg(l, theirs.gal_b[row]!, value('gal_l', row), value('gal_b', row)),
    );
    // astropy goes to Galactic through FK5, which differs from the definition by up to 0.02 arcsec.
    expect(Math.max(...apart)).toBeLessThan(0.05 / 3600);
  });
});
