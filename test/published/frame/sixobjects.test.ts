import { describe, expect, it } from 'vitest';
import { separationDeg } from '../../../core/frame/sphere';
import { solarFrame } from '../../../core/frame/solarframes';
import { deriveQuantities } from '../../../core/quantities/derive';
import { measuredTable } from '../../core/quantities/measuredtable';
import { SIX_OBJECTS } from './sixobjects';

const seen = (axis: number): number[] => SIX_OBJECTS.map((object) => object.seen[axis]!);
const quantities = deriveQuantities(
  measuredTable({ ra: seen(0), dec: seen(1), distance: seen(2), pm_ra: seen(3), pm_dec: seen(4), v_los: seen(5) }),
  { frame: solarFrame('G18')!, rv: 3.1, recalibration: 1 },
);
const value = (id: string, row: number): number => quantities.column(id)!.values[row]!;

describe.each(SIX_OBJECTS.map((object, row) => ({ ...object, row })))('$name', (object) => {
  const { row } = object;
  // The table is rounded to 5 digits in kpc and 3 in km/s (LMC: 3 and 2): half a unit of the last digit.
  const [kpc, kms] = object.name === 'LMC' ? [5.1e-4, 5.1e-3] : [5.1e-6, 5.1e-4];

  it('stands where published', () => {
    const off = ['x', 'y', 'z'].map((id, axis) => Math.abs(value(id, row) - object.position[axis]!));
    expect(Math.max(...off)).toBeLessThan(kpc);
  });

  it('moves as published', () => {
    const off = ['v_x', 'v_y', 'v_z'].map((id, axis) => Math.abs(value(id, row) - object.velocity[axis]!));
    expect(Math.max(...off)).toBeLessThan(kms);
  });

  it('has the published radius, radial and rotation velocity, prograde positive', () => {
    if (object.r !== undefined) expect(Math.abs(value('r', row) - object.r)).toBeLessThan(kpc);
    if (object.vR !== undefined) expect(Math.abs(value('v_r', row) - object.vR)).toBeLessThan(kms);
    if (object.vPhiRightHanded !== undefined) {
      expect(Math.abs(value('v_phi', row) + object.vPhiRightHanded)).toBeLessThan(kms);
    }
  });

  it('has the published orbital pole', () => {
    // Poles are given to 0.001° (LMC 0.01°).
    const off = separationDeg(value('pole_l', row), value('pole_b', row), ...object.pole);
    expect(off).toBeLessThan(object.name === 'LMC' ? 7.1e-3 : 7.1e-4);
  });
});

it('gives the Large Magellanic Cloud its published speed', () => {
  expect(Math.abs(value('speed', 5) - 320.09)).toBeLessThan(5.1e-3);
});
