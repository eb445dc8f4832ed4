import { cutKind } from '../../core/cuts/kinds';
import { Bitset } from '../../core/table/bitset';
import type { Histogram } from '../contract/messages';
import type { Session } from './session';

/** Shares of the values that may lie outside the drawn range, so that a few outliers do not flatten the rest; they count in the outermost bins. */
const TAIL = 0.03;

/** Histogram of the quantity that a limit stands on: all objects, and those that reach the cut; undefined without data. */
export function cutHistogram(session: Session, cutId: string, parameter: string, bins: number): Histogram | undefined {
  const { recipe, prepared, result } = session;
  const at = recipe.ledger.findIndex(({ id }) => id === cutId);
  const cut = recipe.ledger[at];
  if (!cut) return undefined;
  const kind = cutKind(cut.kind);
  const limit = kind.limits(cut.parameters).find((candidate) => candidate.parameter === parameter);
  const column = limit && kind.limitColumn(limit, cut.parameters, prepared.objects);
  if (!limit || !column) return undefined;
  const { values } = column;
  let reaching = Bitset.full(prepared.objects.rows);
  result.outcomes.slice(0, at).forEach((outcome, earlier) => {
    if (recipe.ledger[earlier]!.on) reaching = reaching.and(outcome.passes.or(outcome.unjudged));
  });
  const [min, max] = rangeWith(robustRange(values, limit.absolute), limit.value);
  const all = new Float64Array(bins);
  const left = new Float64Array(bins);
  let missing = 0;
  for (let row = 0; row < values.length; row++) {
    const value = limit.absolute ? Math.abs(values[row]!) : values[row]!;
    if (Number.isNaN(value)) missing++;
    else {
      const bin = Math.min(bins - 1, Math.max(0, Math.floor(((value - min) / (max - min)) * bins)));
      all[bin]!++;
      if (reaching.has(row)) left[bin]!++;
    }
  }
  return { min, max, all, reaching: left, missing };
}

/** Ranges that were found, by column and sign: a moved limit leaves columns as they are, and sorting a million values takes long. */
const found = new WeakMap<Float64Array, Map<boolean, [number, number]>>();

/** Range of the finite values, or of their sizes, without their outermost tails. */
function robustRange(values: Float64Array, absolute: boolean): [number, number] {
  const known = found.get(values) ?? new Map<boolean, [number, number]>();
  found.set(values, known);
  const range = known.get(absolute) ?? newRange(absolute ? values.map(Math.abs) : values);
  known.set(absolute, range);
  return range;
}

function newRange(values: Float64Array): [number, number] {
  const finite = values.filter(Number.isFinite).sort();
  if (finite.length === 0) return [0, 1];
  const last = finite.length - 1;
  return [finite[Math.floor(TAIL * last)]!, finite[Math.ceil((1 - TAIL) * last)]!];
}

/** The range widened so that the limit can be seen and moved. */
function rangeWith([low, high]: [number, number], limit: number): [number, number] {
  const [min, max] = [Math.min(low, limit), Math.max(high, limit)];
  const margin = 0.03 * (max - min) || 1;
  return [low >= 0 && limit >= 0 ? Math.max(0, min - margin) : min - margin, max + margin];
}
