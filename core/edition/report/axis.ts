/** A range of one axis with round ticks inside. */
export interface Axis {
  readonly min: number;
  readonly max: number;
  readonly ticks: readonly number[];
  /** Digits behind the point that the ticks need. */
  readonly places: number;
}

const STEPS = [1, 2, 5, 10];

/**
 * The axis of some values: their range with a margin of 4 %, ticks on multiples of 1, 2 or 5. NaN is left out; no
 * values, or values that are all the same, give an axis of length one or more around them.
 */
export function axisOf(values: Iterable<number>, wanted = 6): Axis {
  let [least, greatest] = [Infinity, -Infinity];
  for (const value of values) {
    if (value < least) least = value;
    if (value > greatest) greatest = value;
  }
  if (!(least <= greatest)) [least, greatest] = [0, 1];
  const margin = least === greatest ? Math.max(Math.abs(least) * 0.05, 0.5) : (greatest - least) * 0.04;
  const [min, max] = [least - margin, greatest + margin];
  const rough = (max - min) / wanted;
  const power = Math.floor(Math.log10(rough));
  const step = STEPS.find((candidate) => candidate * 10 ** power >= rough * 0.999)! * 10 ** power;
  const ticks: number[] = [];
  for (let at = Math.ceil(min / step); at * step <= max; at++) ticks.push(at * step);
  return { min, max, ticks, places: Math.max(0, -Math.floor(Math.log10(step) + 1e-9)) };
}

/** Text of a tick, with a true minus sign. */
export function tickText(axis: Axis, tick: number): string {
  const text = tick.toFixed(Math.min(axis.places, 20));
  return (Number(text) === 0 ? text.replace('-', '') : text).replace('-', '−');
}
