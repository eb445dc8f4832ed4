import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readDelimited } from '../../../core/formats/csv/read';
import { heliocentricDistance } from '../../../core/quantities/distance';
import type { ReadSource } from '../../../core/roster/roster';
import type { ColumnMeaning } from '../../../core/roster/sourcemap';
import { understandSource } from '../../../core/roster/understand';

async function understood(
  text: string,
  meanings: readonly ColumnMeaning[],
  missing?: readonly string[],
): Promise<ReadSource> {
  async function* chunks(): AsyncGenerator<Uint8Array> {
    yield new TextEncoder().encode(text);
    await Promise.resolve();
  }
  const file = await readDelimited(chunks(), { fileName: 'table.csv', ...(missing ? { missing } : {}) });
  return understandSource('table', file, meanings);
}

const PLACE = [
  { column: 'name', role: 'name' },
  { column: 'ra', role: 'ra', unit: 'deg' },
  { column: 'dec', role: 'dec', unit: 'deg' },
] as const satisfies readonly ColumnMeaning[];

describe('values', () => {
  it('come in canonical units, exactly where the unit is a whole multiple', async () => {
    const source = await understood('name,ra,dec,d,v\nA,1,2,11540,120500\n', [
      ...PLACE,
      { column: 'd', role: 'distance', unit: 'pc' },
      { column: 'v', role: 'v_los', unit: 'm/s' },
    ]);
    expect(source.measured.columns.get('distance')!.values[0]).toBe(11.54);
    expect(source.measured.columns.get('v_los')!.values[0]).toBe(120.5);
  });

  it('right ascensions from −180 are turned, and Galactic positions become ICRS', async () => {
    const source = await understood('name,ra,dec\nA,-90,2\n', PLACE);
    expect(source.measured.columns.get('ra')!.values[0]).toBe(270);
    const galactic = await understood('name,l,b\nA,0,0\n', [
      { column: 'name', role: 'name' },
      { column: 'l', role: 'gal_l', unit: 'deg' },
      { column: 'b', role: 'gal_b', unit: 'deg' },
    ]);
    // Direction of (l, b) = (0, 0), ICRS: 266.40499, −28.93617 (from the definition of the Galactic system, ESA 1997).
    expect(galactic.measured.columns.get('ra')!.values[0]).toBeCloseTo(266.40499, 4);
    expect(galactic.measured.columns.get('dec')!.values[0]).toBeCloseTo(-28.93617, 4);
  });

  it('errors below and above become one, a minus error may have its sign, a negative error is reported', async () => {
    const source = await understood('name,ra,dec,feh,lo,hi,rv,e_rv\nA,1,2,-1,-0.1,0.3,10,-2\nB,1,2,-1,-0.2,,20,3\n', [
      ...PLACE,
      { column: 'feh', role: 'feh' },
      { column: 'lo', role: 'feh_error_minus' },
      { column: 'hi', role: 'feh_error_plus' },
      { column: 'rv', role: 'v_los', unit: 'km/s' },
      { column: 'e_rv', role: 'v_los_error', unit: 'km/s' },
    ]);
    const feh = source.measured.columns.get('feh')!;
    expect([feh.sigma![0], feh.sigma![1]]).toEqual([0.2, 0.2]);
    expect([...source.measured.columns.get('v_los')!.sigma!]).toEqual([Number.NaN, 3]);
    expect(source.problems).toMatchObject([
      { code: 'negative-error', where: 'table.csv', column: 'e_rv', line: 2, count: 1 },
    ]);
  });

  it('a sentinel is missing once the user has named it, and out of range before', async () => {
    const text = 'name,ra,dec,rv\nA,1,2,-9999\nB,3,4,12\n';
    const meanings = [...PLACE, { column: 'rv', role: 'v_los', unit: 'km/s' }] as const;
    const before = await understood(text, meanings);
    expect(before.problems).toMatchObject([{ code: 'out-of-range', column: 'rv', line: 2, count: 1 }]);
    const after = await understood(text, meanings, ['-9999']);
    expect(after.problems).toEqual([]);
    expect([...after.measured.columns.get('v_los')!.values]).toEqual([Number.NaN, 12]);
  });
});

