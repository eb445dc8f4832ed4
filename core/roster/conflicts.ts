import { MEASURED, type MeasuredId } from '../table/role';
import type { Identity } from './identity';
import type { Conflict, ConflictValue, ReadSource, SettledColumn } from './roster';
import { sigmaOf, usable, valueOf } from './values';

/** Compared as they were settled; positions are compared on the sky, correlations not at all. */
const COMPARED: readonly MeasuredId[] = MEASURED.map(({ id }) => id).filter(
  (id) => !['ra', 'dec', 'pm_correlation', 'parallax', 'distance'].includes(id),
);
/** Of these the first that a source's row can use is compared, as a modulus. */
const DISTANCES = ['distance_modulus', 'distance', 'parallax'] as const;
/** Without any error, values that differ by more than this share of the larger one are worth showing. */
const BARE_DIFFERENCE = 0.1;

/**
 * Values of other sources that lie further from the chosen one than a number of combined σ.
 *
 * Distances of every kind are compared as moduli, with linear errors; proper motions by component; E(B−V) and A_V only
 * each with its like. An error that one side lacks counts as 0. When neither side has one, values are in conflict if
 * they differ by more than a tenth of the larger (distances: of the larger distance); the difference in σ is then Infinity.
 */
export function valueConflicts(
  sources: readonly ReadSource[],
  objects: readonly Identity[],
  settled: ReadonlyMap<MeasuredId, SettledColumn>,
  limitSigma: number,
): Conflict[] {
  const found: Conflict[] = [];
  if (sources.length < 2) return found;
  objects.forEach((object, index) => {
    if (object.rows.filter((row) => row >= 0).length < 2) return;
    for (const quantity of COMPARED) {
      const from = chosenSource(settled, quantity, index);
      const chosen = from < 0 ? undefined : comparable(sources[from]!, object.rows[from]!, quantity);
      if (!chosen) continue;
      object.rows.forEach((row, source) => {
        const other = source === from || row < 0 ? undefined : comparable(sources[source]!, row, quantity);
        const sigmas = other && differenceSigmas(quantity, chosen, other);
        if (other && sigmas !== undefined && sigmas > limitSigma) {
          found.push({ object: index, quantity, chosen, other, sigmas });
        }
      });
    }
  });
  return found;
}

function chosenSource(settled: ReadonlyMap<MeasuredId, SettledColumn>, quantity: MeasuredId, object: number): number {
  const ids = quantity === 'distance_modulus' ? DISTANCES : [quantity];
  return Math.max(-1, ...ids.map((id) => settled.get(id)?.fromSource[object] ?? -1));
}

/** A source's value with its error, as it is compared. */
function comparable(source: ReadSource, row: number, quantity: MeasuredId): ConflictValue | undefined {
  const line = source.lines[row]!;
  if (quantity !== 'distance_modulus') {
    const value = valueOf(source, row, quantity);
    return Number.isNaN(value) ? undefined : { source: source.id, line, value, sigma: sigmaOf(source, row, quantity) };
  }
  const id = DISTANCES.find((candidate) => usable(source, row, candidate));
  if (id === undefined) return undefined;
  return { source: source.id, line, ...modulusOf(id, valueOf(source, row, id), sigmaOf(source, row, id)) };
}

/** Distance modulus with its linear error from a modulus, a distance in kpc or a parallax in mas: 5 log10(d/kpc) + 10. */
function modulusOf(id: MeasuredId, value: number, sigma: number): { value: number; sigma: number } {
  if (id === 'distance_modulus') return { value, sigma };
  const turn = id === 'parallax' ? -1 : 1;
  return { value: 10 + turn * 5 * Math.log10(value), sigma: (5 / Math.LN10) * (sigma / value) };
}

function differenceSigmas(quantity: MeasuredId, a: ConflictValue, b: ConflictValue): number | undefined {
  const difference = Math.abs(a.value - b.value);
  const known = [a.sigma, b.sigma].filter((sigma) => sigma > 0);
  if (known.length > 0) return difference / Math.hypot(...known);
  const larger = Math.max(Math.abs(a.value), Math.abs(b.value));
  const share = quantity === 'distance_modulus' ? 1 - 10 ** (-difference / 5) : difference / larger;
  return share > BARE_DIFFERENCE ? Infinity : undefined;
}
