import { freshColumn } from '../table/columnpool';
import type { MeasuredColumn, MeasuredTable } from '../table/measured';
import { givesDistance } from '../table/parallax';
import type { QuantityColumn } from './quantity';

/**
 * Heliocentric distance of every row in kpc with its linear 1σ error, or undefined when nothing was measured.
 *
 * A distance modulus wins over a distance, a distance over a parallax. d = 10^(μ/5 − 2), σ_d = d ln10/5 σ_μ;
 * d = 1/ϖ, σ_d = d² σ_ϖ, and only for ϖ ≥ 5 σ_ϖ, because the inverse of a noisy parallax is biased. Distances that are
 * not positive are missing.
 */
export function heliocentricDistance(table: MeasuredTable, make = freshColumn): QuantityColumn | undefined {
  const [modulus, direct, parallax] = (['distance_modulus', 'distance', 'parallax'] as const).map((id) =>
    table.columns.get(id),
  );
  if (!modulus && !direct && !parallax) return undefined;
  const values = make(table.rows).fill(Number.NaN);
  const sigma = make(table.rows).fill(Number.NaN);
  // From the last choice to the first.
  if (parallax) fromParallax(parallax, values, sigma);
  if (direct) fromDistance(direct, values, sigma);
  if (modulus) fromModulus(modulus, values, sigma);
  return { values, sigma };
}

function fromParallax(parallax: MeasuredColumn, values: Float64Array, sigma: Float64Array): void {
  for (let row = 0; row < values.length; row++) {
    const measured = parallax.values[row]!;
    const error = parallax.sigma?.[row] ?? Number.NaN;
    if (!givesDistance(measured, error)) continue;
    values[row] = 1 / measured;
    sigma[row] = error / (measured * measured);
  }
}

function fromDistance(direct: MeasuredColumn, values: Float64Array, sigma: Float64Array): void {
  for (let row = 0; row < values.length; row++) {
    const measured = direct.values[row]!;
    if (!(measured > 0)) continue;
    values[row] = measured;
    sigma[row] = direct.sigma?.[row] ?? Number.NaN;
  }
}

function fromModulus(modulus: MeasuredColumn, values: Float64Array, sigma: Float64Array): void {
  for (let row = 0; row < values.length; row++) {
    const measured = modulus.values[row]!;
    if (Number.isNaN(measured)) continue;
    const distance = 10 ** (measured / 5 - 2);
    values[row] = distance;
    sigma[row] = distance * (Math.LN10 / 5) * (modulus.sigma?.[row] ?? Number.NaN);
  }
}
