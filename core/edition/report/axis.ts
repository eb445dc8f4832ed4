/** A range of one axis with round ticks inside. */
export interface Axis {
  readonly min: number;
  readonly max: number;
  readonly ticks: readonly number[];
  /** Digits behind the point that the ticks need. */
  readonly places: number;
}

const STEPS = [1, 2, 5, 10];
/** Steps of wide angles. */
const DEGREES = [15, 30, 45, 60, 90, 120, 180];

/**
 * The axis of some values: their range with a margin of 4 %, about six ticks on multiples of 1, 2 or 5, of wide angles
 * on multiples of 15. NaN is left out; no values, or values that are all the same, give an axis around them.
 */
export function axisOf(values: Iterable<number>, unit: string): Axis {
  let [least, greatest] = [Infinity, -Infinity];
  for (const value of values) {
    if (value < least) least = value;
    if (value > greatest) greatest = value;
  }
  if (!(least <= greatest)) [least, greatest] = [0, 1];
  const size = Math.max(Math.abs(least), Math.abs(greatest));
  // Closer values than this would want ticks that doubles cannot tell apart.
  const same = greatest - least <= 1e-9 * size;
  const margin = same ? Math.max(size * 0.05, 0.5) : (greatest - least) * 0.04;
  const [min, max] = [least - margin, greatest + margin];
  const step = stepOf((max - min) / 6, unit);
  const ticks: number[] = [];
  // Adding 0 turns −0 into 0.
  for (let at = Math.ceil(min / step); at * step <= max; at++) ticks.push(at * step + 0);
  return { min, max, ticks, places: Math.max(0, -Math.floor(Math.log10(step) + 1e-9)) };
}

function stepOf(rough: number, unit: string): number {
  const angle = unit === 'deg' && rough > 10 ? DEGREES.find((candidate) => candidate >= rough) : undefined;
  const power = Math.floor(Math.log10(rough));
  return angle ?? STEPS.find((candidate) => candidate * 10 ** power >= rough * 0.999)! * 10 ** power;
}

/** Text of a tick, with a true minus sign. */
export function tickText(axis: Axis, tick: number): string {
  const text = tick.toFixed(Math.min(axis.places, 20));
  return (Number(text) === 0 ? text.replace('-', '') : text).replace('-', '−');
}
