// Factors from the definitions: au = 149 597 870.7 km (IAU 2012 B2), pc = 648000/π au (IAU 2015 B2), light-year =
// 9 460 730 472 580.8 km (IAU), Julian year = 365.25 d, hour of angle = 15°.
import { describe, expect, it } from 'vitest';
import type { Dimension } from '../../../core/table/dimension';
import { COMMON_UNITS, SEXAGESIMAL, unitFactor } from '../../../core/table/units';

const PC_KM = (149_597_870.7 * 648_000) / Math.PI;
const LY_KPC = 9_460_730_472_580.8 / PC_KM / 1000;

describe('spellings that tables hold', () => {
  it.each<[Dimension, number, string[]]>([
    ['angle', 1, ['deg', 'degree', 'degrees', '°', '[deg]', ' deg ', 'Deg']],
    ['angle', 15, ['hourangle']],
    ['angle', 180 / Math.PI, ['rad', 'radian']],
    ['angle', 1 / 60, ['arcmin']],
    ['angle', 1 / 3600, ['arcsec']],
    ['angle', 1 / 3.6e6, ['mas']],
    ['angle', 1 / 3.6e9, ['uas', 'µas']],
    ['parallax', 1, ['mas', '[mas]']],
    ['parallax', 1000, ['arcsec']],
    ['parallax', 1e-3, ['uas', 'µas']],
    ['length', 1, ['kpc', '[kpc]', 'KPC']],
    ['length', 1e-3, ['pc']],
    ['length', 1e3, ['Mpc']],
    ['length', LY_KPC, ['ly']],
    ['length', 1000 * LY_KPC, ['kly']],
    ['length', 149_597_870.7 / PC_KM / 1000, ['au', 'AU']],
    [
      'proper motion',
      1,
      ['mas/yr', 'mas.yr**-1', 'mas yr-1', 'mas yr^-1', 'mas / yr', 'mas*yr^(-1)', 'mas/a', '[mas/yr]'],
    ],
    ['proper motion', 1e3, ['arcsec/yr']],
    ['proper motion', 1e-3, ['uas/yr']],
    ['proper motion', 10, ['arcsec/century', 'arcsec/cy']],
    ['velocity', 1, ['km/s', 'km s^-1', 'km s-1', 'km.s**-1', 'km / s', '[km/s]']],
    ['velocity', 1e-3, ['m/s', 'm s-1']],
    ['velocity', (1e6 * PC_KM) / 1e6 / (365.25 * 86_400), ['pc/yr']],
    ['magnitude', 1, ['mag', '[mag]', '', '-', '---']],
    ['dex', 1, ['dex', '', '-', '[-]']],
    ['number', 1, ['', '-', '[-]', 'none', '1']],
  ])('%s in units of %d: %j', (dimension, factor, texts) => {
    for (const text of texts) expect(unitFactor(text, dimension)! / factor, text).toBeCloseTo(1, 12);
  });

  it('another spelling of the canonical unit leaves numbers as they are, to the last bit', () => {
    for (const text of ['mas.yr**-1', 'arcsec/century/10', 'mas yr-1']) {
      const factor = unitFactor(text, 'proper motion');
      if (factor !== undefined) expect([1, 10], text).toContain(factor);
    }
    expect(unitFactor('km s^-1', 'velocity')).toBe(1);
  });
});

describe('what cannot be', () => {
  it.each<[string, Dimension]>([
    ['furlong', 'length'],
    ['km/s', 'length'],
    ['kpc', 'velocity'],
    ['mas', 'proper motion'],
    ['deg/', 'angle'],
    ['mag', 'length'],
    ['km//s', 'velocity'],
    ['km/s^', 'velocity'],
    ['', 'length'],
    ['dex', 'angle'],
    ['log(kpc)', 'length'],
  ])('"%s" is no %s', (text, dimension) => {
    expect(unitFactor(text, dimension)).toBeUndefined();
  });
});

it('every unit that a window offers is understood, and the first is the canonical one', () => {
  for (const [dimension, units] of Object.entries(COMMON_UNITS)) {
    for (const text of units.filter((unit) => !SEXAGESIMAL.has(unit))) {
      expect(unitFactor(text, dimension as Dimension), text).toBeGreaterThan(0);
    }
    expect(unitFactor(units[0]!, dimension as Dimension)).toBe(1);
  }
});