it('a parallax in milliarcseconds becomes a distance in kiloparsec, in microarcseconds too', async () => {
  for (const [unit, factor] of [
    ['mas', 1],
    ['uas', 1000],
  ] as const) {
    const source = await understood(`name,ra,dec,plx,e_plx\nA,1,2,${0.5 * factor},${0.02 * factor}\n`, [
      ...PLACE,
      { column: 'plx', role: 'parallax', unit },
      { column: 'e_plx', role: 'parallax_error', unit },
    ]);
    const distance = heliocentricDistance(source.measured)!;
    // 1 kpc is the distance of a parallax of 1 mas, by the definition of the parsec.
    expect(distance.values[0]).toBeCloseTo(2, 12);
    expect(distance.sigma![0]).toBeCloseTo(0.08, 12);
  }
});

describe('warnings', () => {
  it('tell of a placeholder velocity and of distances from parallaxes', async () => {
    const source = await understood('name,ra,dec,plx,e_plx,rv,e_rv\nA,1,2,0.5,0.02,0,150\nB,3,4,0.4,0.02,12,1\n', [
      ...PLACE,
      { column: 'plx', role: 'parallax', unit: 'mas' },
      { column: 'e_plx', role: 'parallax_error', unit: 'mas' },
      { column: 'rv', role: 'v_los', unit: 'km/s' },
      { column: 'e_rv', role: 'v_los_error', unit: 'km/s' },
    ]);
    expect(source.problems.map(({ code }) => code).sort()).toEqual(['parallax-distance', 'placeholder-velocity']);
  });

  it('name a wrong unit, a missing column and a role given twice, and leave those columns out', async () => {
    const source = await understood('name,ra,dec,d,d2\nA,1,2,5,6\n', [
      ...PLACE,
      { column: 'd', role: 'distance', unit: 'km/s' },
      { column: 'gone', role: 'feh' },
      { column: 'd2', role: 'ra', unit: 'deg' },
    ]);
    expect(source.problems).toMatchObject([
      { code: 'wrong-unit', column: 'd' },
      { code: 'unknown-column', column: 'gone' },
      { code: 'role-taken', column: 'd2' },
    ]);
    expect([...source.measured.columns.keys()].sort()).toEqual(['dec', 'ra']);
  });
});

it('every row is understood or in quarantine with its line, whatever the cells are', async () => {
  const cell = fc.oneof(
    fc.double({ min: -500, max: 500, noNaN: true }).map((value) => value.toFixed(3)),
    fc.constantFrom('', 'NaN', '-', '91', '-91', '400', '12'),
  );
  await fc.assert(
    fc.asyncProperty(fc.array(fc.tuple(cell, cell), { minLength: 3, maxLength: 30 }), async (cells) => {
      const lines = cells.map(([ra, dec], at) => `Object${at},${ra},${dec}`);
      const source = await understood(`name,ra,dec\nFirst,1,2\n${lines.join('\n')}\n`, PLACE);
      const seen = [...source.lines, ...source.quarantine.map(({ line }) => line)].sort((a, b) => a - b);
      expect(seen).toEqual(Array.from({ length: cells.length + 1 }, (_, at) => at + 2));
      const { ra, dec } = Object.fromEntries(source.measured.columns) as Record<'ra' | 'dec', { values: Float64Array }>;
      expect(ra.values.every((value) => value >= 0 && value <= 360)).toBe(true);
      expect(dec.values.every((value) => value >= -90 && value <= 90)).toBe(true);
      expect(source.names.length).toBe(source.lines.length);
    }),
    { numRuns: 60 },
  );
});
