import type { ReadSource } from './roster';
import type { SkyPoints } from './skymatch';
import { valueOf } from './values';

/** Where rows of a source stand on the sky; NaN where it does not say. */
export function placesOf(source: ReadSource, rows: readonly number[]): SkyPoints {
  const values = (id: 'ra' | 'dec'): Float64Array => {
    const column = source.measured.columns.get(id)?.values;
    return new Float64Array(rows.length).map((_, at) => column?.[rows[at]!] ?? Number.NaN);
  };
  return { ra: values('ra'), dec: values('dec') };
}

/**
 * A name for a row that has none, of our own scheme: the id of its source, then J and its right ascension and
 * declination in degrees, e.g. "deep J187.7059+12.3911".
 */
export function skyName(source: ReadSource, row: number): string {
  const [ra, dec] = [valueOf(source, row, 'ra'), valueOf(source, row, 'dec')];
  return `${source.id} J${ra.toFixed(4)}${dec < 0 ? '' : '+'}${dec.toFixed(4)}`;
}
