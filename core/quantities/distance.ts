import type { MeasuredTable } from '../table/measured';
import { givesDistance } from '../table/parallax';
import type { QuantityColumn } from './quantity';

/**
 * Heliocentric distance of every row in kpc with its linear 1σ error, or undefined when nothing was measured.
 *
 * A distance modulus wins over a distance, a distance over a parallax. d = 10^(μ/5 − 2), σ_d = d ln10/5 σ_μ;
 * d = 1/ϖ, σ_d = d² σ_ϖ, and only for ϖ ≥ 5 σ_ϖ, because the inverse of a noisy parallax is biased. Distances that are
 * not positive are missing.
 */
export function heliocentricDistance(table: MeasuredTable): QuantityColumn | undefined {
  const [modulus, direct, parallax] = (['distance_modulus', 'distance', 'parallax'] as const).map((id) =>
    table.columns.get(id),
  );
  if (!modulus && !direct && !parallax) return undefined;
  const [values, sigma] = [new Float64Array(table.rows), new Float64Array(table.rows)];
  for (let row = 0; row < table.rows; row++) {
    const mu = modulus?.values[row] ?? Number.NaN;
    const d = direct?.values[row] ?? Number.NaN;
    const plx = parallax?.values[row] ?? Number.NaN;
    const plxSigma = parallax?.sigma?.[row] ?? Number.NaN;
    if (!Number.isNaN(mu)) {
      values[row] = 10 ** (mu / 5 - 2);
      sigma[row] = values[row]! * (Math.LN10 / 5) * (modulus?.sigma?.[row] ?? Number.NaN);
    } else if (d > 0) {
      values[row] = d;
      sigma[row] = direct?.sigma?.[row] ?? Number.NaN;
    } else if (givesDistance(plx, plxSigma)) {
      values[row] = 1 / plx;
      sigma[row] = plxSigma / (plx * plx);
    } else {
      values[row] = sigma[row] = Number.NaN;
    }
  }
  return { values, sigma };
}
