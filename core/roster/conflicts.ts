import { MEASURED, type MeasuredId } from '../table/role';
import type { Identity } from './identify';
import type { Conflict, ConflictValue, ReadSource, SettledColumn } from './roster';
import { valueOf } from './settle';

/** Compared as they were settled; positions are compared on the sky, correlations not at all. */
const COMPARED: readonly MeasuredId[] = MEASURED.map(({ id }) => id).filter(
  (id) => !['ra', 'dec', 'pm_correlation', 'parallax', 'distance'].includes(id),
);
/** Without any error, values that differ by more than this share of the larger one are worth showing. */
const BARE_DIFFERENCE = 0.1;

/**
 * Values of other sources that lie further from the chosen one than a number of combined σ.
 *
 * Distances are compared as moduli. When neither value has an error, they are in conflict if they differ by more than
 * a tenth; the difference in σ is then Infinity.
 */
export function valueConflicts(
  sources: readonly ReadSource[],
  objects: readonly Identity[],
  settled: ReadonlyMap<MeasuredId, SettledColumn>,
  limitSigma: number,
): Conflict[] {
  const found: Conflict[] = [];
  objects.forEach((object, index) => {
    if (object.rows.filter((row) => row >= 0).length < 2) return;
    for (const quantity of COMPARED) {
      const from = chosenSource(settled, quantity, index);
      const chosen = from < 0 ? undefined : comparable(sources[from]!, object.rows[from]!, quantity);
      if (!chosen) continue;
      object.rows.forEach((row, source) => {
        const other = source === from || row < 0 ? undefined : comparable(sources[source]!, row, quantity);
        const sigmas = other && differenceSigmas(chosen, other);
        if (other && sigmas !== undefined && sigmas > limitSigma) {
          found.push({ object: index, quantity, chosen, other, sigmas });
        }
      });
    }
  });
  return found;
}

function chosenSource(settled: ReadonlyMap<MeasuredId, SettledColumn>, quantity: MeasuredId, object: number): number {
  const ids: readonly MeasuredId[] = quantity === 'distance_modulus' ? ['distance_modulus', 'distance'] : [quantity];
  return Math.max(-1, ...ids.map((id) => settled.get(id)?.fromSource[object] ?? -1));
}

/** A source's value with its error; a distance in kpc counts as its modulus. */
function comparable(source: ReadSource, row: number, quantity: MeasuredId): ConflictValue | undefined {
  const sigmaOf = (id: MeasuredId): number => source.measured.columns.get(id)?.sigma?.[row] ?? Number.NaN;
  const line = source.lines[row]!;
  const value = valueOf(source, row, quantity);
  if (!Number.isNaN(value)) return { source: source.id, line, value, sigma: sigmaOf(quantity) };
  const kpc = quantity === 'distance_modulus' ? valueOf(source, row, 'distance') : Number.NaN;
  if (!(kpc > 0)) return undefined;
  const sigma = (5 / Math.LN10) * (sigmaOf('distance') / kpc);
  return { source: source.id, line, value: 5 * Math.log10(kpc) + 10, sigma };
}

function differenceSigmas(a: ConflictValue, b: ConflictValue): number | undefined {
  const difference = Math.abs(a.value - b.value);
  const known = [a.sigma, b.sigma].filter((sigma) => sigma > 0);
  if (known.length > 0) return difference / Math.hypot(...known);
  const larger = Math.max(Math.abs(a.value), Math.abs(b.value));
  return difference > BARE_DIFFERENCE * larger ? Infinity : undefined;
}
